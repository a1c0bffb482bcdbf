using System.Diagnostics.CodeAnalysis;
using FrameGen.Mechanics.Sections;
using FrameGen.Spec.Quantities;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A tube's section: <c>round 38 x 1.5 mm</c>, <c>rod 16 mm</c> and the flat-sided ones.</summary>
internal sealed class SectionForm : Form<Placed<Section>>
{
    /// <summary>The shapes of the format and how many sizes each has; the last is the wall.</summary>
    public static readonly IReadOnlyList<(string Shape, int Sizes, string Example)> Shapes =
    [
        ("round", 2, "round 38 x 1.5 mm"),
        ("rod", 1, "rod 16 mm"),
        ("square", 2, "square 40 x 2 mm"),
        ("rect", 3, "rect 60 x 40 x 2 mm"),
        ("ellipse", 3, "ellipse 45 x 28 x 1.5 mm"),
    ];

    /// <summary>Thinnest wall, mm: below it somebody has mistaken a unit.</summary>
    private const double ThinnestWall = 0.01;

    /// <summary>Largest outer size, mm: above it somebody has mistaken a unit.</summary>
    private const double LargestSize = 10_000;

    /// <inheritdoc/>
    public override string Words => "a section such as `round 38 x 1.5 mm` or `rod 16 mm`";

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out Placed<Section> value)
    {
        if (node is not YamlScalar { IsNothing: false } scalar)
        {
            return Refuse(node, reading, out value);
        }

        value = null;
        if (Values.IsTooLong(scalar, reading))
        {
            return false;
        }

        ExpressionSource source = Values.SourceOf(scalar);
        try
        {
            value = new Placed<Section>(Read(source), scalar.At);
            return true;
        }
        catch (ValueException wrong)
        {
            reading.Error(source.PlaceOf(wrong.Offset), wrong.Message);
            return false;
        }
    }

    private static Section Read(ExpressionSource source)
    {
        string text = source.Text;
        int wordEnd = 0;
        while (wordEnd < text.Length && char.IsAsciiLetter(text[wordEnd]))
        {
            wordEnd++;
        }

        string word = text[..wordEnd];
        (string Shape, int Sizes, string Example) shape = Shapes.FirstOrDefault(s => string.Equals(s.Shape, word, StringComparison.Ordinal));
        if (shape.Shape is null)
        {
            throw new ValueException(
                0, $"'{text}' does not begin with a shape ({string.Join(", ", Shapes.Select(s => s.Shape))}){NearestName.Suggest(word, Shapes.Select(s => s.Shape))}");
        }

        int sizesEnd = text.IndexOf("corner", wordEnd, StringComparison.Ordinal);
        bool hasCorner = sizesEnd >= 0;
        LiteralExpression[] sizes = Sizes(source, wordEnd, hasCorner ? sizesEnd : text.Length);
        if (sizes.Length != shape.Sizes)
        {
            throw new ValueException(0, $"{shape.Shape} takes {shape.Sizes} size{(shape.Sizes == 1 ? string.Empty : "s")}, as in `{shape.Example}`, not {sizes.Length}");
        }

        CheckSizes(shape.Shape, text, sizes);
        if (hasCorner)
        {
            CheckCorner(source, shape.Shape, sizesEnd + "corner".Length, sizes);
        }

        return shape.Shape switch
        {
            "round" => new RoundTube(sizes[0].Value, sizes[1].Value),
            "rod" => new Rod(sizes[0].Value),
            _ => throw new ValueException(0, NotYet.Message(shape.Shape)),
        };
    }

    private static LiteralExpression[] Sizes(ExpressionSource source, int start, int end)
    {
        var parts = new List<(int Start, int End)>();
        int partStart = start;
        for (int i = start; i <= end; i++)
        {
            if (i == end || source.Text[i] is 'x' or 'X' or '×')
            {
                parts.Add((partStart, i));
                partStart = i + 1;
            }
        }

        // The unit written last serves the sizes without one.
        LiteralExpression[] asWritten = [.. parts.Select(part => PlainValue.Read(source, part.Start, part.End, null, QuantityKind.Length))];
        Unit? last = asWritten.LastOrDefault(size => size.Unit is not null)?.Unit;
        LiteralExpression[] sizes = [.. parts.Select(part => PlainValue.Read(source, part.Start, part.End, last, QuantityKind.Length))];
        foreach (LiteralExpression size in sizes)
        {
            if (QuantityCheck.WrongKind(size, [QuantityKind.Length]) is { } wrong)
            {
                throw new ValueException(size.Start, wrong);
            }
        }

        return sizes;
    }

    private static void CheckSizes(string shape, string text, LiteralExpression[] sizes)
    {
        foreach (LiteralExpression size in sizes)
        {
            if (!(size.Value >= ThinnestWall && size.Value <= LargestSize))
            {
                throw new ValueException(
                    size.Start, $"`{size.Text}` in '{text}' comes to {SpecNumber.Text(size.Value)} mm; sizes go from {ThinnestWall} mm to {LargestSize} mm");
            }
        }

        if (sizes.Length == 1)
        {
            return;
        }

        LiteralExpression wall = sizes[^1];
        double smallest = sizes.SkipLast(1).Min(size => size.Value);
        if (!(wall.Value < smallest / 2))
        {
            throw new ValueException(
                wall.Start,
                $"a {SpecNumber.Text(wall.Value)} mm wall leaves no bore in '{text}'; use less than {SpecNumber.Text(smallest / 2)} mm{(shape is "round" ? ", or a rod" : string.Empty)}");
        }
    }

    private static void CheckCorner(ExpressionSource source, string shape, int start, LiteralExpression[] sizes)
    {
        if (shape is not ("square" or "rect"))
        {
            throw new ValueException(start - "corner".Length, $"a {shape} section has no corners; remove 'corner'");
        }

        LiteralExpression corner = PlainValue.Read(source, start, source.Text.Length, null, QuantityKind.Length);
        double half = sizes.SkipLast(1).Min(size => size.Value) / 2;
        string? wrong = QuantityCheck.WrongKind(corner, [QuantityKind.Length]);
        if (wrong is null && !(corner.Value >= 0 && corner.Value <= half))
        {
            wrong = $"a corner radius goes from 0 to half the smaller side, {SpecNumber.Text(half)} mm";
        }

        if (wrong is not null)
        {
            throw new ValueException(corner.Start, wrong);
        }
    }
}
