namespace FrameGen.Spec.Forms;

/// <summary>The error for what the format has and the program has not, yet: never silently left out.</summary>
internal static class NotYet
{
    /// <summary>The message for a key or word.</summary>
    public static string Message(string what) => $"not supported yet: {what} (the format has it, this version can't build it; remove it)";
}
