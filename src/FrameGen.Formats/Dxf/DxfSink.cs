namespace FrameGen.Formats.Dxf;

/// <summary>Writes DXF's group pairs: a code on one line, its value on the next.</summary>
internal sealed class DxfSink
{
    private readonly ByteSink _bytes = new(32768);

    /// <summary>Adds a pair with text that is ASCII already.</summary>
    public DxfSink Add(int code, string value)
    {
        Code(code).Ascii(value).Byte((byte)'\n');
        return this;
    }

    /// <summary>Adds a pair with a whole number.</summary>
    public DxfSink Add(int code, int value)
    {
        Code(code).Integer(value).Byte((byte)'\n');
        return this;
    }

    /// <summary>Adds a pair with a real number, at 1e-6.</summary>
    public DxfSink Real(int code, double value)
    {
        Code(code).Decimal(value, 6, keepPoint: true).Byte((byte)'\n');
        return this;
    }

    /// <summary>Adds x, y and z = 0 under a code, code + 10 and code + 20.</summary>
    public DxfSink Point(int code, double x, double y) => Real(code, x).Real(code + 10, y).Real(code + 20, 0);

    /// <summary>Adds x and y under a code and code + 10.</summary>
    public DxfSink Flat(int code, double x, double y) => Real(code, x).Real(code + 10, y);

    /// <summary>Adds a pair with a handle, which DXF writes in hexadecimal.</summary>
    public DxfSink Handle(int code, int value)
    {
        Code(code).Ascii(value.ToString("X", System.Globalization.CultureInfo.InvariantCulture)).Byte((byte)'\n');
        return this;
    }

    /// <summary>Begins a section.</summary>
    public DxfSink Section(string name) => Add(0, "SECTION").Add(2, name);

    /// <summary>Ends a section.</summary>
    public DxfSink EndSection() => Add(0, "ENDSEC");

    /// <summary>What was written.</summary>
    public byte[] ToArray() => _bytes.ToArray();

    private ByteSink Code(int code)
    {
        // Readers take the code without padding; older ones were written against codes that fill three places.
        if (code < 100)
        {
            _bytes.Byte((byte)' ');
            if (code < 10)
            {
                _bytes.Byte((byte)' ');
            }
        }

        return _bytes.Integer(code).Byte((byte)'\n');
    }
}
