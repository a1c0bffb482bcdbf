namespace FrameGen.Output.Folders;

/// <summary>The place can't take the papers as things are; the user has to decide.</summary>
/// <param name="message">What is in the way, and what to do.</param>
/// <param name="files">Files in the way, by path; may be empty.</param>
public sealed class OutputRefusedException(string message, IReadOnlyList<string> files) : Exception(message)
{
    /// <summary>Files in the way, by path in the folder.</summary>
    public IReadOnlyList<string> Files { get; } = files;
}

/// <summary>What a write did.</summary>
/// <param name="Changed">False where the folder held these very bytes already.</param>
/// <param name="Kept">Where the user's files were moved to.</param>
/// <param name="Leftover">Why the old papers could not be cleared away; null where they were.</param>
public sealed record WriteResult(bool Changed, IReadOnlyList<string> Kept, string? Leftover);

/// <summary>A folder of papers that is replaced whole or not at all.</summary>
/// <remarks>
/// Beside the folder NAME: <c>.NAME.framegen-part</c> while files are being written, <c>.NAME.framegen-new</c> once they are
/// all there, <c>.NAME.framegen-old</c> between two renames where the system can't exchange folders, <c>.NAME.framegen-lock</c>
/// while a program is at it. After a program died, the next one takes up what it left: see <see cref="Recover"/>.
/// </remarks>
public sealed class OutputFolder
{
    private readonly string _part;
    private readonly string _new;
    private readonly string _old;
    private readonly string _lock;
    private readonly bool _exchange;
    private readonly KeptFiles _kept;

    /// <summary>Names the folder; nothing is touched yet.</summary>
    /// <param name="path">The folder itself, there or not.</param>
    /// <exception cref="OutputRefusedException">It is a link, a file, below a file, or the root of a file system.</exception>
    public OutputFolder(string path)
        : this(path, exchange: true)
    {
    }

    /// <summary>As above; without exchange two renames are used, as on systems that have no such step.</summary>
    internal OutputFolder(string path, bool exchange)
    {
        FullPath = Path.TrimEndingDirectorySeparator(Path.GetFullPath(path));
        string name = Path.GetFileName(FullPath);
        string? parent = Path.GetDirectoryName(FullPath);
        if (name.Length == 0 || parent is null)
        {
            throw new OutputRefusedException($"{path} can't be an output folder; name a folder below it with -o", []);
        }

        if (new DirectoryInfo(FullPath).LinkTarget is not null)
        {
            throw new OutputRefusedException($"{path} is a link; papers are written to real folders only: name the folder itself with -o", []);
        }

        if (File.Exists(FullPath))
        {
            throw new OutputRefusedException($"{path} is a file; name another folder with -o", []);
        }

        for (string? above = parent; above is not null; above = Path.GetDirectoryName(above))
        {
            if (File.Exists(above))
            {
                throw new OutputRefusedException($"{path} can't be an output folder, since {above} is a file; name another folder with -o", []);
            }
        }

        _part = Path.Join(parent, $".{name}.framegen-part");
        _new = Path.Join(parent, $".{name}.framegen-new");
        _old = Path.Join(parent, $".{name}.framegen-old");
        _lock = Path.Join(parent, $".{name}.framegen-lock");
        _kept = new KeptFiles(Path.Join(parent, $"{name}.kept"));
        _exchange = exchange;
    }

    /// <summary>Absolute path of the folder.</summary>
    public string FullPath { get; }

    /// <summary>Puts the files in place: all of them and nothing else, or nothing.</summary>
    /// <param name="files">The whole content, the manifest included.</param>
    /// <param name="replace">True to move a user's files to NAME.kept instead of refusing.</param>
    /// <exception cref="OutputRefusedException">The folder holds files that no build wrote, or that were changed since.</exception>
    /// <exception cref="IOException">The disk or the file system failed; the folder is as it was.</exception>
    /// <exception cref="UnauthorizedAccessException">No right to write there; the folder is as it was.</exception>
    public WriteResult Write(IReadOnlyList<OutputFile> files, bool replace)
    {
        Directory.CreateDirectory(Path.GetDirectoryName(FullPath)!);
        using FileStream held = FolderLock.Take(_lock, FullPath);
        var kept = new List<string>();
        FinishWhatIsLeft(kept);
        FolderState? present = Directory.Exists(FullPath) ? FolderState.Examine(FullPath) : null;
        IReadOnlyList<string> foreign = present?.Foreign ?? [];
        if (foreign.Count > 0 && !replace)
        {
            throw new OutputRefusedException(
                $"{FullPath} holds files that no build wrote, or that were changed since; move them away, or let --replace move them to {_kept.Folder}",
                foreign);
        }

        if (present is { Manifest: not null } && foreign.Count == 0 && HoldsAlready(present, files))
        {
            return new WriteResult(Changed: false, kept, Leftover: null);
        }

        Stage(files);
        foreach (string path in foreign)
        {
            kept.Add(_kept.Take(FullPath, path));
        }

        Swap(present is not null);
        return new WriteResult(Changed: true, kept, ClearAway(kept));
    }

