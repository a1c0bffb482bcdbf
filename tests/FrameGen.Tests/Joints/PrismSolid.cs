using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Tests.Joints;

/// <summary>
/// An endless bar, known only by which points it holds: those no farther than its corner radius from a rectangle, or within an ellipse.
/// </summary>
internal sealed record PrismSolid(Vector3 Point, Vector3 Axis, Vector3 Top, Func<double, double, bool> HoldsInSection)
{
    public static PrismSolid Of(Tube tube, Section section) => new(
        tube.From.Point,
        tube.Axes.X,
        tube.Axes.Z,
        section switch
        {
            RoundTube or Rod => (x, y) => (x * x) + (y * y) <= section.Height * section.Height / 4,
            FlatSidedTube flat => (x, y) => IsInFlatSided(flat, x, y),
            _ => (x, y) => (4 * x * x / (section.Height * section.Height)) + (4 * y * y / (section.Width * section.Width)) <= 1,
        });

    public bool Holds(Vector3 p)
    {
        Vector3 from = p - Point;
        return HoldsInSection(from.Dot(Top), from.Dot(Axis.Cross(Top)));
    }

    /// <summary>t at which a walk from t = <paramref name="middle"/> down first comes inside; null where it never does.</summary>
    public double? Walk(Vector3 start, Vector3 into, double middle, double last)
    {
        const double Step = 0.25;
        for (double t = middle; t >= last; t -= Step)
        {
            if (!Holds(start + (t * into)))
            {
                continue;
            }

            (double inside, double outside) = (t, t + Step);
            for (int i = 0; i < 50; i++)
            {
                double half = (inside + outside) / 2;
                (inside, outside) = Holds(start + (half * into)) ? (half, outside) : (inside, half);
            }

            return inside;
        }

        return null;
    }

    private static bool IsInFlatSided(FlatSidedTube flat, double x, double y)
    {
        double corner = flat.OuterCorner;
        double past = Math.Max(0, Math.Abs(x) - (flat.Height / 2) + corner);
        double beside = Math.Max(0, Math.Abs(y) - (flat.Width / 2) + corner);
        return corner > 0 ? (past * past) + (beside * beside) <= corner * corner : past <= 0 && beside <= 0;
    }
}
