using FrameGen.Diagnostics;
using FrameGen.Spec.Forms;
using FrameGen.Spec.Keys;

namespace FrameGen.Spec;

/// <summary>A spec's root file and all that it includes, each read once; what they share out is collected here.</summary>
/// <param name="content">Gives the bytes of a file, or null.</param>
internal sealed class IncludedFiles(Func<string, byte[]?> content)
{
    /// <summary>Most files of a spec.</summary>
    public const int MostFiles = 100;

    private readonly List<SourceFile> _files = [];
    private readonly List<(string Path, int File)> _includes = [];
    private readonly List<string> _open = [];
    private readonly List<ParameterSpec> _parameters = [];
    private readonly List<MaterialSpec> _materials = [];
    private readonly List<StockListSpec> _stock = [];
    private readonly Dictionary<string, SourcePlace> _names = new(StringComparer.OrdinalIgnoreCase);

    /// <summary>What is wrong with any of them.</summary>
    public ProblemList Problems { get; } = new();

    /// <summary>The root first, then the others in the order of reading.</summary>
    public IReadOnlyList<SourceFile> Files => _files;

    /// <summary>The path of each <c>include</c> entry as written, and the file it means.</summary>
    public IReadOnlyList<(string Path, int File)> Includes => _includes;

    /// <summary>Parameters of all files.</summary>
    public IReadOnlyList<ParameterSpec> Parameters => _parameters;

    /// <summary>Materials of all files.</summary>
    public IReadOnlyList<MaterialSpec> Materials => _materials;

    /// <summary>Stock lists of all files.</summary>
    public IReadOnlyList<StockListSpec> Stock => _stock;

    /// <summary>Reads the root file and everything it includes.</summary>
    /// <returns>The root's keys as far as they could be read; null where nothing could.</returns>
    public MapReading? ReadRoot(string path, byte[] bytes) => Read(path, bytes, FileKeys.Spec);

    /// <summary>Reads the pinned sizes beside the root file.</summary>
    /// <returns>Null where there are none, or where they are wrong.</returns>
    public FrozenSpec? ReadFrozen(string root)
    {
        string path = FrozenSpec.PathBeside(root);
        if (content(path) is not { } bytes || SpecFile.Read(path, bytes, FrozenKeys.File, Problems) is not { IsSound: true } read)
        {
            return null;
        }

        return new FrozenSpec(
            new SourceFile(path, bytes),
            read.Get(FrozenKeys.Freezes),
            read.Items(FrozenKeys.Stock),
            read.Get(FrozenKeys.Groups),
            read.Items(FrozenKeys.Marks));
    }

    private MapReading? Read(string path, byte[] bytes, MapForm<MapReading> form)
    {
        _files.Add(new SourceFile(path, bytes));
        _open.Add(path);
        MapReading? read = SpecFile.Read(path, bytes, form, Problems);
        if (read is not null)
        {
            TakeIn("parameter", read.Items(FileKeys.Parameters), _parameters, parameter => parameter.Name);
            TakeIn("material", read.Items(FileKeys.Materials), _materials, material => material.Name);
            TakeIn("stock list", read.Items(FileKeys.Stock), _stock, list => list.Name);
            foreach (Placed<string> include in read.Items(FileKeys.Include))
            {
                Include(path, include);
            }
        }

        _open.RemoveAt(_open.Count - 1);
        return read;
    }

    private void Include(string including, Placed<string> include)
    {
        string path = SpecFiles.Combine(including, include.Value);
        int open = _open.FindIndex(file => SamePath(file, path));
        if (open >= 0)
        {
            Problems.Error(include.At, $"files include each other in a circle: {string.Join(" -> ", _open[open..].Append(path))}; remove one of the includes");
            return;
        }

        int known = _files.FindIndex(file => SamePath(file.Path, path));
        if (known < 0)
        {
            if (_files.Count == MostFiles)
            {
                Problems.Error(include.At, $"more than {MostFiles} files; put lists together");
                return;
            }

            if (Content(path, include) is not { } bytes)
            {
                return;
            }

            known = _files.Count;
            Read(path, bytes, FileKeys.Included);
        }

        if (!_includes.Contains((include.Value, known)))
        {
            _includes.Add((include.Value, known));
        }
    }

    private byte[]? Content(string path, Placed<string> include)
    {
        try
        {
            byte[]? bytes = content(path);
            if (bytes is null)
            {
                Problems.Error(include.At, $"there is no file '{include.Value}' (looked for '{path}'); a path is relative to the file it stands in");
            }

            return bytes;
        }
        catch (IOException refused)
        {
            Problems.Error(include.At, $"'{include.Value}' can't be read: {refused.Message}");
            return null;
        }
    }

    private void TakeIn<T>(string what, IReadOnlyList<T> items, List<T> all, Func<T, Placed<string>> nameOf)
    {
        foreach (T item in items)
        {
            Placed<string> name = nameOf(item);

            // Within one file the form has compared the names already.
            if (_names.TryGetValue($"{what} {name.Value}", out SourcePlace? first))
            {
                Problems.Error(name.At, $"{what} '{name.Value}' stands in {first} already; rename or remove one of the two");
                continue;
            }

            _names.Add($"{what} {name.Value}", name.At);
            all.Add(item);
        }
    }

    /// <summary>The root is named as the user likes: <c>./a.yaml</c> is the <c>a.yaml</c> that another file includes.</summary>
    private static bool SamePath(string a, string b) =>
        string.Equals(SpecFiles.Combine(string.Empty, a), SpecFiles.Combine(string.Empty, b), StringComparison.Ordinal)
        && a.StartsWith('/') == b.StartsWith('/');
}
