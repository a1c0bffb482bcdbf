using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Spec.Forms;
using FrameGen.Spec.Keys;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec;

/// <summary>Reads one file of a spec: bytes to text, text to a node tree, the tree's keys to what they hold.</summary>
internal static class SpecFile
{
    private static readonly UTF8Encoding Utf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>Reads a file.</summary>
    /// <param name="path">Its name in messages.</param>
    /// <param name="bytes">Its content.</param>
    /// <param name="form">What it is: a spec, or a file that a spec includes.</param>
    /// <param name="problems">What is wrong with it.</param>
    /// <returns>What its keys hold, as far as it could be read; null where nothing could.</returns>
    public static MapReading? Read(string path, byte[] bytes, MapForm<MapReading> form, ProblemList problems)
    {
        var top = new SourcePlace(path, 1, 1);
        try
        {
            YamlNode root = YamlComposer.Compose(path, Text(top, bytes), problems);
            if (root is YamlMapping map)
            {
                return HasKnownVersion(map, problems) ? form.ReadKeys(map, new Reading(problems, new Placed<string>(string.Empty, top))) : null;
            }

            problems.Error(root.At, $"expected keys with values (`framegen: 1`, `nodes: ...`), got {root.Words}");
        }
        catch (YamlProblem wrong)
        {
            problems.Error(wrong.At, wrong.Message);
        }

        return null;
    }

    /// <summary>A file of another version may mean something else by every key: nothing else is said of it.</summary>
    private static bool HasKnownVersion(YamlMapping map, ProblemList problems)
    {
        YamlEntry? version = map.Entries.FirstOrDefault(entry => entry.Key.Text is "framegen");
        if (version is null)
        {
            return true;
        }

        if (version.Value is not YamlScalar { Text: FileKeys.Version })
        {
            problems.Error(
                version.Value.At, $"this program reads version {FileKeys.Version} of the spec format, got {version.Value.Words}; write `framegen: {FileKeys.Version}`, or get the program that the spec was written for");
            return false;
        }

        if (!ReferenceEquals(version, map.Entries[0]))
        {
            problems.Error(version.Key.At, "'framegen' must be the first key of the file; move it up");
        }

        return true;
    }

    private static string Text(SourcePlace top, byte[] bytes)
    {
        if (bytes.Length > SpecFiles.LargestFile)
        {
            throw new YamlProblem(top, $"the file is larger than {SpecFiles.LargestFile} bytes (1 MiB); no frame needs so much");
        }

        if (bytes is [0xFE, 0xFF, ..] or [0xFF, 0xFE, ..])
        {
            throw new YamlProblem(top, "the file is UTF-16; save it as UTF-8");
        }

        // A byte order mark left in place would become a part of the first key.
        int start = bytes is [0xEF, 0xBB, 0xBF, ..] ? 3 : 0;
        string text;
        try
        {
            text = Utf8.GetString(bytes, start, bytes.Length - start);
        }
        catch (DecoderFallbackException wrong)
        {
            throw new YamlProblem(PlaceOfByte(top, bytes, start, start + wrong.Index), "this is not UTF-8 text; save the file as UTF-8");
        }

        int control = text.AsSpan().IndexOfAny(Controls);
        return control < 0
            ? text
            : throw new YamlProblem(PlaceOfCharacter(top, text, control), $"the control character U+{(int)text[control]:X4} has no place in a spec; remove it");
    }

    private static readonly System.Buffers.SearchValues<char> Controls = System.Buffers.SearchValues.Create(
        [.. Enumerable.Range(0, 32).Append(127).Select(code => (char)code).Where(c => c is not ('\t' or '\n' or '\r'))]);

    private static SourcePlace PlaceOfByte(SourcePlace top, byte[] bytes, int start, int index)
    {
        // What stands before the first wrong byte is right; Latin-1 would do as well, were it not for the column.
        string before = Encoding.UTF8.GetString(bytes, start, Math.Clamp(index - start, 0, bytes.Length - start));
        return PlaceOfCharacter(top, before, before.Length);
    }

    private static SourcePlace PlaceOfCharacter(SourcePlace top, string text, int index)
    {
        int line = 1;
        int lineStart = 0;
        for (int i = 0; i < index; i++)
        {
            // CR LF is one end of line: counted at its LF.
            if (text[i] == '\n' || (text[i] == '\r' && (i + 1 == text.Length || text[i + 1] != '\n')))
            {
                line++;
                lineStart = i + 1;
            }
        }

        return top with { Line = line, Column = index - lineStart + 1 };
    }
}
