using System.Text;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Spec;

namespace FrameGen.Tests.Output.Folders;

/// <summary>An empty folder of a test's own, gone after it.</summary>
internal sealed class ScratchFolder : IDisposable
{
    public string Path { get; } = Directory.CreateTempSubdirectory("framegen-test-").FullName;

    public string this[string name] => System.IO.Path.Join(Path, name);

    public void Dispose() => Directory.Delete(Path, recursive: true);

    /// <summary>Every file and link below, as path=content, sorted.</summary>
    public string[] Listing() =>
    [
        .. Directory.EnumerateFiles(Path, "*", new EnumerationOptions { RecurseSubdirectories = true, AttributesToSkip = FileAttributes.None })
            .Where(f => !f.EndsWith(Manifest.FileName, StringComparison.Ordinal))
            .Select(f => $"{System.IO.Path.GetRelativePath(Path, f)}={File.ReadAllText(f)}")
            .Order(StringComparer.Ordinal),
    ];

    /// <summary>A small set of papers with its manifest.</summary>
    public static IReadOnlyList<OutputFile> Papers(params (string Path, string Text)[] files)
    {
        var spec = new SpecIdentity([new SourceFile("x.yaml", default)], [], "x.yaml", Manifest.Hash([]), "x", string.Empty, string.Empty);
        OutputFile[] papers = [.. files.Select(f => OutputFile.FromText(f.Path, f.Text))];
        return [.. papers, new OutputFile(Manifest.FileName, Manifest.Of(spec, [], papers).Write())];
    }

    public void Write(string path, string text)
    {
        Directory.CreateDirectory(System.IO.Path.GetDirectoryName(this[path])!);
        File.WriteAllText(this[path], text, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false));
    }
}
