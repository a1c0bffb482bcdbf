namespace FrameGen.Spec;

/// <summary>One file of a spec, as read.</summary>
/// <param name="Path">As the user or the including file named it; used in messages.</param>
/// <param name="Bytes">Its exact bytes, for the copy in <c>spec/</c> and the hash.</param>
public sealed record SourceFile(string Path, ReadOnlyMemory<byte> Bytes);
