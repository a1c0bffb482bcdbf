using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using FrameBuilder = FrameGen.Tests.Joints.FrameBuilder;

namespace FrameGen.Tests.Fabrication;

/// <summary>A tube coped at both ends to tubes that run through, at angles and offsets from a seed: no two of its sides are alike.</summary>
internal static class TwistedBrace
{
    /// <summary>Index of the brace in the frame.</summary>
    public const int Index = 2;

    /// <summary>Builds the frame.</summary>
    /// <param name="seed">Of the angles and offsets.</param>
    /// <param name="move">Where each point goes: a motion, or a motion and a mirror.</param>
    /// <param name="swapped">True to have the brace run the other way.</param>
    /// <param name="longer">Moves one end along the brace, mm.</param>
    /// <param name="turned">Turns the tube at one end about the brace, rad.</param>
    public static CutFrame Cut(
        int seed, Func<Vector3, Vector3>? move = null, bool swapped = false, double longer = 0, double turned = 0)
    {
        move ??= static v => v;
        var random = new Random(seed);
        double Between(double low, double high) => low + ((high - low) * random.NextDouble());
        CutMode mode = seed % 2 == 0 ? CutMode.Radial : CutMode.Contour;
        Section brace = seed % 5 == 0 ? new Rod(22) : new RoundTube(Between(20, 30), Between(1, 2.5));
        Vector3 Side(double clock, double tilt) =>
            new(Math.Cos(tilt), Math.Sin(tilt) * Math.Cos(clock), Math.Sin(tilt) * Math.Sin(clock));
        Vector3 first = Side(Between(0, 6), Between(0.8, 1.5));
        Vector3 second = Side(Between(0, 6) + turned, Between(0.8, 1.5));
        var offset = new Vector3(0, Between(-4, 4), Between(-4, 4));

        Vector3 end = new(300 + longer, 0, 0);
        var frame = new FrameBuilder { Mode = mode };
        Vector3 origin = move(Vector3.Zero);
        int p = frame.Node(origin, 0);
        int q = frame.Node(move(end), 1);
        frame.Tube(frame.Node(move(-400 * first)), frame.Node(move(400 * first)), new RoundTube(48.3, 3));
        frame.Tube(frame.Node(move(end - (400 * second))), frame.Node(move(end + (400 * second))), new RoundTube(42.4, 3));
        Vector3 aside = move(offset) - origin;
        _ = swapped
            ? frame.Tube(q, p, brace, fromOffset: aside, toOffset: aside)
            : frame.Tube(p, q, brace, fromOffset: aside, toOffset: aside);
        frame.Joint(p, 0, Corner.None, new TubeEndId(Index, swapped ? End.To : End.From));
        frame.Joint(q, 1, Corner.None, new TubeEndId(Index, swapped ? End.From : End.To));
        return frame.Cut();
    }

    /// <summary>The brace as a loose piece.</summary>
    public static PartShape Shape(CutFrame frame) => new(frame, frame.Tubes[Index]);

    /// <summary>A turn about a random axis, and a shift.</summary>
    public static Func<Vector3, Vector3> Motion(int seed)
    {
        var random = new Random(seed + 9000);
        Vector3 Any() => new(random.NextDouble() - 0.5, random.NextDouble() - 0.5, random.NextDouble() - 0.5);
        Vector3 x = Any().Normalized();
        Vector3 y = x.Cross(Any()).Normalized();
        Vector3 z = x.Cross(y);
        Vector3 shift = 2000 * Any();
        return v => shift + (v.X * x) + (v.Y * y) + (v.Z * z);
    }

    /// <summary>A mirror across the plane y = 0.</summary>
    public static Vector3 Mirror(Vector3 v) => v with { Y = -v.Y };
}
