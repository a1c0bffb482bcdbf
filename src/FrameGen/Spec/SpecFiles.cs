namespace FrameGen.Spec;

/// <summary>Reads files from disk, and no more of each than a spec may have.</summary>
internal static class SpecFiles
{
    /// <summary>Largest file, bytes.</summary>
    public const int LargestFile = 1 << 20;

    /// <summary>A file's bytes; of a file that is too large, just enough to see that.</summary>
    /// <returns>Null where there is no such file.</returns>
    /// <exception cref="IOException">It is there and can't be read.</exception>
    public static byte[]? FromDisk(string path)
    {
        try
        {
            using FileStream file = File.OpenRead(path);
            byte[] bytes = new byte[LargestFile + 1];
            int count = file.ReadAtLeast(bytes, bytes.Length, throwOnEndOfStream: false);
            return bytes[..count];
        }
        catch (Exception missing) when (missing is FileNotFoundException or DirectoryNotFoundException)
        {
            return null;
        }
        catch (Exception refused) when (refused is UnauthorizedAccessException or NotSupportedException or ArgumentException)
        {
            throw new IOException(refused.Message, refused);
        }
    }

    /// <summary>The path of a file that another one includes.</summary>
    /// <param name="including">Path of the including file.</param>
    /// <param name="relative">As written there, with <c>/</c>.</param>
    /// <returns>Without <c>.</c> and with <c>..</c> resolved as far as the including path goes.</returns>
    public static string Combine(string including, string relative)
    {
        char[] separators = OperatingSystem.IsWindows() ? ['/', '\\'] : ['/'];
        int folderEnd = including.LastIndexOfAny(separators) + 1;
        string root = folderEnd > 0 && separators.Contains(including[0]) ? "/" : string.Empty;
        var parts = new List<string>();
        foreach (string part in including[..folderEnd].Split(separators).Concat(relative.Split('/')))
        {
            switch (part)
            {
                case "" or ".":
                    break;
                case ".." when parts.Count > 0 && parts[^1] is not "..":
                    parts.RemoveAt(parts.Count - 1);
                    break;
                default:
                    parts.Add(part);
                    break;
            }
        }

        return root + string.Join('/', parts);
    }
}
