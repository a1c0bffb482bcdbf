using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Output.Drawings;
using Xunit;

namespace FrameGen.Acceptance.Formats;

/// <summary>What a builder sees at once on a bad drawing: words across lines or each other, lines drawn twice, things left out.</summary>
public class DrawingLayoutTests
{
    public static TheoryData<string> Names => DrawnTubes.Names;

    public static TheoryData<string> FittedNames => DrawnTubes.FittedNames;

    [Theory]
    [MemberData(nameof(FittedNames))]
    public void Words_on_a_template_cross_no_line_and_no_other_words(string name)
    {
        (var package, var part) = DrawnTubes.Named(name).Build();
        WordsAreClear(TemplatePieces.Draw(package, part)!);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Words_on_a_developed_pattern_cross_no_line_and_no_other_words(string name)
    {
        (var package, var part) = DrawnTubes.Named(name).Build();
        WordsAreClear(DevelopedPattern.Draw(package, part));
    }

    [Theory]
    [MemberData(nameof(FittedNames))]
    public void Words_stay_on_the_piece_of_paper(string name)
    {
        DrawnTube tube = DrawnTubes.Named(name);
        (var package, var part) = tube.Build();

        // Capitals of 1.5 mm are small print; only what is thinner than a pencil asks for less.
        double smallest = tube.OuterRadius >= 6 ? 1.5 : tube.OuterRadius >= 4 ? 1.1 : 0.9;
        foreach (TemplatePiece piece in TemplatePieces.Of(package, part))
        {
            // The paper: KEEP and WASTE together are a rectangle, the tab stands out of it.
            Box2 paper = Lines(piece.Drawing, PaperLayers.Cut).Single().Bounds().Union(Lines(piece.Drawing, PaperLayers.Trim).Single().Bounds());
            Box2 tab = Lines(piece.Drawing, PaperLayers.Tab).Single().Bounds();
            foreach (Text text in piece.Drawing.Shapes.OfType<Text>())
            {
                Box2 box = text.Bounds();
                Assert.True(Inside(box, paper) || Inside(box, tab), $"'{text.Content}' leaves the piece");
                Assert.True(text.Height >= smallest || Inside(box, tab), $"'{text.Content}' is too small to read");
            }
        }
    }

    [Theory]
    [MemberData(nameof(FittedNames))]
    public void No_line_of_a_template_is_drawn_twice(string name)
    {
        (var package, var part) = DrawnTubes.Named(name).Build();
        NothingTwice(TemplatePieces.Draw(package, part)!);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void No_line_of_a_developed_pattern_is_drawn_twice(string name)
    {
        (var package, var part) = DrawnTubes.Named(name).Build();
        NothingTwice(DevelopedPattern.Draw(package, part));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void A_developed_pattern_has_one_closed_line_as_wide_as_the_perimeter(string name)
    {
        DrawnTube tube = DrawnTubes.Named(name);
        (var package, var part) = tube.Build();
        Polyline cut = Lines(DevelopedPattern.Draw(package, part), PaperLayers.Cut).Single();
        Assert.True(cut.Closed);
        Assert.Equal(-Math.PI * tube.OuterRadius, cut.Bounds().Left, 1e-6);
        Assert.Equal(Math.PI * tube.OuterRadius, cut.Bounds().Right, 1e-6);
    }

    [Theory]
    [MemberData(nameof(FittedNames))]
    public void A_template_says_all_that_the_shop_needs(string name)
    {
        DrawnTube tube = DrawnTubes.Named(name);
        (var package, var part) = tube.Build();
        foreach (TemplatePiece piece in TemplatePieces.Of(package, part))
        {
            string[] lines = [.. piece.Drawing.Shapes.OfType<Text>().Select(t => t.Content)];

            // Names may be broken over lines: compare without spaces.
            string words = string.Concat(lines).Replace(" ", string.Empty, StringComparison.Ordinal);
            string[] wanted =
            [
                part.Mark, $"{piece.End.ToString().ToUpperInvariant()} END", "THIS SIDE OUT", .. tube.Names, .. tube.Mates, tube.Section.Name,
                tube.Title, $"revision {tube.Revision}", "3f9ac2d1", "KEEP", "WASTE", "TOP 0", "90", "180", "270", "DATUM", "GLUE TAB",
                "square-sawn", "Arrows point to", "Paper", "scale", "shift", "Weld shrinkage is not allowed for", "An aid to design",
                tube.FittedAs == Joints.CutKind.Miter ? "Plane cut" : "Radial cut",
            ];
            Assert.All(wanted, w => Assert.Contains(w.Replace(" ", string.Empty, StringComparison.Ordinal), words, StringComparison.Ordinal));
            Assert.Equal(1, words.Split("Weldshrinkage", StringSplitOptions.None).Length - 1);
        }
    }

    [Fact]
    public void Papers_of_a_frame_that_misses_a_target_are_stamped()
    {
        foreach (string name in (string[])["inches on letter, targets missed", "short tube"])
        {
            (var package, var part) = DrawnTubes.Named(name).Build();
            Assert.Contains(DevelopedPattern.Draw(package, part).Shapes.OfType<Text>(), t => string.Equals(t.Content, "NOT MEETING TARGETS", StringComparison.Ordinal));
            Assert.All(
                TemplatePieces.Of(package, part),
                p => Assert.Contains(p.Drawing.Shapes.OfType<Text>(), t => string.Equals(t.Content, "NOT MEETING TARGETS", StringComparison.Ordinal)));
        }
    }

    [Fact]
    public void Square_ends_get_no_template()
    {
        (var package, var part) = DrawnTubes.Named("square ends").Build();
        Assert.Null(TemplatePieces.Draw(package, part));
    }

    /// <summary>Paper of thickness p on a tube of radius r lies on average at r + p/2: 25 mm tube, 1 mm paper, 26/25.</summary>
    [Fact]
    public void A_template_is_widened_for_the_paper()
    {
        DrawnTube tube = DrawnTubes.Named("six places in the mark and thick paper");
        (var package, var part) = tube.Build();
        TemplatePiece piece = TemplatePieces.Of(package, part).Single();
        Assert.Equal(1.04, piece.Scale, 12);
        Assert.Equal(Math.PI * 26, Lines(piece.Drawing, PaperLayers.Cut).Single().Bounds().Width, 9);
    }

    private static IEnumerable<Polyline> Lines(Drawing drawing, string layer) =>
        drawing.Shapes.OfType<Polyline>().Where(l => string.Equals(l.Layer, layer, StringComparison.Ordinal));

    private static bool Inside(Box2 inner, Box2 outer) =>
        inner.Left >= outer.Left && inner.Right <= outer.Right && inner.Bottom >= outer.Bottom && inner.Top <= outer.Top;

    private static IEnumerable<(Point2 A, Point2 B)> Segments(Drawing drawing)
    {
        foreach (Polyline line in drawing.Shapes.OfType<Polyline>())
        {
            for (int i = 1; i < line.Points.Count; i++)
            {
                yield return (line.Points[i - 1], line.Points[i]);
            }

            if (line.Closed)
            {
                yield return (line.Points[^1], line.Points[0]);
            }
        }
    }

    private static void WordsAreClear(Drawing drawing)
    {
        Text[] texts = [.. drawing.Shapes.OfType<Text>()];
        Assert.NotEmpty(texts);
        (Point2 A, Point2 B)[] segments = [.. Segments(drawing)];
        for (int i = 0; i < texts.Length; i++)
        {
            Box2 box = texts[i].Bounds();
            foreach ((Point2 a, Point2 b) in segments.Where(s => Crosses(s.A, s.B, box)))
            {
                Assert.Fail($"'{texts[i].Content}' is crossed by a line from {a} to {b}");
            }

            for (int k = 0; k < i; k++)
            {
                Assert.False(box.Overlaps(texts[k].Bounds()), $"'{texts[i].Content}' lies over '{texts[k].Content}'");
            }
        }
    }

    /// <summary>Whether a segment has a point inside a box: Liang and Barsky's clipping.</summary>
    private static bool Crosses(Point2 a, Point2 b, Box2 box)
    {
        (double from, double to) = (0, 1);
        foreach ((double step, double room) in (ReadOnlySpan<(double, double)>)
            [(a.X - b.X, a.X - box.Left), (b.X - a.X, box.Right - a.X), (a.Y - b.Y, a.Y - box.Bottom), (b.Y - a.Y, box.Top - a.Y)])
        {
            if (step == 0)
            {
                if (room <= 0)
                {
                    return false;
                }
            }
            else if (step < 0)
            {
                from = Math.Max(from, room / step);
            }
            else
            {
                to = Math.Min(to, room / step);
            }
        }

        return to - from > 1e-9;
    }

    private static void NothingTwice(Drawing drawing)
    {
        (Point2 A, Point2 B)[] segments = [.. Segments(drawing)];
        for (int i = 0; i < segments.Length; i++)
        {
            (Point2 a, Point2 b) = segments[i];
            double length = a.DistanceTo(b);
            Assert.True(length > 1e-6);
            Point2 along = 1 / length * (b - a);
            for (int k = 0; k < i; k++)
            {
                (double from, double offFrom) = Along(segments[k].A);
                (double to, double offTo) = Along(segments[k].B);
                double shared = Math.Min(length, Math.Max(from, to)) - Math.Max(0, Math.Min(from, to));
                if (Math.Abs(offFrom) < 1e-6 && Math.Abs(offTo) < 1e-6 && shared > 1e-5)
                {
                    Assert.Fail($"drawn twice: {a} to {b} and {segments[k].A} to {segments[k].B}");
                }
            }

            (double Along, double Off) Along(Point2 p) =>
                (((p.X - a.X) * along.X) + ((p.Y - a.Y) * along.Y), ((p.Y - a.Y) * along.X) - ((p.X - a.X) * along.Y));
        }
    }
}