    /// <summary>
    /// Completes what a program that died left beside the folder: a folder that was between two renames is put in place, old
    /// and half-written papers are cleared away. A user's file found among them is moved to NAME.kept.
    /// </summary>
    public void Recover()
    {
        if (Directory.Exists(_part) || Directory.Exists(_new) || Directory.Exists(_old))
        {
            using FileStream held = FolderLock.Take(_lock, FullPath);
            FinishWhatIsLeft([]);
        }
    }

    private void FinishWhatIsLeft(List<string> kept)
    {
        if (Directory.Exists(_part))
        {
            Directory.Delete(_part, recursive: true); // links in it are removed, not followed
        }

        if (!Directory.Exists(FullPath))
        {
            string? complete = Directory.Exists(_new) ? _new : Directory.Exists(_old) ? _old : null;
            if (complete is not null)
            {
                Directory.Move(complete, FullPath);
            }
        }

        Discard(_new, kept);
        Discard(_old, kept);
    }

    private bool HoldsAlready(FolderState present, IReadOnlyList<OutputFile> files)
    {
        OutputFile? manifest = files.FirstOrDefault(f => f.Path is Manifest.FileName);
        return present.Missing.Count == 0
            && manifest is not null
            && File.ReadAllBytes(Path.Join(FullPath, Manifest.FileName)).AsSpan().SequenceEqual(manifest.Bytes.Span);
    }

    private void Stage(IReadOnlyList<OutputFile> files)
    {
        try
        {
            Directory.CreateDirectory(_part);
            foreach (OutputFile file in files)
            {
                string path = Path.Join(_part, Inside(file.Path));
                Directory.CreateDirectory(Path.GetDirectoryName(path)!);
                using FileStream stream = new(path, FileMode.CreateNew, FileAccess.Write, FileShare.None, bufferSize: 0);
                stream.Write(file.Bytes.Span);
            }

            Directory.Move(_part, _new);
        }
        catch
        {
            if (Directory.Exists(_part))
            {
                Directory.Delete(_part, recursive: true);
            }

            throw;
        }
    }

    /// <summary>The path, after a check that it can't leave the folder.</summary>
    private static string Inside(string path) =>
        path.Split('/').All(n => n.Length > 0 && n is not ("." or "..") && n.AsSpan().IndexOfAny('\\', '\0') < 0)
            ? path
            : throw new ArgumentException($"'{path}' is not a path inside the output folder.", nameof(path));

    private void Swap(bool present)
    {
        if (!present)
        {
            Directory.Move(_new, FullPath);
        }
        else if (!_exchange || !FolderExchange.Try(_new, FullPath))
        {
            Directory.Move(FullPath, _old);
            Directory.Move(_new, FullPath);
        }
    }

    /// <summary>The new papers are in place: failing to clear away the old ones is told, and left to the next build.</summary>
    private string? ClearAway(List<string> kept)
    {
        try
        {
            Discard(_new, kept);
            Discard(_old, kept);
            return null;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return e.Message;
        }
    }

    /// <summary>Deletes a build's own files and their folders; anything else in there is a user's and is kept.</summary>
    private void Discard(string folder, List<string> kept)
    {
        if (!Directory.Exists(folder))
        {
            return;
        }

        FolderState state = FolderState.Examine(folder);
        foreach (string path in state.Foreign)
        {
            kept.Add(_kept.Take(folder, path));
        }

        // The manifest last: while it is there, a program that takes over knows the others.
        foreach (string path in state.Known.OrderBy(p => p is Manifest.FileName))
        {
            File.Delete(Path.Join(folder, path));
        }

        DeleteEmpty(folder);
    }

    private static void DeleteEmpty(string folder)
    {
        foreach (string inner in Directory.GetDirectories(folder))
        {
            DeleteEmpty(inner);
        }

        Directory.Delete(folder);
    }
}
