using System.Globalization;
using System.Text.Json;
using FrameGen.Cli;
using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>The demos as a builder runs them, and the papers read back by programs this project did not write.</summary>
public class DemoBuildTests
{
    private const string AuditDrawings = """
        import sys, json, pathlib, ezdxf
        out = []
        for path in sorted(pathlib.Path(sys.argv[1]).rglob("*.dxf")):
            doc = ezdxf.readfile(path)
            audit = doc.audit()
            cut = [e for e in doc.modelspace().query("LWPOLYLINE") if e.dxf.layer == "CUT"]
            out.append([str(path.name), doc.dxfversion, doc.header["$INSUNITS"], len(audit.errors) + len(audit.fixes), len(cut), all(e.closed for e in cut)])
        print(json.dumps(out))
        """;

    public static TheoryData<string> Demos => ["quayside-trailer", "tarn-truss", "lock-gantry"];

    [Theory]
    [MemberData(nameof(Demos))]
    public void A_demo_fills_its_folder_and_prints_what_was_chosen(string name)
    {
        using BuiltFrame built = Build(name);
        string[] expected =
        [
            "cut-list.csv", "cut-list.md", "ends.csv", "stock-plan.csv", "stock-plan.md", "setup.csv", "setup.md", "welds.csv", "welds.md", "templates.pdf", "preview/frame.stl", "frame.json", $"spec/{name}.yaml", "manifest.json",
        ];
        Assert.All(expected, file => Assert.True(File.Exists(built.PathOf(file)), file));
        foreach (string mark in built.Csv("cut-list.csv").Select(row => row["hand"].Length == 0 ? row["mark"] : $"{row["mark"]}-{row["hand"]}"))
        {
            Assert.True(File.Exists(built.PathOf("developed", mark + ".dxf")), mark);
            Assert.True(File.Exists(built.PathOf("preview", mark + ".stl")), mark);
        }

        JsonElement frame = built.FrameJson();
        Assert.Equal("proven-lightest", frame.GetProperty("sizing").GetProperty("status").GetString());
        Assert.All(frame.GetProperty("targets").EnumerateArray(), t => Assert.True(t.GetProperty("met").GetBoolean()));
        foreach (JsonProperty group in frame.GetProperty("groups").EnumerateObject())
        {
            Assert.Contains(group.Name, built.Stdout, StringComparison.Ordinal);
        }
    }

    [Theory]
    [MemberData(nameof(Demos))]
    public void Ezdxf_audits_every_drawing_clean(string name)
    {
        using BuiltFrame built = Build(name);
        using JsonDocument found = JsonDocument.Parse(ForeignProgram.Python("ezdxf").Run("-c", AuditDrawings, built.Folder));
        Assert.NotEqual(0, found.RootElement.GetArrayLength());
        foreach (JsonElement row in found.RootElement.EnumerateArray())
        {
            Assert.True(row[3].GetInt32() == 0, $"{row[0]}: {row[3]} audit findings");
            Assert.Equal("AC1015", row[1].GetString());
            Assert.Equal(4, row[2].GetInt32());

            // The layout is for the bench: nothing of it is cut.
            bool isLayout = row[0].GetString() is "layout.dxf";
            Assert.True(isLayout == (row[4].GetInt32() == 0) && row[5].GetBoolean(), $"{row[0]}: open or missing line on CUT");
        }
    }

    [Theory]
    [MemberData(nameof(Demos))]
    public void Admesh_finds_every_mesh_closed_and_of_the_part_s_mass(string name)
    {
        using BuiltFrame built = Build(name);
        JsonElement frame = built.FrameJson();
        JsonElement tubes = frame.GetProperty("tubes");
        double Volume(string tube) => tubes.GetProperty(tube).GetProperty("volume_mm3").GetDouble();
        var volumes = frame.GetProperty("parts").EnumerateArray()
            .ToDictionary(BuiltFrame.FileOf, p => Volume(p.GetProperty("tubes")[0].GetString()!), StringComparer.Ordinal);
        foreach (string file in Directory.EnumerateFiles(built.PathOf("preview"), "*.stl").Order(StringComparer.Ordinal))
        {
            StlReport report = StlReport.Of(file);
            Assert.True(report.Clean, $"{Path.GetFileName(file)}: {report}");
            string mark = Path.GetFileNameWithoutExtension(file);
            double volume = mark == "frame" ? tubes.EnumerateObject().Sum(t => Volume(t.Name)) : volumes[mark];
            Assert.InRange(report.Volume / volume, 0.999, 1.001);
        }
    }

    [Theory]
    [MemberData(nameof(Demos))]
    public void Masses_of_the_cut_list_the_frame_and_the_volumes_agree(string name)
    {
        using BuiltFrame built = Build(name);
        JsonElement frame = built.FrameJson();
        double total = frame.GetProperty("totals").GetProperty("mass_kg").GetDouble();
        double tubes = frame.GetProperty("tubes").EnumerateObject().Sum(t => t.Value.GetProperty("mass_kg").GetDouble());
        var rows = built.Csv("cut-list.csv");
        double listed = rows.Sum(r => double.Parse(r["mass_total_kg"], CultureInfo.InvariantCulture));

        Assert.InRange(tubes / total, 1 - 1e-6, 1 + 1e-6);
        // The list prints masses to 0.1 g: half of that a row at the most.
        Assert.InRange(listed, total - (0.00005 * rows.Count), total + (0.00005 * rows.Count));
        // What copes remove or run-outs add is a small part of the axis mass.
        Assert.InRange(total / frame.GetProperty("sizing").GetProperty("mass_kg").GetDouble(), 0.9, 1.05);
    }

    [Theory]
    [MemberData(nameof(Demos))]
    public void Building_twice_gives_the_same_bytes_and_verify_agrees(string name)
    {
        using BuiltFrame first = Build(name);
        using BuiltFrame second = Build(name);
        string[] files = [.. Directory.EnumerateFiles(first.Folder, "*", SearchOption.AllDirectories).Select(f => Path.GetRelativePath(first.Folder, f)).Order(StringComparer.Ordinal)];
        Assert.NotEmpty(files);
        Assert.All(files, file => Assert.Equal(File.ReadAllBytes(first.PathOf(file)), File.ReadAllBytes(second.PathOf(file))));

        Assert.Equal(0, CommandLine.Run(["verify", first.Folder], TextWriter.Null, TextWriter.Null));
        Assert.Equal(0, CommandLine.Run(["verify", first.Folder, "--spec", first.SpecPath], TextWriter.Null, TextWriter.Null));
        string list = first.PathOf("cut-list.csv");
        File.WriteAllText(list, File.ReadAllText(list) + " ");
        Assert.Equal(1, CommandLine.Run(["verify", first.Folder], TextWriter.Null, TextWriter.Null));
    }

    private static BuiltFrame Build(string name) => BuiltFrame.FromFile(Repository.PathOf("specs", name + ".yaml")).Succeeded();
}
