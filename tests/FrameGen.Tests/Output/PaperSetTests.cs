using System.Text.Json;
using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Output;
using FrameGen.Tests.Fabrication;
using Xunit;

namespace FrameGen.Tests.Output;

public class PaperSetTests
{
    [Fact]
    public void Writes_every_file_that_belongs_to_a_package()
    {
        ShopPackage package = GateFrame.CopedPackage();
        string[] paths = [.. PaperSet.Create(package).Select(f => f.Path)];
        (string post, string arm, string rail) =
            (GateFrame.PartOf(package, "post"), GateFrame.PartOf(package, "arm"), GateFrame.PartOf(package, "rail"));
        string[] expected =
        [
            "cut-list.csv", "cut-list.md", "ends.csv", "stock-plan.csv", "stock-plan.md", "setup.csv", "setup.md",
            "welds.csv", "welds.md", "frame.json", "manifest.json", "templates.pdf", "layout.dxf",
            $"developed/{post}.dxf", $"developed/{arm}.dxf", $"developed/{rail}.dxf", $"templates/{post}.dxf", $"templates/{arm}.dxf",
            "spec/gate.yaml", "spec/gate-2.yaml", "preview/frame.stl", $"preview/{post}.stl", $"preview/{arm}.stl", $"preview/{rail}.stl",
        ];
        Assert.All(expected, e => Assert.Contains(paths, p => p.Equals(e, StringComparison.Ordinal)));
        Assert.DoesNotContain(paths, p => string.Equals(p, $"templates/{rail}.dxf", StringComparison.Ordinal));
        Assert.Equal(paths.Length, paths.Distinct(StringComparer.OrdinalIgnoreCase).Count());
    }

    [Fact]
    public void Manifest_names_every_other_file_with_its_hash_and_where_included_files_went()
    {
        IReadOnlyList<OutputFile> files = PaperSet.Create(GateFrame.CopedPackage());
        using JsonDocument document = JsonDocument.Parse(files[^1].Bytes);
        JsonElement root = document.RootElement;
        Assert.Equal("framegen-manifest/1", root.GetProperty("format").GetString());
        Dictionary<string, string> hashes = root.GetProperty("files").EnumerateArray()
            .ToDictionary(f => f.GetProperty("path").GetString()!, f => f.GetProperty("sha256").GetString()!, StringComparer.Ordinal);
        Assert.Equal(files.Count - 1, hashes.Count);

        // "framegen: 1\n" through sha256sum.
        Assert.Equal(SpecHash, hashes["spec/gate.yaml"]);
        Assert.Equal(SpecHash, root.GetProperty("spec").GetProperty("sha256").GetString());
        JsonElement include = Assert.Single(root.GetProperty("spec").GetProperty("includes").EnumerateArray());
        Assert.Equal(("../lists/gate.yaml", "spec/gate-2.yaml"), (include.GetProperty("path").GetString(), include.GetProperty("file").GetString()));
    }

    [Fact]
    public void Is_the_same_twice()
    {
        IReadOnlyList<OutputFile> first = PaperSet.Create(GateFrame.CopedPackage());
        IReadOnlyList<OutputFile> second = PaperSet.Create(GateFrame.CopedPackage());
        Assert.All(first.Zip(second), p => Assert.True(p.First.Bytes.Span.SequenceEqual(p.Second.Bytes.Span), p.First.Path));
    }

    [Fact]
    public void A_cut_list_that_does_not_add_up_is_a_fault()
    {
        ShopPackage package = GateFrame.CopedPackage();
        ShopPackage wrong = package with { Totals = package.Totals with { MassKg = package.Totals.MassKg * 1.00001 } };
        Assert.Throws<SelfCheckException>(() => PaperSet.Create(wrong));
    }

    [Fact]
    public void An_open_mesh_or_one_of_another_volume_is_a_fault()
    {
        TriangleMesh box = Tetrahedron();
        SelfCheck.Mesh("t", box, 1 / 6.0);
        Assert.Throws<SelfCheckException>(() => SelfCheck.Mesh("t", box, 0.17));
        Assert.Throws<SelfCheckException>(() => SelfCheck.Mesh("t", new TriangleMesh(box.Vertices, [.. box.Triangles.Take(9)]), 1 / 6.0));
        Assert.Throws<SelfCheckException>(() => SelfCheck.Mesh("t", new TriangleMesh(box.Vertices, [.. box.Triangles, 0, 0, 1]), 1 / 6.0));
    }

    [Fact]
    public void An_end_cut_too_shallow_is_a_fault()
    {
        ShopPackage package = GateFrame.Package();
        CutTube post = package.Parts[0].Drawn;
        SelfCheck.NoInterference(package.Cut, post);
        EndCut end = post.From;
        EndCurve shallow = new([.. end.Outer.Points.Select(p => p with { T = p.T - 0.1 })]);
        Assert.Throws<SelfCheckException>(() => SelfCheck.NoInterference(package.Cut, post with { From = end with { Outer = shallow } }));
    }

    private const string SpecHash = "4dbf930d55060c97c7ed454075f316dc200784eece7356589f87f1c2f239f9e9";

    private static TriangleMesh Tetrahedron() => new(
        [Vector3.Zero, Vector3.UnitX, Vector3.UnitY, Vector3.UnitZ],
        [0, 2, 1, 0, 1, 3, 1, 2, 3, 2, 0, 3]);
}
