namespace FrameGen.Spec.Quantities;

/// <summary>A value that can't be read; caught where its place is known.</summary>
/// <param name="offset">Offset in the value's text at which it goes wrong.</param>
/// <param name="message">In the user's words.</param>
internal sealed class ValueException(int offset, string message) : Exception(message)
{
    /// <summary>Offset in the value's text at which it goes wrong.</summary>
    public int Offset => offset;
}
