using System.Globalization;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using FrameGen.Geometry;

namespace FrameGen.Output;

/// <summary>How FrameGen writes JSON: indented, LF, UTF-8, numbers with 9 significant digits, short lists on one line.</summary>
public static class JsonText
{
    private static readonly JsonWriterOptions Options = new()
    {
        Indented = true,
        NewLine = "\n",

        // The files are read as files, never pasted into a page: names keep their letters.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <summary>A whole file, closed by a line end.</summary>
    /// <param name="write">Writes one value.</param>
    public static byte[] Bytes(Action<Utf8JsonWriter> write)
    {
        using var stream = new MemoryStream();
        using (var writer = new Utf8JsonWriter(stream, Options))
        {
            write(writer);
        }

        stream.WriteByte((byte)'\n');
        return stream.ToArray();
    }

    /// <summary>A number; null where it is not finite: JSON has no word for that.</summary>
    public static void Number(this Utf8JsonWriter writer, string name, double? value)
    {
        writer.WritePropertyName(name);
        writer.WriteRawValue(Digits(value));
    }

    /// <summary>A list of numbers on one line.</summary>
    public static void Numbers(this Utf8JsonWriter writer, string name, params ReadOnlySpan<double> values)
    {
        var text = new StringBuilder();
        Append(text, values);
        writer.WritePropertyName(name);
        writer.WriteRawValue(text.ToString());
    }

    /// <summary>A list of lists of numbers, on one line.</summary>
    public static void NumberRows(this Utf8JsonWriter writer, string name, IEnumerable<double[]> rows)
    {
        var text = new StringBuilder("[");
        foreach (double[] row in rows)
        {
            text.Append(text.Length > 1 ? ", " : string.Empty);
            Append(text, row);
        }

        writer.WritePropertyName(name);
        writer.WriteRawValue(text.Append(']').ToString());
    }

    /// <summary>A vector on one line; components that are rounding noise beside <paramref name="scale"/> are 0.</summary>
    /// <param name="writer">Where to.</param>
    /// <param name="name">Key.</param>
    /// <param name="vector">The vector.</param>
    /// <param name="scale">The largest magnitude of its kind; below 1e-12 of it a component means nothing.</param>
    public static void Vector(this Utf8JsonWriter writer, string name, Vector3 vector, double scale) =>
        writer.Numbers(name, Quiet(vector.X, scale), Quiet(vector.Y, scale), Quiet(vector.Z, scale));

    /// <summary>A number, or 0 where it is rounding noise.</summary>
    /// <param name="value">The number.</param>
    /// <param name="scale">The largest magnitude of its kind; below 1e-12 of it a number means nothing.</param>
    public static double Quiet(double value, double scale) => Math.Abs(value) <= 1e-12 * scale ? 0 : value;

    /// <summary>A list of texts on one line.</summary>
    public static void Strings(this Utf8JsonWriter writer, string name, IEnumerable<string> values)
    {
        writer.WritePropertyName(name);
        writer.WriteRawValue(List(values));
    }

    /// <summary>A list of lists of texts, on one line.</summary>
    public static void StringRows(this Utf8JsonWriter writer, string name, IEnumerable<IEnumerable<string>> rows)
    {
        writer.WritePropertyName(name);
        writer.WriteRawValue($"[{string.Join(", ", rows.Select(List))}]");
    }

    private static string List(IEnumerable<string> values) =>
        $"[{string.Join(", ", values.Select(v => $"\"{JsonEncodedText.Encode(v, JavaScriptEncoder.UnsafeRelaxedJsonEscaping)}\""))}]";

    private static void Append(StringBuilder text, ReadOnlySpan<double> values)
    {
        text.Append('[');
        for (int i = 0; i < values.Length; i++)
        {
            text.Append(i > 0 ? ", " : string.Empty).Append(Digits(values[i]));
        }

        text.Append(']');
    }

    private static string Digits(double? value) => value switch
    {
        null => "null",
        0 => "0",
        { } number when double.IsFinite(number) => number.ToString("G9", CultureInfo.InvariantCulture),
        _ => "null",
    };
}
