using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>What holds for tubes that are not round: turning the frame, swapping a tube's ends, mirroring.</summary>
public class OutlineLawTests
{
    private static readonly Dictionary<string, Section> Sections = new()
    {
        ["square"] = new FlatSidedTube(30, 30, 2, 4),
        ["rect"] = new FlatSidedTube(40, 25, 2.5, 5),
        ["ellipse"] = new EllipseTube(36, 24, 1.5),
        ["round"] = new RoundTube(30, 2),
        ["large square"] = new FlatSidedTube(60, 60, 3, 6),
        ["large round"] = new RoundTube(60, 3),
        ["sharp rect"] = new FlatSidedTube(70, 50, 3, 0),
        ["large ellipse"] = new EllipseTube(50, 70, 3),
    };

    public static TheoryData<string, string, CutMode> Pairs
    {
        get
        {
            TheoryData<string, string, CutMode> data = [];
            foreach (CutMode mode in (CutMode[])[CutMode.Contour, CutMode.Radial])
            {
                data.Add("square", "large square", mode);
                data.Add("rect", "large round", mode);
                data.Add("ellipse", "sharp rect", mode);
                data.Add("round", "large ellipse", mode);
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Pairs))]
    public void Turning_the_frame_changes_no_part(string tube, string mate, CutMode mode)
    {
        // A turn by 1.1 rad about (1, 2, -2)/3, by Rodrigues' formula.
        static Vector3 Turn(Vector3 v)
        {
            Vector3 axis = new(1 / 3.0, 2 / 3.0, -2 / 3.0);
            (double sin, double cos) = Math.SinCos(1.1);
            return (cos * v) + (sin * axis.Cross(v)) + ((1 - cos) * axis.Dot(v) * axis);
        }

        AssertSame(Cut(Sections[tube], Sections[mate], mode, v => v, false), Cut(Sections[tube], Sections[mate], mode, Turn, false), Sections[tube], swapped: false, mirrored: false);
    }

    [Theory]
    [MemberData(nameof(Pairs))]
    public void Swapping_the_ends_changes_no_part(string tube, string mate, CutMode mode) =>
        AssertSame(Cut(Sections[tube], Sections[mate], mode, v => v, false), Cut(Sections[tube], Sections[mate], mode, v => v, true), Sections[tube], swapped: true, mirrored: false);

    [Theory]
    [MemberData(nameof(Pairs))]
    public void A_mirrored_frame_has_the_opposite_hand(string tube, string mate, CutMode mode) =>
        AssertSame(Cut(Sections[tube], Sections[mate], mode, v => v, false), Cut(Sections[tube], Sections[mate], mode, v => new(v.X, -v.Y, v.Z), false), Sections[tube], swapped: false, mirrored: true);

    // Seen from the other end, and in a mirror, clock angles change sign.
    private static void AssertSame(CutTube one, CutTube other, Section section, bool swapped, bool mirrored)
    {
        Assert.Equal(one.Volume, other.Volume, one.Volume * 1e-9);
        Assert.Equal(one.CutLength, other.CutLength, 1e-6);
        foreach (End end in (End[])[End.From, End.To])
        {
            EndCut a = one[end], b = other[swapped ? (end == End.From ? End.To : End.From) : end];
            for (int k = 0; k < 60; k++)
            {
                double clock = 0.0513 + (k * Math.PI / 30);
                Assert.Equal(a.Surface.At(clock, section.Outline), b.Surface.At(swapped != mirrored ? -clock : clock, section.Outline), 1e-7);
            }
        }
    }

    /// <summary>A tube askew between two mates, rolled and offset.</summary>
    private static CutTube Cut(Section tube, Section mate, CutMode mode, Func<Vector3, Vector3> move, bool swapped)
    {
        FrameBuilder frame = new() { Mode = mode };
        int Node(double x, double y, double z, int? through = null) => frame.Node(move(new Vector3(x, y, z)), through);
        int a = Node(0, 0, 0, through: 0);
        int b = Node(30, 250, 40, through: 1);
        frame.Tube(Node(-300, 0, 0), Node(300, 0, 0), mate, move(new Vector3(0, 0.3, 1)));
        frame.Tube(Node(-270, 250, -60), Node(330, 250, 140), mate, move(new Vector3(0, 0.2, 1)));
        Vector3 up = move(new Vector3(0.4, 0.1, 1));
        Vector3 offset = move(new Vector3(0, 0, 2));
        int index = swapped ? frame.Tube(b, a, tube, up, toOffset: offset) : frame.Tube(a, b, tube, up, fromOffset: offset);
        frame.Joint(a, 0, Corner.None, new TubeEndId(index, swapped ? End.To : End.From));
        frame.Joint(b, 1, Corner.None, new TubeEndId(index, swapped ? End.From : End.To));
        return frame.Cut().Tubes[index];
    }
}
