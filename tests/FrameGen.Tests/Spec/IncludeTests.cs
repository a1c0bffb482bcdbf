using FrameGen.Diagnostics;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

public class IncludeTests
{
    private const string Rack = """
        framegen: 1
        parameters: {height: 900 mm}
        materials:
          shop-steel: {E: 210 GPa, poisson: 0.3, density: 7.85 g/cm3, yield: 235 MPa}
        stock:
          rack: {material: [shop-steel], bar: 6000 mm, price_per_m: 4.2, sizes: [round 25 x 1.5 mm, rod 16 mm]}
        """;

    [Fact]
    public void Takes_in_materials_stock_and_parameters()
    {
        FrameSpec spec = SpecText.Sound(SpecText.Small + "include: [../lists/rack.yaml]\nparameters: {width: 1 m}\n", ("lists/rack.yaml", Rack));
        Assert.Equal("specs/stand.yaml lists/rack.yaml", string.Join(' ', spec.Files.Select(file => file.Path)));
        Assert.Equal(("../lists/rack.yaml", 1), Assert.Single(spec.Includes));
        Assert.Equal("width height", string.Join(' ', spec.Parameters.Select(parameter => parameter.Name.Value)));
        Assert.Equal(new SourcePlace("lists/rack.yaml", 4, 3), Assert.Single(spec.Materials).Name.At);
        Assert.Equal((4.2, 2), (spec.Stock[0].PricePerMetre, spec.Stock[0].Sizes.Count));
    }

    [Fact]
    public void Reads_a_file_once_however_often_it_is_included()
    {
        FrameSpec spec = SpecText.Sound(
            SpecText.Small + "include: [a.yaml, b.yaml, ./a.yaml]\n",
            ("specs/a.yaml", "framegen: 1\ninclude: [../lists/rack.yaml]\n"),
            ("specs/b.yaml", "framegen: 1\ninclude: [../lists/rack.yaml]\n"),
            ("lists/rack.yaml", Rack));
        Assert.Equal("specs/stand.yaml specs/a.yaml lists/rack.yaml specs/b.yaml", string.Join(' ', spec.Files.Select(file => file.Path)));
        Assert.Equal([("../lists/rack.yaml", 2), ("a.yaml", 1), ("b.yaml", 3), ("./a.yaml", 1)], spec.Includes);
    }

    [Fact]
    public void Shows_a_circle()
    {
        string error = SpecText.OnlyError(
            SpecText.Small + "include: [a.yaml]\n",
            ("specs/a.yaml", "framegen: 1\ninclude: [sub/b.yaml]\n"),
            ("specs/sub/b.yaml", "framegen: 1\ninclude: [../a.yaml]\n"));
        Assert.Equal(
            "specs/sub/b.yaml:2:11: error: files include each other in a circle: specs/a.yaml -> specs/sub/b.yaml -> specs/a.yaml; remove one of the includes",
            error);
        Assert.Contains(
            "specs/stand.yaml -> specs/stand.yaml", SpecText.OnlyError(SpecText.Small + "include: [../specs/./stand.yaml]\n"), StringComparison.Ordinal);
    }

    [Fact]
    public void Sees_the_root_behind_another_spelling_of_its_path()
    {
        var diagnostics = new DiagnosticList();
        byte[] text = System.Text.Encoding.UTF8.GetBytes(SpecText.Small + "include: [stand.yaml]\n");
        Assert.Null(SpecReader.Read("./stand.yaml", path => path.EndsWith("stand.yaml", StringComparison.Ordinal) ? text : null, diagnostics));
        Assert.Contains("circle", Assert.Single(diagnostics).Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("/etc/rack.yaml", "is no relative path")]
    [InlineData("C:/rack.yaml", "is no relative path")]
    [InlineData("https://example.org/rack.yaml", "is no relative path")]
    [InlineData("..\\rack.yaml", "has a backslash")]
    [InlineData("rack.yaml", "there is no file 'rack.yaml' (looked for 'specs/rack.yaml')")]
    public void Refuses_paths(string path, string message)
    {
        string error = SpecText.OnlyError(SpecText.Small + $"include: ['{path}']\n");
        Assert.Contains(message, error, StringComparison.Ordinal);
        Assert.StartsWith("specs/stand.yaml:9:11: error: ", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Takes_nothing_else_in()
    {
        string error = SpecText.OnlyError(SpecText.Small + "include: [a.yaml]\n", ("specs/a.yaml", "framegen: 1\nnodes: {}\n"));
        Assert.StartsWith("specs/a.yaml:2:1: error: unknown key 'nodes' in an included file; it takes framegen, include, parameters", error, StringComparison.Ordinal);
    }

    [Fact]
    public void Names_both_places_of_a_name_in_two_files()
    {
        string error = SpecText.OnlyError(
            SpecText.Small + "parameters: {HEIGHT: 1 m}\ninclude: [a.yaml]\n", ("specs/a.yaml", "framegen: 1\nparameters: {height: 2 m}\n"));
        Assert.Equal("specs/a.yaml:2:14: error: parameter 'height' stands in specs/stand.yaml:9:14 already; rename or remove one of the two", error);
    }

    [Fact]
    public void Sorts_errors_by_file_and_place()
    {
        IReadOnlyList<Diagnostic> errors = SpecText.Errors(
            "framegen: 1\ninclude: [b.yaml, a.yaml]\nwrong: 1\nworse: 2\n", ("specs/a.yaml", "framegen: 1\nx: 1\n"), ("specs/b.yaml", "framegen: 1\ny: 1\nz: 1\n"));
        string[] places = [.. errors.Select(error => $"{error.At!.File}:{error.At.Line}")];
        Assert.Equal(
            "specs/stand.yaml:1 specs/stand.yaml:1 specs/stand.yaml:1 specs/stand.yaml:3 specs/stand.yaml:4 specs/b.yaml:2 specs/b.yaml:3 specs/a.yaml:2",
            string.Join(' ', places));
    }

    [Fact]
    public void Reads_from_disk_and_says_when_the_root_is_missing()
    {
        string folder = Directory.CreateTempSubdirectory("framegen-spec-").FullName;
        try
        {
            string root = Path.Combine(folder, "stand.yaml");
            File.WriteAllText(root, SpecText.Small + "include: [lists/rack.yaml]\n");
            Directory.CreateDirectory(Path.Combine(folder, "lists"));
            File.WriteAllText(Path.Combine(folder, "lists", "rack.yaml"), Rack);
            var diagnostics = new DiagnosticList();
            Assert.NotNull(SpecReader.Read(root, diagnostics));
            Assert.Empty(diagnostics);
            Assert.Throws<FileNotFoundException>(() => SpecReader.Read(Path.Combine(folder, "none.yaml"), diagnostics));
            Assert.ThrowsAny<IOException>(() => SpecReader.Read(folder, diagnostics));
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }
}
