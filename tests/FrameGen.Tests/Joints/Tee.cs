using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Tests.Joints;

/// <summary>
/// A branch coped to a main tube that runs through along global x, laid out as the published tables are: the branch's
/// axis passes (0, e, 0) in direction (cos φ, 0, sin φ), and its top line points to (−sin φ, 0, cos φ), the obtuse side.
/// The tables count θ from there towards +y, against the clock: θ = −clock.
/// </summary>
internal static class Tee
{
    public static CutTube Cut(
        double mainRadius,
        Section branch,
        double angle,
        double offset,
        CutMode mode = CutMode.Contour,
        double length = 400,
        double tolerance = 0.02,
        Func<TubeEnd, TubeEnd>? change = null) =>
        Frame(mainRadius, branch, angle, offset, mode, length, tolerance, change).Cut().Tubes[1];

    public static FrameBuilder Frame(
        double mainRadius,
        Section branch,
        double angle,
        double offset,
        CutMode mode = CutMode.Contour,
        double length = 400,
        double tolerance = 0.02,
        Func<TubeEnd, TubeEnd>? change = null)
    {
        FrameBuilder frame = new() { Mode = mode, Tolerance = tolerance };
        int left = frame.Node(new Vector3(-500, 0, 0));
        int right = frame.Node(new Vector3(500, 0, 0));
        int node = frame.Node(Vector3.Zero, through: 0);
        Vector3 along = new(Math.Cos(angle), 0, Math.Sin(angle));
        Vector3 point = new(0, offset, 0);
        int far = frame.Node(point + (length * along));
        int main = frame.Tube(left, right, new RoundTube(2 * mainRadius, mainRadius / 10));
        int tube = frame.Tube(node, far, branch, new Vector3(-Math.Sin(angle), 0, Math.Cos(angle)), fromOffset: point, changeFrom: change);
        frame.Joint(node, main, Corner.None, new TubeEndId(tube, End.From));
        return frame;
    }
}
