using System.Text;

namespace FrameGen.Formats;

/// <summary>A growing run of bytes that numbers and plain text are written to.</summary>
internal sealed class ByteSink(int capacity = 16384)
{
    private static readonly long[] PowersOfTen = [1, 10, 100, 1_000, 10_000, 100_000, 1_000_000, 10_000_000, 100_000_000];
    private byte[] _bytes = new byte[capacity];

    /// <summary>Bytes written so far.</summary>
    public int Length { get; private set; }

    /// <summary>What was written so far.</summary>
    public ReadOnlySpan<byte> Written => _bytes.AsSpan(0, Length);

    /// <summary>A copy of what was written.</summary>
    public byte[] ToArray() => Written.ToArray();

    /// <summary>Adds one byte.</summary>
    public ByteSink Byte(byte value)
    {
        Room(1)[0] = value;
        Length++;
        return this;
    }

    /// <summary>Adds bytes as they are.</summary>
    public ByteSink Bytes(ReadOnlySpan<byte> values)
    {
        values.CopyTo(Room(values.Length));
        Length += values.Length;
        return this;
    }

    /// <summary>Adds characters below 128.</summary>
    public ByteSink Ascii(string text)
    {
        Length += Encoding.ASCII.GetBytes(text, Room(text.Length));
        return this;
    }

    /// <summary>Adds a whole number.</summary>
    public ByteSink Integer(long value)
    {
        if (!value.TryFormat(Room(20), out int written, default, System.Globalization.CultureInfo.InvariantCulture))
        {
            throw new InvalidOperationException("A whole number of 64 bits takes 20 bytes at most.");
        }

        Length += written;
        return this;
    }

    /// <summary>Adds a decimal number, rounded half away from zero, without needless zeros; never <c>-0</c>.</summary>
    /// <param name="value">Finite, no more than 1e9 in size.</param>
    /// <param name="decimals">At most so many, 0 to 8.</param>
    /// <param name="keepPoint">True to print <c>2.0</c> rather than <c>2</c>.</param>
    /// <exception cref="ArgumentOutOfRangeException">The value is not finite or too large for a drawing.</exception>
    public ByteSink Decimal(double value, int decimals, bool keepPoint = false)
    {
        if (!(Math.Abs(value) <= 1e9))
        {
            throw new ArgumentOutOfRangeException(nameof(value), value, "A drawing holds finite numbers of no more than 1e9.");
        }

        long scale = PowersOfTen[decimals];
        long units = (long)Math.Round(value * scale, MidpointRounding.AwayFromZero);
        if (units < 0)
        {
            Byte((byte)'-');
            units = -units;
        }

        (long whole, long rest) = Math.DivRem(units, scale);
        Integer(whole);
        if (rest == 0)
        {
            return keepPoint ? Bytes(".0"u8) : this;
        }

        int digits = decimals;
        while (rest % 10 == 0)
        {
            rest /= 10;
            digits--;
        }

        Span<byte> span = Room(digits + 1);
        for (int i = digits; i > 0; i--)
        {
            (rest, long digit) = Math.DivRem(rest, 10);
            span[i] = (byte)('0' + digit);
        }

        span[0] = (byte)'.';
        Length += digits + 1;
        return this;
    }

    private Span<byte> Room(int size)
    {
        if (_bytes.Length - Length < size)
        {
            Array.Resize(ref _bytes, Math.Max(_bytes.Length * 2, Length + size));
        }

        return _bytes.AsSpan(Length);
    }
}
