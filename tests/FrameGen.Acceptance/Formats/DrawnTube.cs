using FrameGen.Diagnostics;
using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Acceptance.Formats;

/// <summary>A shop package of one tube with cut lines from closed forms, so that drawings are tested apart from the copes.</summary>
internal sealed record DrawnTube(Section Section, double Length)
{
    /// <summary>t by clock angle at the from end; null for a square end at 0.</summary>
    public Func<double, double>? From { get; init; }

    /// <summary>t by clock angle at the to end; null for a square end at 0.</summary>
    public Func<double, double>? To { get; init; }

    public CutKind FittedAs { get; init; } = CutKind.Cope;

    public string[] Mates { get; init; } = ["bow"];

    public string[] Names { get; init; } = ["rail-l", "rail-r"];

    public string Mark { get; init; } = "T1";

    public string Title { get; init; } = "Quayside cargo trailer";

    public string Revision { get; init; } = "C";

    public PageSize Page { get; init; } = PageSize.A4;

    public DisplaySpec Display { get; init; } = DisplaySpec.Metric;

    public SizingStatus Status { get; init; } = SizingStatus.ProvenLightest;

    public double Paper { get; init; } = 0.1;

    public double OuterRadius => Section.OuterSize / 2;

    /// <summary>
    /// The classic saddle, mm into the tube: t = (r cos(θ) cos(φ) + √(R² − (r sin(θ) + e)²)) / sin(φ), θ from the mate's direction.
    /// </summary>
    public static Func<double, double> Saddle(double r, double mateRadius, double angleDegrees, double offset, double mateClock) => clock =>
    {
        double phi = angleDegrees * Math.PI / 180;
        double theta = clock - mateClock;
        double across = (r * Math.Sin(theta)) + offset;
        return ((r * Math.Cos(theta) * Math.Cos(phi)) + Math.Sqrt((mateRadius * mateRadius) - (across * across))) / Math.Sin(phi);
    };

    /// <summary>The deeper of two cuts at each clock angle.</summary>
    public static Func<double, double> Deeper(Func<double, double> a, Func<double, double> b) => clock => Math.Max(a(clock), b(clock));

    public (ShopPackage Package, Part Part) Build()
    {
        var at = new SourcePlace("sample.yaml", 1, 1);
        var end = new TubeEnd(0, Vector3.Zero, RequestedCut.Default, null, 0, Wrap: false, at);
        TubeAxes axes = TubeAxes.Along(Vector3.UnitX);
        Tube Named(string name) => new(name, end, end with { Node = 1, Point = new(Length, 0, 0) }, 0, axes, [], null, at);

        var steel = new Material("E235+N", 210_000, 81_000, 7.85e-6, 235, 340, 235, "test");
        var candidate = new Candidate(Section, "test", 6000, null);
        var model = new FrameModel(
            new SpecIdentity([], [], "sample.yaml", "3f9ac2d17788aabbccddeeff00112233445566778899aabbccddeeff00112233", Title, Revision, string.Empty),
            Display,
            [new Node("front-l", Vector3.Zero, null, 0, at), new Node("rear-l", new(Length, 0, 0), null, 0, at)],
            [.. Names.Concat(Mates).Select(Named)],
            [new TubeGroup("rails", steel, [candidate], IsFixed: true, null, Welded: true, at)],
            [], [], [], [], [],
            new Model.Fabrication(CutMode.Radial, Paper, 0.02, 2, 0, Page));
        var sized = new SizedFrame(model, [candidate], Status, 1, 1, 1, [], [], []);
        EndCut from = Cut(From);
        EndCut to = Cut(To);
        double start = from.Outer.Min;
        double stop = Length - to.Outer.Min;
        var tube = new CutTube(0, from, to, start, stop, 1, 1, Vector3.Zero, 1);
        var part = new Part(Mark, string.Empty, [.. Names.Select((_, i) => new Placement(i, 0, Swapped: false))], tube, null, string.Empty);
        return (new ShopPackage(new CutFrame(sized, [tube]), [part], new Totals(1, Vector3.Zero, 1, 1), new StockPlan([])), part);
    }

    private EndCut Cut(Func<double, double>? line)
    {
        const int steps = 720;
        Func<double, double> t = line ?? (_ => 0);
        CurvePoint[] points = line is null
            ? [new(-Math.PI, 0), new(Math.PI, 0)]
            : [.. Enumerable.Range(0, steps + 1).Select(i => ((2.0 * i / steps) - 1) * Math.PI).Select(c => new CurvePoint(c, t(c)))];
        points[^1] = points[^1] with { T = points[0].T };
        var curve = new EndCurve(points);
        Contact[] contacts = line is null
            ? []
            : [.. Mates.Select((_, i) => new Contact(Names.Length + i, 1, 0, 0, SquareCrossing: false))];
        return new EndCut(line is null ? CutKind.Square : FittedAs, contacts, 0, new FunctionSurface(t), curve, curve, 1);
    }

    private sealed class FunctionSurface(Func<double, double> t) : EndSurface
    {
        public override double At(double clock, double radius) => t(clock);
    }
}
