using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using Xunit;

namespace FrameGen.Tests.Joints;

/// <summary>Contacts and what is said about joints that do not work out.</summary>
public class EndCoperTests
{
    private static (CutFrame? Cut, DiagnosticList Said) Cope(FrameBuilder frame)
    {
        DiagnosticList said = [];
        return (EndCoper.Cope(frame.Build(), said), said);
    }

    // Clock angles run clockwise seen from `from` to `to`: along +x with the top up, clock 90 points to −y.
    [Theory]
    [InlineData(0, 0, 1, 0)]
    [InlineData(0, -1, 0, 90)]
    [InlineData(0, 0, -1, 180)]
    [InlineData(0, 1, 0, 270)]
    [InlineData(0.5, -1, 0, 90)]
    [InlineData(-0.5, -1, -1, 135)]
    public void A_mate_that_ends_here_is_found_at_its_clock_angle(double x, double y, double z, double clock)
    {
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero);
        Vector3 direction = new Vector3(x, y, z).Normalized();
        frame.Tube(node, frame.Node(400 * direction), new RoundTube(40, 2));
        frame.Tube(node, frame.Node(new Vector3(400, 0, 0)), new RoundTube(30, 2));
        frame.Joint(node, null, Corner.RunOut, new TubeEndId(0, End.From), new TubeEndId(1, End.From));
        Contact contact = Assert.Single(frame.Cut().Tubes[1].From.Contacts);
        Assert.Equal(clock * Math.PI / 180, contact.Clock!.Value, 1e-9);
        Assert.Equal(Math.Acos(direction.X), contact.Angle, 1e-12);
        Assert.False(contact.SquareCrossing);
        Assert.Equal(0, contact.Offset, 1e-12);
    }

    [Theory]
    [InlineData(60, 2, 180, false)]
    [InlineData(120, 2, 0, false)]
    [InlineData(90, 3, 0, true)]
    public void A_through_mate_is_given_on_its_acute_side(double degrees, double offset, double clock, bool square)
    {
        // The main tube runs along x; the branch's top line points to the side of −x (Tee).
        Contact contact = Assert.Single(Tee.Cut(25, new RoundTube(30, 2), degrees * Math.PI / 180, offset).From.Contacts);
        Assert.Equal(0, contact.Tube);
        Assert.Equal(Math.Min(degrees, 180 - degrees) * Math.PI / 180, contact.Angle, 1e-12);
        Assert.Equal(offset, contact.Offset, 1e-12);
        Assert.Equal(square, contact.SquareCrossing);
        Assert.Equal(clock * Math.PI / 180, contact.Clock!.Value, 1e-9);
    }

    [Fact]
    public void A_mate_that_touches_nothing_of_the_end_is_not_listed()
    {
        // The third tube stands on the through tube; the second leaves on the other side and is not in its way.
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero, through: 0);
        frame.Tube(frame.Node(new Vector3(-400, 0, 0)), frame.Node(new Vector3(400, 0, 0)), new RoundTube(50, 2));
        frame.Tube(node, frame.Node(new Vector3(0, 0, -400)), new RoundTube(30, 2));
        frame.Tube(node, frame.Node(new Vector3(0, 0, 400)), new RoundTube(30, 2));
        frame.Joint(node, 0, Corner.None, new TubeEndId(1, End.From), new TubeEndId(2, End.From));
        Assert.Equal([0], frame.Cut().Tubes[2].From.Contacts.Select(c => c.Tube));
    }

    [Fact]
    public void The_seat_is_the_first_that_touches_in_the_joints_order()
    {
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero, through: 0);
        frame.Tube(frame.Node(new Vector3(-400, 0, 0)), frame.Node(new Vector3(400, 0, 0)), new RoundTube(30, 2));
        frame.Tube(node, frame.Node(new Vector3(0, 0, 400)), new RoundTube(30, 2));
        frame.Tube(node, frame.Node(new Vector3(0, 230, 400)), new RoundTube(25, 2));
        frame.Joint(node, 0, Corner.None, new TubeEndId(1, End.From), new TubeEndId(2, End.From));
        Assert.Equal([0, 1], frame.Cut().Tubes[2].From.Contacts.Select(c => c.Tube));
    }

    [Fact]
    public void Tubes_that_miss_are_named_with_the_distance()
    {
        (CutFrame? cut, DiagnosticList said) = Cope(Tee.Frame(20, new RoundTube(30, 2), 1.2, 38.5));
        Assert.Null(cut);
        Diagnostic error = Assert.Single(said);
        Assert.Equal(Severity.Error, error.Severity);
        Assert.Equal("test.yaml:101:1", error.At!.ToString());

        // 38.5 between the axes, less 20 and 15.
        Assert.Contains("tube t1, from end at node n2: should be coped to t0 but misses it by 3.5 mm", error.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(false, Severity.Warning)]
    [InlineData(true, Severity.Note)]
    public void A_tube_wider_than_its_seat_is_cut_and_said(bool wrap, Severity severity)
    {
        (CutFrame? cut, DiagnosticList said) = Cope(Tee.Frame(15, new RoundTube(40, 2), 1.2, 0, change: e => e with { Wrap = wrap }));
        Assert.NotNull(cut);
        Diagnostic one = Assert.Single(said);
        Assert.Equal(severity, one.Severity);
        Assert.Contains("meets nothing", one.Message, StringComparison.Ordinal);
        Assert.Equal(!wrap, one.Message.Contains("wider than its seat t0: half its width and the axes' offset make 20.0 mm", StringComparison.Ordinal));

        // Lines past the seat stop square at the node; those that graze it step up to it there.
        EndSurface surface = cut.Tubes[1].From.Surface;
        Assert.Equal(0, surface.At(Math.PI / 2, 20));
        double graze = Math.Asin(15 / 20.0);
        Assert.Contains(cut.Tubes[1].From.Outer.Points, p => Math.Abs(p.Clock - graze) < 1e-9);
    }

    [Fact]
    public void Equal_widths_fit_in_silence()
    {
        (CutFrame? cut, DiagnosticList said) = Cope(Tee.Frame(38.1 / 2, new RoundTube(1.5 * 25.4, 2), 1.1, 0));
        Assert.NotNull(cut);
        Assert.Empty(said);
    }

    [Fact]
    public void A_feather_edge_is_warned_of_with_its_length()
    {
        double angle = 12 * Math.PI / 180;
        (CutFrame? cut, DiagnosticList said) = Cope(Tee.Frame(20, new RoundTube(40, 2), angle, 0, length: 900));
        Assert.NotNull(cut);
        Diagnostic warning = Assert.Single(said);

        // Equal tubes: from 0 to r cot(φ/2).
        Assert.Contains($"at only 12.0 degrees", warning.Message, StringComparison.Ordinal);
        Assert.Contains($"{20 / Math.Tan(angle / 2):0.0} mm", warning.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Coordinates_rounded_to_a_micrometre_leave_15_degrees_15_degrees()
    {
        (CutFrame? cut, DiagnosticList said) = Cope(Tee.Frame(20, new RoundTube(40, 2), (15 * Math.PI / 180) - 2e-9, 0, length: 900));
        Assert.NotNull(cut);
        Assert.Empty(said);
    }

    // A square crossing of radius 15 reaches 15 mm to both sides of the node.
    [Theory]
    [InlineData(15, null)]
    [InlineData(4, 11.0)]
    public void A_cope_that_reaches_past_the_end_of_its_seat_is_warned_of(double toTheEnd, double? past)
    {
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero, through: 0);
        frame.Tube(frame.Node(new Vector3(-300, 0, 0)), frame.Node(new Vector3(toTheEnd, 0, 0)), new RoundTube(40, 2));
        int tube = frame.Tube(node, frame.Node(new Vector3(0, 0, 300)), new RoundTube(30, 2));
        frame.Joint(node, 0, Corner.None, new TubeEndId(tube, End.From));
        (CutFrame? cut, DiagnosticList said) = Cope(frame);
        Assert.NotNull(cut);
        if (past is { } length)
        {
            Assert.Contains($"reaches {length:0.0} mm past the end of t0", Assert.Single(said).Message, StringComparison.Ordinal);
        }
        else
        {
            Assert.Empty(said);
        }
    }

    [Fact]
    public void Ends_that_overlap_on_a_short_tube_are_refused()
    {
        // Between two tubes of radius 30 that stand 50 mm apart 10 mm are missing.
        FrameBuilder frame = new();
        int left = frame.Node(Vector3.Zero, through: 0);
        int right = frame.Node(new Vector3(50, 0, 0), through: 1);
        frame.Tube(frame.Node(new Vector3(0, -200, 0)), frame.Node(new Vector3(0, 200, 0)), new RoundTube(60, 2));
        frame.Tube(frame.Node(new Vector3(50, -200, 0)), frame.Node(new Vector3(50, 200, 0)), new RoundTube(60, 2));
        frame.Tube(left, right, new RoundTube(30, 2));
        frame.Joint(left, 0, Corner.None, new TubeEndId(2, End.From));
        frame.Joint(right, 1, Corner.None, new TubeEndId(2, End.To));
        (CutFrame? cut, DiagnosticList said) = Cope(frame);
        Assert.Null(cut);
        Diagnostic error = Assert.Single(said);
        Assert.Contains("tube t2: its cuts at nodes n0 and n1 overlap by 10.0 mm", error.Message, StringComparison.Ordinal);
        Assert.Equal("test.yaml:302:1", error.At!.ToString());
    }

    [Fact]
    public void A_wall_thinner_than_the_tolerance_is_refused_with_its_numbers()
    {
        // Between two tubes of radius 30 that stand 60.01 mm apart 0.01 mm is left.
        FrameBuilder frame = new();
        int left = frame.Node(Vector3.Zero, through: 0);
        int right = frame.Node(new Vector3(60.01, 0, 0), through: 1);
        frame.Tube(frame.Node(new Vector3(0, -200, 0)), frame.Node(new Vector3(0, 200, 0)), new RoundTube(60, 2));
        frame.Tube(frame.Node(new Vector3(60.01, -200, 0)), frame.Node(new Vector3(60.01, 200, 0)), new RoundTube(60, 2));
        frame.Tube(left, right, new RoundTube(30, 2));
        frame.Joint(left, 0, Corner.None, new TubeEndId(2, End.From));
        frame.Joint(right, 1, Corner.None, new TubeEndId(2, End.To));
        (CutFrame? cut, DiagnosticList said) = Cope(frame);
        Assert.Null(cut);
        Assert.Contains(
            "between its cuts at nodes n0 and n1 only 0.01 mm of its wall is left on one side, less than the tolerance of 0.02 mm",
            Assert.Single(said).Message,
            StringComparison.Ordinal);
    }

    [Fact]
    public void A_tongue_thinner_than_the_tolerance_beside_a_seat_is_warned_of()
    {
        (CutFrame? cut, DiagnosticList said) = Cope(Tee.Frame(15, new RoundTube(30.02, 2), 1.2, 0));
        Assert.NotNull(cut);
        Assert.Contains(
            "the wall it leaves beside the seat is 0.01 mm thick, less than the tolerance of 0.02 mm", Assert.Single(said).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_tube_swallowed_whole_by_its_mate_is_refused()
    {
        // Square to a tube of radius 50: the lines 10 mm beside the middle come out first, at sqrt(50² - 10²) = 48.990.
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero, through: 0);
        frame.Tube(frame.Node(new Vector3(0, -200, 0)), frame.Node(new Vector3(0, 200, 0)), new RoundTube(100, 3));
        frame.Tube(node, frame.Node(new Vector3(30, 0, 0)), new RoundTube(20, 2));
        frame.Joint(node, 0, Corner.None, new TubeEndId(1, End.From));
        (CutFrame? cut, DiagnosticList said) = Cope(frame);
        Assert.Null(cut);
        Assert.Contains(
            "tube t1, from end at node n0: is swallowed whole by t0: it would come out 48.99 mm from the node, and is only 30.0 mm long",
            Assert.Single(said).Message,
            StringComparison.Ordinal);
    }

    [Fact]
    public void A_tube_hidden_inside_a_cluster_is_refused()
    {
        // Along the diagonal between two square tubes of half-width 30, which it leaves at 30 sqrt(2) = 42.426.
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero);
        frame.Tube(node, frame.Node(new Vector3(400, 0, 0)), new FlatSidedTube(60, 60, 3, 0));
        frame.Tube(node, frame.Node(new Vector3(0, 400, 0)), new FlatSidedTube(60, 60, 3, 0));
        frame.Tube(node, frame.Node(new Vector3(25, 25, 0)), new RoundTube(10, 1));
        frame.Joint(node, null, Corner.None, new TubeEndId(0, End.From), new TubeEndId(1, End.From), new TubeEndId(2, End.From));
        (CutFrame? cut, DiagnosticList said) = Cope(frame);
        Assert.Null(cut);
        Assert.Contains(
            said, d => d.Message.Contains("tube t2, from end at node n0: lies hidden inside t0 and t1: it would come out 42.426 mm from the node", StringComparison.Ordinal));
    }

    [Fact]
    public void Extend_on_a_coped_end_is_refused()
    {
        (CutFrame? cut, DiagnosticList said) = Cope(Tee.Frame(20, new RoundTube(30, 2), 1.2, 0, change: e => e with { Extend = 5 }));
        Assert.Null(cut);
        Assert.Contains("`extend` (5 mm) can't be obeyed, since this end is coped to t0", Assert.Single(said).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_tube_inside_its_mate_is_refused()
    {
        FrameBuilder frame = new();
        int node = frame.Node(Vector3.Zero, through: 0);
        frame.Tube(frame.Node(new Vector3(-400, 0, 0)), frame.Node(new Vector3(400, 0, 0)), new RoundTube(50, 2));
        frame.Tube(node, frame.Node(new Vector3(300, 0, 0)), new RoundTube(30, 2));
        frame.Joint(node, 0, Corner.None, new TubeEndId(1, End.From));
        (CutFrame? cut, DiagnosticList said) = Cope(frame);
        Assert.Null(cut);
        Assert.Contains("runs along inside t0", Assert.Single(said).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Sizing_and_copes_agree_about_fits()
    {
        foreach (double offset in (double[])[0, 4.9999, 5.0001, 12, 34.9, 35.1, 60])
        {
            SizedFrame sized = Tee.Frame(20, new RoundTube(30, 2), 1.0, offset).Build();
            IReadOnlyList<FitProblem> problems = JointFit.Check(sized.Model, sized.Joints[0], sized.Sections);
            DiagnosticList said = [];
            CutFrame? cut = EndCoper.Cope(sized, said);
            if (offset > 35)
            {
                FitProblem miss = Assert.Single(problems);
                Assert.Equal((FitProblemKind.Misses, 0, 0.0), (miss.Kind, miss.Mate, miss.Allowed));
                Assert.Equal(offset - 35, miss.Needed, 1e-9);
                Assert.Null(cut);
            }
            else if (offset > 5)
            {
                FitProblem wide = Assert.Single(problems);
                Assert.Equal((FitProblemKind.WiderThanSeat, 0, 20.0), (wide.Kind, wide.Mate, wide.Allowed));
                Assert.Equal(15 + offset, wide.Needed, 1e-9);
                Assert.NotNull(cut);
                Assert.Contains(said, d => d.Severity == Severity.Warning);
            }
            else
            {
                Assert.Empty(problems);
                Assert.Empty(said);
            }
        }
    }
}
