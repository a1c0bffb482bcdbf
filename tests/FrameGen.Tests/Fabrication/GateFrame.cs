using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Output;
using FrameGen.Sizing;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Fabrication;

/// <summary>
/// A garden gate's corner, cut by hand: a rail along x (40 x 2), a post on its middle pointing up (30 x 1.5, coped square to
/// the rail), and an arm along x (30 x 1.5) mitred to the post's top at a right angle. Every number can be worked out on paper.
/// </summary>
internal static class GateFrame
{
    public const double Rail = 20;
    public const double Post = 15;
    public const double Density = 7.85e-6;

    private static readonly SourcePlace Place = new("gate.yaml", 1, 1);

    private static readonly Material Steel = new("S235", 210000, 81000, Density, 235, 360, 235, "invented for this test");

    public static ShopPackage Package(
        string title = "Garden gate",
        string notes = "",
        SizingStatus status = SizingStatus.Fixed,
        bool square = false) => Planned(Cut(title, notes, status, square));

    /// <summary>Plans a frame that has nothing wrong with it.</summary>
    public static ShopPackage Planned(CutFrame cut)
    {
        DiagnosticList diagnostics = [];
        ShopPackage? package = ShopPlanner.Plan(cut, diagnostics);
        Assert.Empty(diagnostics);
        return package!;
    }

    /// <summary>The same frame with its ends cut by the program.</summary>
    public static ShopPackage CopedPackage()
    {
        var diagnostics = new DiagnosticList();
        CutFrame? cut = EndCoper.Cope(Sized(Model("Garden gate", string.Empty), SizingStatus.Fixed), diagnostics);
        Assert.False(diagnostics.HasErrors, string.Join('\n', diagnostics));
        return Planned(cut!);
    }

    /// <summary>What the part of a tube is called on papers and in file names.</summary>
    public static string PartOf(ShopPackage package, string tube) => package.Parts.Single(
        p => p.Tubes.Any(t => string.Equals(package.Cut.Sized.Model.Tubes[t].Name, tube, StringComparison.Ordinal))).Name;

    public static CutFrame Cut(
        string title = "Garden gate", string notes = "", SizingStatus status = SizingStatus.Fixed, bool square = false)
    {
        FrameModel model = Model(title, notes);
        SizedFrame sized = Sized(model, status);
        EndCut plain = End(CutKind.Square, [], Post, 13.5, (_, _) => 0);
        EndCut saddle = End(
            CutKind.Cope,
            [new Contact(0, Math.PI / 2, 0, 0, SquareCrossing: true)],
            Post,
            13.5,
            (clock, r) => Math.Sqrt((Rail * Rail) - (r * Math.Sin(clock) * r * Math.Sin(clock))));
        EndCut postMiter = End(CutKind.Miter, [new Contact(2, Math.PI / 2, 0, 0, SquareCrossing: false)], Post, 13.5, (c, r) => r * Math.Cos(c));
        EndCut armMiter = End(CutKind.Miter, [new Contact(1, Math.PI / 2, 0, Math.PI, SquareCrossing: false)], Post, 13.5, (c, r) => -r * Math.Cos(c));
        return new CutFrame(
            sized,
            [
                Tube(sized, 0, End(CutKind.Square, [], Rail, 18, (_, _) => 0), End(CutKind.Square, [], Rail, 18, (_, _) => 0)),
                Tube(sized, 1, square ? plain : saddle, square ? plain : postMiter),
                Tube(sized, 2, square ? plain : armMiter, plain),
            ]);
    }

    private static FrameModel Model(string title, string notes)
    {
        byte[] root = Encoding.UTF8.GetBytes("framegen: 1\n");
        byte[] list = Encoding.UTF8.GetBytes("stock: {}\n");
        Vector3[] at = [new(0, 0, 0), new(1000, 0, 0), new(400, 0, 0), new(400, 0, 600), new(900, 0, 600)];
        Node[] nodes =
        [
            new("a", at[0], null, 0, Place), new("b", at[1], null, 0, Place), new("m", at[2], 0, 400, Place),
            new("top", at[3], null, 0, Place), new("tip", at[4], null, 0, Place),
        ];
        return new FrameModel(
            new SpecIdentity(
                [new SourceFile("jobs/gate.yaml", root), new SourceFile("lists/gate.yaml", list)],
                [("../lists/gate.yaml", 1)],
                "gate.yaml",
                Manifest.Hash(root),
                title,
                "B",
                notes),
            DisplaySpec.Metric,
            nodes,
            [Straight("rail", 0, 1, 0, at, [2]), Straight("post", 2, 3, 1, at, []), Straight("arm", 3, 4, 1, at, [])],
            [Group("rails", new RoundTube(40, 2)), Group("posts", new RoundTube(30, 1.5))],
            [new Support(0, [true, true, true, true, true, true], Place)],
            [],
            [new LoadCase("standing", new Vector3(0, 0, -1), [], [], [], [0], Place)],
            [],
            [],
            new FrameGen.Model.Fabrication(CutMode.Contour, 0.1, 0.02, 2, 0, PageSize.A4));
    }

