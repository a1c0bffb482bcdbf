using FrameGen.Diagnostics;

namespace FrameGen.Output.Folders;

/// <summary>Whether a folder's papers are whole, unchanged, and what a spec gives.</summary>
/// <param name="Manifest">Null where the folder has none that can be read.</param>
/// <param name="Files">How many files the manifest names.</param>
/// <param name="Differences">What is not as it should be, by path.</param>
/// <param name="Rebuilt">True where the papers were built again from the copy of the spec and compared.</param>
/// <param name="Remark">Why they were not; empty where they were.</param>
public sealed record VerifyResult(
    Manifest? Manifest, int Files, IReadOnlyList<Difference> Differences, bool Rebuilt, string Remark)
{
    /// <summary>True where nothing differs.</summary>
    public bool Matches => Differences.Count == 0;
}

/// <summary>How a file is not as it should be.</summary>
/// <param name="Path">In the folder.</param>
/// <param name="Kind">missing, changed, extra: against the manifest; rebuilt: against the papers its own spec gives; spec: against
/// those that the spec asked about gives.</param>
public sealed record Difference(string Path, string Kind);

/// <summary>Holds a folder against its manifest, against its own spec, and against another spec.</summary>
public static class FolderVerifier
{
    /// <summary>Checks a folder; completes the swap of a build that died half-way first.</summary>
    /// <param name="folder">The folder.</param>
    /// <param name="spec">A spec whose papers these should be; null for none.</param>
    /// <param name="pipeline">Builds papers.</param>
    /// <param name="diagnostics">What <paramref name="pipeline"/> reports to: errors of <paramref name="spec"/>.</param>
    /// <exception cref="IOException">A file can't be read.</exception>
    public static VerifyResult Verify(OutputFolder folder, string? spec, FramePipeline pipeline, DiagnosticList diagnostics)
    {
        folder.Recover();
        FolderState state = FolderState.Examine(folder.FullPath);
        List<Difference> differences =
        [
            .. state.Missing.Select(p => new Difference(p, "missing")),
            .. state.Changed.Select(p => new Difference(p, "changed")),
            .. state.Extra.Select(p => new Difference(p, "extra")),
        ];
        string remark = WhyNotRebuilt(state);
        if (remark.Length == 0)
        {
            var copies = new SpecInFolder(folder.FullPath, state.Manifest!);
            IReadOnlyList<OutputFile>? rebuilt = pipeline.Build(pipeline.Read(state.Manifest!.SpecFile, copies.Content), state.Manifest.Options);
            HashSet<string> named = [.. differences.Select(d => d.Path)];
            differences.AddRange(Compare(folder.FullPath, rebuilt, "rebuilt").Where(d => !named.Contains(d.Path)));
        }

        if (spec is not null && pipeline.Build(pipeline.Read(spec), state.Manifest?.Options) is { } today)
        {
            differences.AddRange(Compare(folder.FullPath, today, "spec"));
        }

        return new VerifyResult(state.Manifest, state.Manifest?.Files.Count ?? 0, differences, remark.Length == 0, remark);
    }

    private static string WhyNotRebuilt(FolderState state)
    {
        if (state.Manifest is not { } manifest)
        {
            return "there is no manifest that says what they were built from";
        }

        if (!string.Equals(manifest.ToolVersion, ToolIdentity.Version, StringComparison.Ordinal))
        {
            return $"they were built by {manifest.ToolName} {manifest.ToolVersion}, this is {ToolIdentity.Version}: the hashes only were compared";
        }

        // Only files that are in the folder's own list and as they were: a manifest can't send the reader elsewhere.
        string? lost = SpecInFolder.Files(manifest).FirstOrDefault(f => !state.Known.Contains(f, StringComparer.Ordinal));
        return lost is null ? string.Empty : $"{lost} is not as it was: the hashes only were compared";
    }

    private static IEnumerable<Difference> Compare(string folder, IReadOnlyList<OutputFile>? files, string kind)
    {
        if (files is null)
        {
            return [new Difference("spec", kind)];
        }

        return files
            .Where(f => !Same(Path.Join(folder, f.Path), f.Bytes.Span))
            .Select(f => new Difference(f.Path, kind))
            .OrderBy(d => d.Path, StringComparer.Ordinal);
    }

    private static bool Same(string path, ReadOnlySpan<byte> bytes) =>
        File.Exists(path) && File.ReadAllBytes(path).AsSpan().SequenceEqual(bytes);
}
