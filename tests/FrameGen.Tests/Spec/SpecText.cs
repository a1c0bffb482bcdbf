using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Spec;

namespace FrameGen.Tests.Spec;

/// <summary>Specs in memory, and what the reader says of them.</summary>
internal static class SpecText
{
    public const string Root = "specs/stand.yaml";

    /// <summary>A machine stand of one tube: the least that is a spec. Ends with a line end, so that keys can be added.</summary>
    public const string Small = """
        framegen: 1
        nodes:
          foot: [0 mm, 0 mm, 0 mm]
          head: [0 mm, 0 mm, 900 mm]
        tubes:
          post: {from: foot, to: head, group: posts}
        groups:
          posts: {material: S235, section: round 38 x 1.5 mm}

        """;

    public static (FrameSpec? Spec, DiagnosticList Diagnostics) Read(string text, params (string Path, string Text)[] others)
    {
        var files = others.ToDictionary(file => file.Path, file => Encoding.UTF8.GetBytes(file.Text), StringComparer.Ordinal);
        files[Root] = Encoding.UTF8.GetBytes(text);
        var diagnostics = new DiagnosticList();
        return (SpecReader.Read(Root, files.GetValueOrDefault, diagnostics), diagnostics);
    }

    /// <summary>Reads a spec that must be right.</summary>
    public static FrameSpec Sound(string text, params (string Path, string Text)[] others)
    {
        (FrameSpec? spec, DiagnosticList diagnostics) = Read(text, others);
        Xunit.Assert.Empty(diagnostics);
        return Xunit.Assert.IsType<FrameSpec>(spec);
    }

    /// <summary>Reads a spec that must be wrong.</summary>
    public static IReadOnlyList<Diagnostic> Errors(string text, params (string Path, string Text)[] others)
    {
        (FrameSpec? spec, DiagnosticList diagnostics) = Read(text, others);
        Xunit.Assert.Null(spec);
        Xunit.Assert.NotEmpty(diagnostics);
        return [.. diagnostics];
    }

    /// <summary>The one error of a spec, as it is printed.</summary>
    public static string OnlyError(string text, params (string Path, string Text)[] others) =>
        Xunit.Assert.Single(Errors(text, others)).ToString();

    /// <summary>Where a piece of a text begins, as an error points to it.</summary>
    public static string PlaceOf(string text, string piece, string file = Root)
    {
        int index = text.IndexOf(piece, StringComparison.Ordinal);
        Xunit.Assert.True(index >= 0, $"'{piece}' is not in the text");
        string before = text[..index];
        return $"{file}:{before.Count(c => c == '\n') + 1}:{index - before.LastIndexOf('\n')}:";
    }
}
