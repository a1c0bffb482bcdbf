using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output.Report;

/// <summary>The frame as a line drawing in parallel projection, for paper and where the 3D picture can't be shown.</summary>
/// <param name="Width">Of the drawing, in its own units.</param>
/// <param name="Height">Of the drawing.</param>
/// <param name="Shapes">Far ones first: each covers what lies behind it.</param>
/// <param name="Labels">Marks of the parts, where there is room for them.</param>
public sealed record FramePicture(string Width, string Height, IReadOnlyList<PictureShape> Shapes, IReadOnlyList<PictureLabel> Labels)
{
    private const double Size = 1000;
    private const double Margin = 30;
    private const double LetterHeight = 17;
    private const double LetterWidth = 9;
    private const int MostPieces = 600;
    private const int Rim = 36;

    /// <summary>Where the frame is looked at from: degrees from x towards y, and above the ground.</summary>
    internal static (double Azimuth, double Elevation) View => (-55, 24);

    internal static FramePicture Of(ShopPackage package)
    {
        CutFrame cut = package.Cut;
        FrameModel model = cut.Sized.Model;
        Camera camera = Camera.Over([.. cut.Tubes.SelectMany(t => EndsOf(model.Tubes[t.Tube], t))]);
        int pieces = Math.Clamp(MostPieces / Math.Max(1, model.Tubes.Count), 1, 12);
        List<(double Depth, PictureShape Shape)> shapes = [];
        foreach (CutTube part in cut.Tubes)
        {
            Draw(cut, part, camera, pieces, shapes);
        }

        return new FramePicture(
            Number(camera.Width),
            Number(camera.Height),
            [.. shapes.OrderBy(s => s.Depth).Select(s => s.Shape)],
            Label(package, camera));
    }

    private static IEnumerable<Vector3> EndsOf(Tube tube, CutTube part) =>
        [tube.PointAt(part.Start), tube.PointAt(part.Stop), .. (tube.Bent?.Pieces ?? []).Select(p => p.PointAt(p.Length / 2))];

    // Places along the axis between which a tube is drawn straight: in bends no more than a few degrees apart.
    private static List<double> Stops(Tube tube, int pieces)
    {
        const double Chord = Math.PI / 24;
        List<double> stops = [0];
        if (tube.Bent is null)
        {
            stops.AddRange(Enumerable.Range(1, pieces).Select(i => i * tube.Length / pieces));
            return stops;
        }

        foreach (PathPiece piece in tube.Bent.Pieces.Where(p => p.Length > 0))
        {
            int chords = piece.IsArc ? (int)Math.Ceiling(piece.Length / piece.Radius / Chord) : 1;
            stops.AddRange(Enumerable.Range(1, chords).Select(i => piece.Start + (i * piece.Length / chords)));
        }

        return stops;
    }

    private static void Draw(CutFrame cut, CutTube part, Camera camera, int pieces, List<(double Depth, PictureShape Shape)> shapes)
    {
        const double Edge = 1e-3;
        Tube tube = cut.Sized.Model.Tubes[part.Tube];
        Outline outer = cut.Sized.SectionOf(part.Tube).Outline;
        List<double> stops = Stops(tube, pieces);
        for (int i = 1; i < stops.Count; i++)
        {
            TubeAxes axes = tube.AxesAt((stops[i - 1] + stops[i]) / 2);
            Vector3 side = camera.Towards.Cross(axes.X);
            if (side.Length <= Edge)
            {
                continue;
            }

            Point2 across = axes.InSection(side.Normalized());
            Point2 left = outer.FarthestAlong(across);
            Point2 right = outer.FarthestAlong(-1 * across);
            (Vector3 a, Vector3 b) = Edges(left, i);
            (Vector3 d, Vector3 c) = Edges(right, i);
            shapes.Add((
                camera.Depth((a + b + c + d) / 4),
                new PictureShape(
                    $"M{camera.Text(a)}L{camera.Text(b)} {camera.Text(c)} {camera.Text(d)}Z",
                    $"M{camera.Text(a)}L{camera.Text(b)}M{camera.Text(c)}L{camera.Text(d)}")));
        }

        foreach (bool isFrom in (bool[])[true, false])
        {
            // Seen from its face an end lies before its tube, from behind it lies under it.
            EndCut end = isFrom ? part.From : part.To;
            double facing = -camera.Towards.Dot(tube.Into(isFrom ? End.From : End.To));
            Vector3[] rim = [.. Enumerable.Range(0, Rim).Select(i => OnSkin(end, isFrom, -Math.PI + (i * 2 * Math.PI / Rim)))];
            Vector3 middle = rim.Aggregate(Vector3.Zero, (sum, p) => sum + p) / Rim;
            string path = $"M{camera.Text(rim[0])}L{string.Join(' ', rim.Skip(1).Select(camera.Text))}Z";
            shapes.Add((camera.Depth(middle) + (Math.Sign(facing) * outer.HalfHeight), new PictureShape(path, path)));
        }

        // A line of the skin from one stop to the next; the first begins and the last ends at the cut.
        (Vector3 From, Vector3 To) Edges(Point2 point, int stop)
        {
            double clock = Math.Atan2(point.Y, point.X);
            double first = SceneColumns.At(part.From.Outer.Points, clock).Before;
            double last = tube.Length - SceneColumns.At(part.To.Outer.Points, clock).Before;
            return (Place(point, stop == 1 ? first : stops[stop - 1]), Place(point, stop == stops.Count - 1 ? last : stops[stop]));
        }

        Vector3 Place(Point2 point, double along)
        {
            TubeAxes axes = tube.AxesAt(along);
            return tube.PointAt(along) + (point.X * axes.Z) - (point.Y * axes.Y);
        }

        Vector3 OnSkin(EndCut end, bool isFrom, double clock)
        {
            (double sin, double cos) = Math.SinCos(clock);
            double radius = outer.RadiusAt(sin, cos);
            double t = SceneColumns.At(end.Outer.Points, clock).After;
            return Place(new Point2(radius * cos, radius * sin), isFrom ? t : tube.Length - t);
        }
    }

