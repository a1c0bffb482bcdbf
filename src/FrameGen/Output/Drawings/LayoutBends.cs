using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output.Drawings;

/// <summary>A bent tube seen from one side: its centre line, and the outermost lines of its skin along straights and bends.</summary>
internal static class LayoutBends
{
    /// <summary>Of a bend's arc, within which its chords stay, as a share of its radius: 0.02 mm on 200 mm.</summary>
    private const double Step = Math.PI / 120;

    /// <summary>A tube that points at the viewer has no sides there.</summary>
    private const double LeastSine = 1e-6;

    /// <summary>Draws its lines.</summary>
    /// <param name="tube">A bent tube.</param>
    /// <param name="cut">As it is cut.</param>
    /// <param name="outline">Its skin.</param>
    /// <param name="toViewer">Unit vector.</param>
    /// <param name="flat">To the plane of the drawing.</param>
    public static IEnumerable<Shape> Draw(Tube tube, CutTube cut, Outline outline, Vector3 toViewer, Func<Vector3, Point2> flat)
    {
        double[] places = Places(tube.Bent!);
        yield return new Polyline(LayoutDrawing.Axes, [.. places.Select(p => flat(tube.PointAt(p)))], Closed: false);
        foreach (int sign in (int[])[-1, 1])
        {
            var run = new List<Point2>();
            Vector3 before = Vector3.Zero;
            foreach (double place in places)
            {
                // Along a bend the side turns with it; where the tube points at the viewer it changes over, and the line is broken.
                TubeAxes axes = tube.AxesAt(place);
                Vector3 side = axes.X.Cross(toViewer);
                bool isSeen = side.Length > LeastSine;
                if ((!isSeen || side.Dot(before) < 0) && run.Count > 0)
                {
                    if (run.Count > 1)
                    {
                        yield return new Polyline(LayoutDrawing.Tubes, [.. run], Closed: false);
                    }

                    run.Clear();
                }

                if (isSeen)
                {
                    before = side;
                    Point2 far = outline.FarthestAlong(sign * axes.InSection(side.Normalized()));
                    run.Add(flat(Wall(tube, cut, outline, place, axes, far)));
                }
            }

            if (run.Count > 1)
            {
                yield return new Polyline(LayoutDrawing.Tubes, [.. run], Closed: false);
            }
        }
    }

    // At the two ends the line goes on to the cut.
    private static Vector3 Wall(Tube tube, CutTube cut, Outline outline, double place, TubeAxes axes, Point2 far)
    {
        double clock = Math.Atan2(far.Y, far.X);
        double along = place <= 0 ? cut.From.Surface.At(clock, outline)
            : place >= tube.Length ? -cut.To.Surface.At(clock, outline)
            : 0;
        return tube.PointAt(place) + (far.X * axes.Z) - (far.Y * axes.Y) + (along * axes.X);
    }

    private static double[] Places(TubePath bent)
    {
        var places = new List<double> { 0 };
        foreach (PathPiece arc in bent.Pieces.Where(p => p.IsArc))
        {
            int parts = (int)Math.Ceiling(arc.Length / arc.Radius / Step);
            for (int i = 0; i <= parts; i++)
            {
                places.Add(arc.Start + (arc.Length * i / parts));
            }
        }

        places.Add(bent.Length);
        return [.. places];
    }
}
