using System.Diagnostics.CodeAnalysis;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Spec.Quantities;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>
/// A tube's section: <c>round 38 x 1.5 mm</c>, <c>rod 16 mm</c>, <c>square 40 x 2 mm</c>, <c>rect 60 x 40 x 2 mm corner 5 mm</c>,
/// <c>ellipse 45 x 28 x 1.5 mm</c>.
/// </summary>
/// <remarks>
/// <c>corner</c> is the outer radius; the inner one is that less the wall, or 0, unless <c>inner</c> gives it: hot-finished tube has an inner
/// radius of its own, and a section's printed name has to read back as the same section.
/// </remarks>
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

    private const string Corner = "corner";
    private const string Inner = "inner";

    /// <summary>Thinnest wall, mm: below it somebody has mistaken a unit.</summary>
    private const double ThinnestWall = 0.01;

    /// <summary>Largest outer size, mm: above it somebody has mistaken a unit.</summary>
    private const double LargestSize = 10_000;

    /// <inheritdoc/>
    public override string Words => "a section such as `round 38 x 1.5 mm` or `rect 60 x 40 x 2 mm`";

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

        (int corner, int inner) = CornerWords(text, wordEnd);
        LiteralExpression[] sizes = Sizes(source, wordEnd, corner);
        if (sizes.Length != shape.Sizes)
        {
            throw new ValueException(0, $"{shape.Shape} takes {shape.Sizes} size{(shape.Sizes == 1 ? string.Empty : "s")}, as in `{shape.Example}`, not {sizes.Length}");
        }

        CheckSizes(shape.Shape, text, sizes);
        if (corner < text.Length && shape.Shape is not ("square" or "rect"))
        {
            throw new ValueException(corner, $"{(shape.Shape is "ellipse" ? "an" : "a")} {shape.Shape} section has no corners; remove '{Corner}'");
        }

        return shape.Shape switch
        {
            "round" => new RoundTube(sizes[0].Value, sizes[1].Value),
            "rod" => new Rod(sizes[0].Value),
            "ellipse" => Ellipse(text, sizes),
            _ => FlatSided(source, sizes, corner, inner),
        };
    }

    // Where `corner` and `inner` stand; the text's end for one that is not written.
    private static (int Corner, int Inner) CornerWords(string text, int start)
    {
        int corner = text.IndexOf(Corner, start, StringComparison.Ordinal);
        int inner = text.IndexOf(Inner, start, StringComparison.Ordinal);
        if (inner >= 0 && (corner < 0 || inner < corner))
        {
            throw new ValueException(inner, $"'{Inner}' goes after '{Corner}', as in `square 40 x 3.2 mm corner 4.8 mm inner 3.2 mm`");
        }

        return (corner < 0 ? text.Length : corner, inner < 0 ? text.Length : inner);
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

    private static EllipseTube Ellipse(string text, LiteralExpression[] sizes)
    {
        double larger = Math.Max(sizes[0].Value, sizes[1].Value);
        double smaller = Math.Min(sizes[0].Value, sizes[1].Value);
        if (larger > EllipseOutline.MostSlender * smaller)
        {
            throw new ValueException(
                sizes[0].Start, $"'{text}' is more than {SpecNumber.Text(EllipseOutline.MostSlender)} times as long as it is wide; sizes of an ellipse lie nearer together");
        }

        double sharpest = EllipseOutline.LeastRadiusOfCurvature(sizes[0].Value, sizes[1].Value);
        return sizes[2].Value < sharpest
            ? new EllipseTube(sizes[0].Value, sizes[1].Value, sizes[2].Value)
            : throw new ValueException(
                sizes[2].Start,
                $"a {SpecNumber.Text(sizes[2].Value)} mm wall gives the bore of '{text}' a kink where the ellipse bends most; "
                + $"use less than that bend's radius, {SpecNumber.Text(sharpest)} mm");
    }

    private static FlatSidedTube FlatSided(ExpressionSource source, LiteralExpression[] sizes, int cornerAt, int innerAt)
    {
        (double height, double width, LiteralExpression wall) = (sizes[0].Value, sizes[^2].Value, sizes[^1]);
        double t = wall.Value;
        double half = Math.Min(height, width) / 2;
        if (cornerAt == source.Text.Length)
        {
            return FlatSidedTube.RuleOuterCorner(t) <= half
                ? new FlatSidedTube(height, width, t)
                : throw new ValueException(
                    wall.Start,
                    $"the corners of EN 10219-2 for a {SpecNumber.Text(t)} mm wall, of {SpecNumber.Text(FlatSidedTube.RuleOuterCorner(t))} mm radius, do not fit into "
                    + $"a side of {SpecNumber.Text(2 * half)} mm; write the tube's own: `{source.Text.Trim()} corner {SpecNumber.Text(t)} mm`");
        }

        double corner = Radius(source, cornerAt + Corner.Length, innerAt, 0, half, "a corner radius goes from 0 to half the smaller side,");
        (double least, double most) = FlatSidedTube.InnerCornerRange(height, width, t, corner);
        return innerAt == source.Text.Length
            ? new FlatSidedTube(height, width, t, corner)
            : new FlatSidedTube(
                height, width, t, corner, Radius(source, innerAt + Inner.Length, source.Text.Length, least, most, "the inner radius of this corner goes from"));
    }

    private static double Radius(ExpressionSource source, int start, int end, double least, double most, string range)
    {
        LiteralExpression radius = PlainValue.Read(source, start, end, null, QuantityKind.Length);
        string? wrong = QuantityCheck.WrongKind(radius, [QuantityKind.Length]);
        if (wrong is null && !(radius.Value >= least && radius.Value <= most))
        {
            wrong = range.EndsWith("from", StringComparison.Ordinal)
                ? $"{range} {SpecNumber.Text(least)} mm to {SpecNumber.Text(most)} mm"
                : $"{range} {SpecNumber.Text(most)} mm";
        }

        return wrong is null ? radius.Value : throw new ValueException(radius.Start, wrong);
    }
}