    // A mark stands on its tube, at the first place where it covers no other; twins and crowded tubes go without.
    private static List<PictureLabel> Label(ShopPackage package, Camera camera)
    {
        string[] marks = PartMarks.NamesByTube(package);
        List<(double X, double Y, double Half)> taken = [];
        var labels = new List<PictureLabel>();
        for (int i = 0; i < marks.Length; i++)
        {
            Tube tube = package.Cut.Sized.Model.Tubes[i];
            string mark = marks[i];
            double half = mark.Length * LetterWidth / 2;
            foreach (double share in (double[])[0.5, 0.38, 0.62, 0.27, 0.73])
            {
                (double x, double y) = camera.Place(tube.PointAt(share * tube.Length));
                if (x >= half && x <= camera.Width - half && taken.TrueForAll(t => Math.Abs(t.Y - y) > LetterHeight || Math.Abs(t.X - x) > t.Half + half))
                {
                    taken.Add((x, y, half));
                    labels.Add(new PictureLabel(mark, Number(x), Number(y + (LetterHeight / 3))));
                    break;
                }
            }
        }

        return labels;
    }

    private static string Number(double value) => FixedDigits.Print(value, "0.#");

    /// <summary>Parallel projection onto a sheet: y runs down.</summary>
    private sealed record Camera(Vector3 Right, Vector3 Up, Vector3 Towards, double Scale, double Left, double Top, double Width, double Height)
    {
        public static Camera Over(IReadOnlyList<Vector3> points)
        {
            (double sinA, double cosA) = Math.SinCos(double.DegreesToRadians(View.Azimuth));
            (double sinE, double cosE) = Math.SinCos(double.DegreesToRadians(View.Elevation));
            Vector3 towards = new(cosE * cosA, cosE * sinA, sinE);
            Vector3 right = new(-sinA, cosA, 0);
            Vector3 up = towards.Cross(right);
            (double left, double wide) = Range(points, right);
            (double bottom, double tall) = Range(points, up);
            double scale = (Size - (2 * Margin)) / Math.Max(Math.Max(wide, tall), 1e-6);
            return new Camera(right, up, towards, scale, left, bottom + tall, (wide * scale) + (2 * Margin), (tall * scale) + (2 * Margin));
        }

        public (double X, double Y) Place(Vector3 point) =>
            (Margin + (Scale * (point.Dot(Right) - Left)), Margin + (Scale * (Top - point.Dot(Up))));

        public double Depth(Vector3 point) => point.Dot(Towards);

        public string Text(Vector3 point)
        {
            (double x, double y) = Place(point);
            return string.Create(CultureInfo.InvariantCulture, $"{Number(x)},{Number(y)}");
        }

        private static (double Least, double Extent) Range(IReadOnlyList<Vector3> points, Vector3 direction)
        {
            double least = points.Min(p => p.Dot(direction));
            return (least, points.Max(p => p.Dot(direction)) - least);
        }
    }
}

/// <summary>A shape of the drawing.</summary>
/// <param name="Fill">Path that covers what lies behind.</param>
/// <param name="Stroke">Path that is drawn.</param>
public sealed record PictureShape(string Fill, string Stroke);

/// <summary>A mark on the drawing.</summary>
/// <param name="Text">The mark.</param>
/// <param name="X">Middle of the text.</param>
/// <param name="Y">Its base line.</param>
public sealed record PictureLabel(string Text, string X, string Y);
