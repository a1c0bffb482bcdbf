using System.Text.Json;
using FrameGen.Geometry;

namespace FrameGen.Acceptance.Builds;

/// <summary>
/// A developed pattern read from its DXF by ezdxf and rolled back onto the tube, by nothing but the directions that the papers
/// promise: x is the distance round the skin from the top line, growing clockwise as seen along the tube; y is along the axis.
/// </summary>
internal sealed class RolledPattern
{
    private const string ReadCutLines = """
        import sys, json, ezdxf
        doc = ezdxf.readfile(sys.argv[1])
        found = [[[p[0], p[1]] for p in e.get_points("xy")] for e in doc.modelspace().query("LWPOLYLINE") if e.dxf.layer == "CUT" and e.closed]
        print(json.dumps(found))
        """;

    private readonly Vector3 _start;
    private readonly Vector3 _along;
    private readonly Vector3 _top;
    private readonly double _radius;

    /// <summary>Reads a pattern.</summary>
    /// <param name="dxf">The developed pattern.</param>
    /// <param name="start">The tube's from point.</param>
    /// <param name="stop">The tube's to point.</param>
    /// <param name="top">The top line's direction, as frame.json gives it.</param>
    /// <param name="radius">Outer radius.</param>
    public RolledPattern(string dxf, Vector3 start, Vector3 stop, Vector3 top, double radius)
    {
        _start = start;
        _along = (stop - start).Normalized();
        _top = top;
        _radius = radius;
        Length = (stop - start).Length;
        using JsonDocument lines = JsonDocument.Parse(ForeignProgram.Python("ezdxf").Run("-c", ReadCutLines, dxf));
        CutLines = lines.RootElement.GetArrayLength();
        Points = [.. lines.RootElement[0].EnumerateArray().Select(p => new Point2(p[0].GetDouble(), p[1].GetDouble()))];
    }

    public double Length { get; }

    public int CutLines { get; }

    /// <summary>Vertices of the closed line, as drawn.</summary>
    public IReadOnlyList<Point2> Points { get; }

    /// <summary>Vertices and points between them of one end's curve: the side seams and the other end left out.</summary>
    public IEnumerable<Point2> EndCurve(bool atFrom)
    {
        double half = Math.PI * _radius;
        for (int i = 0; i < Points.Count; i++)
        {
            Point2 a = Points[i];
            Point2 b = Points[(i + 1) % Points.Count];
            bool seam = Math.Abs(Math.Abs(a.X) - half) < 1e-5 && Math.Abs(a.X - b.X) < 1e-5;
            bool here = a.Y < Length / 2 == atFrom && b.Y < Length / 2 == atFrom;
            if (seam || !here || Math.Abs(a.X - b.X) < 1e-6)
            {
                continue;
            }

            for (int k = 0; k < 4; k++)
            {
                yield return a + (k / 4.0 * (b - a));
            }
        }
    }

    /// <summary>The place in the frame of a point of the pattern, at a distance from the axis.</summary>
    /// <param name="point">On the pattern.</param>
    /// <param name="radius">From the axis; the outer radius for the skin.</param>
    /// <param name="mirrored">True to roll it with the printed side in, as a mirrored drawing would be.</param>
    public Vector3 Roll(Point2 point, double radius, bool mirrored = false)
    {
        double clock = (mirrored ? -point.X : point.X) / _radius;
        Vector3 quarter = _along.Cross(_top);
        return _start + (point.Y * _along) + (radius * ((Math.Cos(clock) * _top) + (Math.Sin(clock) * quarter)));
    }

    /// <summary>Distance of a point from a straight axis.</summary>
    public static double Distance(Vector3 point, Vector3 onAxis, Vector3 direction) =>
        (point - onAxis).Cross(direction).Length / direction.Length;
}