    private static Tube Straight(string name, int from, int to, int group, Vector3[] at, int[] on) => new(
        name,
        new TubeEnd(from, at[from], RequestedCut.Default, null, 0, Wrap: false, Place),
        new TubeEnd(to, at[to], RequestedCut.Default, null, 0, Wrap: false, Place),
        group,
        TubeAxes.Along(at[to] - at[from]),
        on,
        Original: null,
        Place);

    private static TubeGroup Group(string name, Section section) =>
        new(name, Steel, [new Candidate(section, string.Empty, 6000, null)], IsFixed: true, Choose: null, Welded: true, Place);

    private static SizedFrame Sized(FrameModel model, SizingStatus status)
    {
        double ratio = status == SizingStatus.Unmet ? 1.25 : 0.5;
        return new SizedFrame(
            model,
            [model.Groups[0].Candidates[0], model.Groups[1].Candidates[0]],
            status,
            4,
            4,
            1,
            [new TargetResult(0, "displacement", "tip along z, case standing", 2 * ratio, 2, "mm", ratio, string.Empty)],
            [
                new CaseResult(
                    0,
                    [Vector3.Zero, new(0, 0, -1), new(0, 1e-20, -0.5), new(0, 0, -0.75), new(0, 0, -2 * ratio)],
                    [Vector3.Zero, Vector3.Zero, Vector3.Zero, Vector3.Zero, new(0, 0.001, 0)],
                    [(new Vector3(0, 0, 40), new Vector3(0, -9000, 0))],
                    [Forces(20, 0, 1e-16, -3e-17, 0), Forces(30, 300, -12, -6, -12), Forces(10, 0, 0, 0, 0)],
                    1e-14,
                    1e-15),
            ],
            [
                new NodeJoint(0, null, [new(0, FrameGen.Model.End.From)], Corner.None),
                new NodeJoint(1, null, [new(0, FrameGen.Model.End.To)], Corner.None),
                new NodeJoint(2, 0, [new(1, FrameGen.Model.End.From)], Corner.None),
                new NodeJoint(3, null, [new(1, FrameGen.Model.End.To), new(2, FrameGen.Model.End.From)], Corner.Miter),
                new NodeJoint(4, null, [new(2, FrameGen.Model.End.To)], Corner.None),
            ]);
    }

    private static EndCut End(CutKind kind, IReadOnlyList<Contact> contacts, double outer, double inner, Func<double, double, double> t) =>
        new(kind, contacts, 0, new Surface(t), Curve(outer, t), Curve(inner, t), Length(outer, t));

    private static EndCurve Curve(double radius, Func<double, double, double> t)
    {
        const int Steps = 360;
        IEnumerable<double> clocks = Enumerable.Range(0, Steps + 1).Select(i => Math.PI * ((2.0 * i / Steps) - 1));
        return new EndCurve([.. clocks.Select(c => new CurvePoint(c, t(c, radius)))]);
    }

    private static double Length(double radius, Func<double, double, double> t)
    {
        const int Steps = 3600;
        double step = 2 * Math.PI / Steps;
        return Enumerable.Range(0, Steps).Sum(i => double.Hypot(radius * step, t((i + 1) * step, radius) - t(i * step, radius)));
    }

    /// <summary>Volume by the midpoint rule: fine for a test, not the code under test.</summary>
    private static CutTube Tube(SizedFrame sized, int index, EndCut from, EndCut to)
    {
        const int Rings = 40;
        const int Steps = 360;
        Tube tube = sized.Model.Tubes[index];
        Section section = sized.SectionOf(index);
        double outer = section.OuterSize / 2;
        double volume = 0;
        double area = 0;
        for (int j = 0; j < Steps; j++)
        {
            double clock = (j + 0.5) * 2 * Math.PI / Steps;
            area += outer * 2 * Math.PI / Steps * (tube.Length - from.Surface.At(clock, outer) - to.Surface.At(clock, outer));
            for (int i = 0; i < Rings; i++)
            {
                double r = outer - ((i + 0.5) * section.Wall / Rings);
                double length = tube.Length - from.Surface.At(clock, r) - to.Surface.At(clock, r);
                volume += r * section.Wall / Rings * 2 * Math.PI / Steps * length;
            }
        }

        double start = Math.Min(from.Outer.Min, from.Inner.Min);
        double stop = tube.Length - Math.Min(to.Outer.Min, to.Inner.Min);
        Vector3 middle = tube.From.Point + ((start + stop) / 2 * tube.Axes.X);
        return new CutTube(index, from, to, start, stop, volume, Density * volume, middle, area);
    }

    private sealed class Surface(Func<double, double, double> t) : EndSurface
    {
        public override double At(double clock, double radius) => t(clock, radius);
    }

    private static TubeForces Forces(double stress, double at, double from, double to, double least) =>
        new(stress, at, from, to, least) { Diagram = new TubeDiagram([]) };
}
