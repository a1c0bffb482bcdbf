using System.Text;

namespace FrameGen.Output;

/// <summary>One file of a build.</summary>
/// <param name="Path">Inside the output folder, with <c>/</c> between names.</param>
/// <param name="Bytes">Its content.</param>
public sealed record OutputFile(string Path, ReadOnlyMemory<byte> Bytes)
{
    /// <summary>A text file: UTF-8 without a byte-order mark.</summary>
    public static OutputFile FromText(string path, string text) => new(path, Encoding.UTF8.GetBytes(text));
}
