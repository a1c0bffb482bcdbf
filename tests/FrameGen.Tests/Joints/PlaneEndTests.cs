using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>Ends cut on a plane: a tube along x, from the origin, its top line along z.</summary>
public class PlaneEndTests
{
    private static readonly Section Square = new FlatSidedTube(30, 40, 2, 0);

    [Fact]
    public void Wall_lines_end_on_the_plane()
    {
        // Normal (1, 0, 1): x = −z, so t = −r cos θ; whichever way the normal points.
        foreach (Vector3 normal in (Vector3[])[new(1, 0, 1), new(-1, 0, -1)])
        {
            CutTube cut = Cut(normal, null, new RoundTube(30, 2));
            Assert.Equal(CutKind.Plane, cut.From.Kind);
            for (int i = 0; i < 12; i++)
            {
                double clock = Math.PI * i / 6;
                Assert.Equal(-15 * Math.Cos(clock), cut.From.Surface.At(clock, 15), 1e-12);
            }

            Assert.Equal(-15, cut.Start, 1e-9);
            Assert.Empty(cut.From.Contacts);
        }
    }

    [Fact]
    public void A_plane_end_of_a_square_tube_is_made_of_straight_lines()
    {
        CutTube cut = Cut(new Vector3(1, 0, 1), null, Square);

        // Level on the top and the bottom flat, slanting on the two others: four corners and the seam.
        Assert.Equal(6, cut.From.Outer.Points.Count);
        Assert.Equal(-15, cut.From.Outer.Min, 1e-12);
        Assert.Equal(15, cut.From.Outer.Max, 1e-12);

        // A plane through the axis' end takes as much as it leaves: area × length.
        Assert.Equal(Square.Area * 300, cut.Volume, 1e-6);
    }

    [Fact]
    public void Extend_moves_the_plane_along_the_tube()
    {
        Assert.Equal(-20, Cut(new Vector3(1, 0, 1), 20, Square).From.Surface.At(Math.PI / 2, 20), 1e-12);
        Assert.Equal(12.5, Cut(new Vector3(1, 0, 1), -12.5, Square).From.Surface.At(Math.PI / 2, 20), 1e-12);
    }

    [Fact]
    public void A_tube_coped_to_one_that_ends_on_a_plane_meets_that_plane()
    {
        // The second tube rises along z above the first one's end, whose plane leans at 45 degrees: z = −x below it there is no first tube.
        FrameBuilder frame = new() { Mode = CutMode.Contour };
        int node = frame.Node(Vector3.Zero);
        int first = frame.Tube(node, frame.Node(new Vector3(300, 0, 0)), new RoundTube(40, 2), changeFrom: e => e with
        {
            Cut = RequestedCut.Plane,
            Plane = new Vector3(1, 0, 1).Normalized(),
        });
        int second = frame.Tube(node, frame.Node(new Vector3(0, 0, 300)), new RoundTube(20, 2));
        frame.Joint(node, null, Corner.RunOut, new TubeEndId(first, End.From), new TubeEndId(second, End.From));
        EndCut cut = frame.Cut().Tubes[second].From;

        // Over the tube's side where x >= −z holds there: at x = 10 and x = −10 the side at z = 20 is met alike.
        Assert.Equal(20, cut.Surface.At(0, 10), 1e-9);
        Assert.Equal(20, cut.Surface.At(Math.PI, 10), 1e-9);
    }

    private static CutTube Cut(Vector3 normal, double? extend, Section section)
    {
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero);
        frame.Tube(node, frame.Node(new Vector3(300, 0, 0)), section, changeFrom: e => e with
        {
            Cut = RequestedCut.Plane,
            Plane = normal.Normalized(),
            Extend = extend,
        });
        return frame.Cut().Tubes[0];
    }
}
