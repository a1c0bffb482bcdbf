using FrameGen.Geometry;
using FrameGen.Model;

namespace FrameGen.Joints;

/// <summary>Where a bent tube's mesh needs rings of vertices, and how it is laid along the tube's axis.</summary>
internal static class BentMesh
{
    /// <summary>Rings nearer together than this are one, mm: what single precision can tell apart at 10 m.</summary>
    private const double Narrowest = 2e-3;

    /// <summary>Share of the outside of a bend within which a coarse tolerance's sag stays, so that the mesh holds its volume.</summary>
    private const double SagShare = 1.0 / 3000;

    /// <summary>Places along the axis, mm, growing: chords between them stay within the tolerance of every bend's outside.</summary>
    public static double[] Stations(TubePath bent, CutTube part, Outline outer, double tolerance)
    {
        double first = Math.Max(part.From.Outer.Max, part.From.Inner.Max) + Narrowest;
        double last = bent.Length - Math.Max(part.To.Outer.Max, part.To.Inner.Max) - Narrowest;
        var stations = new List<double>();
        foreach (PathPiece arc in bent.Pieces.Where(p => p.IsArc))
        {
            double outside = arc.Radius + Math.Max(outer.HalfHeight, outer.HalfWidth);
            double widest = 2 * Math.Acos(1 - Math.Min(tolerance / outside, SagShare));
            int parts = (int)Math.Ceiling(arc.Length / arc.Radius / widest);
            for (int i = 0; i <= parts; i++)
            {
                double station = arc.Start + (arc.Length * i / parts);
                if (station > first && station < last && (stations.Count == 0 || station > stations[^1] + Narrowest))
                {
                    stations.Add(station);
                }
            }
        }

        return [.. stations];
    }

    /// <summary>Lays a mesh of the straightened tube along the tube's axis, which stays straight along z up to the first bend.</summary>
    public static TriangleMesh Lay(TriangleMesh straightened, Tube tube)
    {
        var vertices = new Vector3[straightened.Vertices.Count];
        (double at, Vector3 point, TubeAxes axes) = (double.NaN, Vector3.Zero, tube.Axes);
        for (int i = 0; i < vertices.Length; i++)
        {
            Vector3 vertex = straightened.Vertices[i];
            if (vertex.Z != at)
            {
                // Past its end points a tube goes on straight.
                at = vertex.Z;
                double inside = Math.Clamp(at, 0, tube.Length);
                axes = tube.AxesAt(inside);
                point = tube.PointAt(inside) + ((at - inside) * axes.X) - tube.From.Point;
            }

            Vector3 place = point + (vertex.X * axes.Z) - (vertex.Y * axes.Y);
            vertices[i] = new Vector3(place.Dot(tube.Axes.Z), -place.Dot(tube.Axes.Y), place.Dot(tube.Axes.X));
        }

        return straightened with { Vertices = vertices };
    }
}
