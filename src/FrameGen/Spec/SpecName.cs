namespace FrameGen.Spec;

/// <summary>What may be a name. Names are compared without regard to case, since they become file names.</summary>
internal static class SpecName
{
    /// <summary>What a name looks like, for messages.</summary>
    public const string Rule = "a letter, then letters, digits, '_' or '-', 64 at most";

    /// <summary>Most characters of a name.</summary>
    public const int Longest = 64;

    private static readonly string[] Devices = ["con", "prn", "aux", "nul"];

    /// <summary>True for <c>[A-Za-z][A-Za-z0-9_-]{0,63}</c>.</summary>
    public static bool IsName(string text) =>
        text.Length is > 0 and <= Longest && char.IsAsciiLetter(text[0]) && text.All(IsNameCharacter);

    /// <summary>True for a material's name, which may begin with a digit and hold <c>.</c> and <c>+</c>: <c>E235+N</c>, <c>1.4301</c>.</summary>
    public static bool IsMaterialName(string text) =>
        text.Length is > 0 and <= Longest
        && char.IsAsciiLetterOrDigit(text[0])
        && text.All(c => IsNameCharacter(c) || c is '.' or '+');

    /// <summary>True for names that Windows gives to devices: no file can bear them.</summary>
    public static bool IsDeviceName(string text)
    {
        string lower = text.ToLowerInvariant();
        return Devices.Contains(lower, StringComparer.Ordinal)
            || (lower.Length == 4
                && (lower.StartsWith("com", StringComparison.Ordinal) || lower.StartsWith("lpt", StringComparison.Ordinal))
                && char.IsAsciiDigit(lower[3]));
    }

    private static bool IsNameCharacter(char c) => char.IsAsciiLetterOrDigit(c) || c is '_' or '-';
}
