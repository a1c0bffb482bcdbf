using System.Security.Cryptography;
using System.Text.Json;
using FrameGen.Formats.Dxf;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Output;

/// <summary>manifest.json: what a folder of papers was made from, by which version, and the hash of every file in it.</summary>
/// <param name="SpecFile">Base name of the spec, which is copied into <c>spec/</c>.</param>
/// <param name="SpecSha256">Hash of the spec.</param>
/// <param name="Includes">Included files in the order of reading: path as written, place of the copy in the folder.</param>
/// <param name="ToolName">The program.</param>
/// <param name="ToolVersion">Its version.</param>
/// <param name="Files">Every file but the manifest itself, by path.</param>
public sealed record Manifest(
    string SpecFile,
    string SpecSha256,
    IReadOnlyList<(string Path, string File)> Includes,
    string ToolName,
    string ToolVersion,
    IReadOnlyList<ManifestEntry> Files)
{
    /// <summary>Name of the file in an output folder.</summary>
    public const string FileName = "manifest.json";

    private const string Format = "framegen-manifest/1";
    private const string Release12 = "r12";
    private const string Year2000 = "2000";
    private const string Inches = "in";
    private const string Millimetres = "mm";

    /// <summary>Where the copy of the pinned sizes is in the folder; null where sizes were not pinned.</summary>
    public string? Frozen { get; init; }

    /// <summary>What was asked for beside the spec.</summary>
    public PaperOptions Options { get; init; } = PaperOptions.Default;

    /// <summary>Describes the files of a build.</summary>
    public static Manifest Of(SpecIdentity spec, IReadOnlyList<(string Path, string File)> includes, IEnumerable<OutputFile> files) =>
        new(
            spec.FileName,
            spec.Sha256,
            includes,
            ToolIdentity.Name,
            ToolIdentity.Version,
            [.. files.OrderBy(f => f.Path, StringComparer.Ordinal).Select(f => new ManifestEntry(f.Path, Hash(f.Bytes.Span)))])
        {
            Frozen = spec.Frozen is null ? null : SpecCopies.Folder + FrozenSpec.PathBeside(spec.FileName),
        };

    /// <summary>SHA-256 in lower-case hex.</summary>
    public static string Hash(ReadOnlySpan<byte> bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));

    /// <summary>Writes the file.</summary>
    public byte[] Write() => JsonText.Bytes(json =>
    {
        json.WriteStartObject();
        json.WriteString("format", Format);
        json.WriteStartObject("spec");
        json.WriteString("file", SpecFile);
        json.WriteString("sha256", SpecSha256);
        if (Includes.Count > 0)
        {
            json.WriteStartArray("includes");
            foreach ((string path, string file) in Includes)
            {
                json.WriteStartObject();
                json.WriteString("path", path);
                json.WriteString("file", file);
                json.WriteEndObject();
            }

            json.WriteEndArray();
        }

        if (Frozen is not null)
        {
            json.WriteString("frozen", Frozen);
        }

        json.WriteEndObject();
        json.WriteStartObject("tool");
        json.WriteString("name", ToolName);
        json.WriteString("version", ToolVersion);
        json.WriteEndObject();
        if (Options != PaperOptions.Default)
        {
            json.WriteStartObject("options");
            json.WriteString("dxf", Options.Dxf.Version == DxfVersion.R12 ? Release12 : Year2000);
            json.WriteString("dxf_units", Options.Dxf.Inches ? Inches : Millimetres);
            json.WriteBoolean("svg", Options.Svg);
            json.WriteEndObject();
        }

        json.WriteStartArray("files");
        foreach (ManifestEntry entry in Files)
        {
            json.WriteStartObject();
            json.WriteString("path", entry.Path);
            json.WriteString("sha256", entry.Sha256);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
    });

    /// <summary>Reads a manifest; null where the bytes are not one.</summary>
    public static Manifest? Read(ReadOnlyMemory<byte> bytes)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(bytes);
            JsonElement root = document.RootElement;
            if (!string.Equals(root.GetProperty("format").GetString(), Format, StringComparison.Ordinal))
            {
                return null;
            }

            JsonElement spec = root.GetProperty("spec");
            JsonElement tool = root.GetProperty("tool");
            return new Manifest(
                Text(spec, "file"),
                Text(spec, "sha256"),
                spec.TryGetProperty("includes", out JsonElement includes)
                    ? [.. includes.EnumerateArray().Select(i => (Text(i, "path"), Text(i, "file")))]
                    : [],
                Text(tool, "name"),
                Text(tool, "version"),
                [.. root.GetProperty("files").EnumerateArray().Select(f => new ManifestEntry(Text(f, "path"), Text(f, "sha256")))])
            {
                Frozen = spec.TryGetProperty("frozen", out _) ? Text(spec, "frozen") : null,
                Options = root.TryGetProperty("options", out JsonElement options) ? OptionsOf(options) : PaperOptions.Default,
            };
        }
        catch (Exception e) when (e is JsonException or KeyNotFoundException or InvalidOperationException)
        {
            return null;
        }
    }

    private static PaperOptions OptionsOf(JsonElement options) => new(
        new DxfFormat(
            OneOf(options, "dxf", Release12, Year2000) ? DxfVersion.R12 : DxfVersion.R2000, OneOf(options, "dxf_units", Inches, Millimetres)),
        options.GetProperty("svg").GetBoolean());

    private static bool OneOf(JsonElement element, string name, string first, string second)
    {
        string text = Text(element, name);
        return string.Equals(text, first, StringComparison.Ordinal)
            || (string.Equals(text, second, StringComparison.Ordinal) ? false : throw new JsonException($"{name} is {text}"));
    }

    private static string Text(JsonElement element, string name) =>
        element.GetProperty(name).GetString() ?? throw new JsonException($"{name} is null");
}

/// <summary>A file and its hash.</summary>
/// <param name="Path">Inside the folder, with <c>/</c> between names.</param>
/// <param name="Sha256">Lower-case hex.</param>
public sealed record ManifestEntry(string Path, string Sha256);
