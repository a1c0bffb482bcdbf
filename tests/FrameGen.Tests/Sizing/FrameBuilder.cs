using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Sizing;

/// <summary>Puts a resolved frame together by hand, by name, without a spec's text.</summary>
internal sealed class FrameBuilder
{
    /// <summary>A plain steel: E 210 GPa, ν 0.3, 7850 kg/m³, yield 235 MPa, welded or not.</summary>
    public static readonly Material Steel = new("steel", 210_000, 210_000 / 2.6, 7850e-9, 235, 360, 235, "for tests");

    public static readonly SourcePlace Place = new("test.yaml", 1, 1);

    private readonly List<Node> _nodes = [];
    private readonly List<Tube> _tubes = [];
    private readonly List<TubeGroup> _groups = [];
    private readonly List<Support> _supports = [];
    private readonly List<CarriedMass> _masses = [];
    private readonly List<LoadCase> _cases = [];
    private readonly List<Target> _targets = [];
    private readonly List<JointRequest> _joints = [];

    public static RoundTube Round(double od, double wall) => new(od, wall);

    public FrameBuilder Node(string name, double x, double y, double z)
    {
        _nodes.Add(new Node(name, new Vector3(x, y, z), null, 0, Place));
        return this;
    }

    public FrameBuilder NodeOn(string name, string tube, double distance)
    {
        int t = TubeIndex(tube);
        Vector3 position = _tubes[t].From.Point + (distance * _tubes[t].Axes.X);
        _nodes.Add(new Node(name, position, t, distance, Place));
        _tubes[t] = _tubes[t] with { NodesOn = [.. _tubes[t].NodesOn.Append(_nodes.Count - 1).OrderBy(n => _nodes[n].ThroughDistance)] };
        return this;
    }

    public FrameBuilder Fixed(string name, Section section, Material? material = null, bool welded = true) =>
        Add(new TubeGroup(name, material ?? Steel, [new Candidate(section, "", 6000, null)], true, null, welded, Place));

    public FrameBuilder Choose(string name, params Section[] sections) => Choose(name, Steel, null, sections);

    public FrameBuilder Choose(string name, Material material, ChooseSpec? choose, params Section[] sections) =>
        Add(new TubeGroup(
            name,
            material,
            [.. sections.OrderBy(s => s.Area).ThenBy(s => s.Name, StringComparer.Ordinal).Select(s => new Candidate(s, "list", 6000, null))],
            false,
            choose,
            true,
            Place));

    /// <summary>Larger sizes that a group's range of one kind keeps out.</summary>
    public FrameBuilder Beyond(string group, string key, double end, params RoundTube[] sizes)
    {
        int g = GroupIndex(group);
        _groups[g] = _groups[g] with { Beyond = [.. sizes.Select(s => new BeyondRange(new Candidate(s, "list", 6000, null), key, s.OuterSize, s.OuterSize - end))] };
        return this;
    }

    public FrameBuilder Tube(
        string name, string from, string to, string group, Vector3? fromOffset = null, Vector3? toOffset = null, bool wrap = false)
    {
        TubeEnd start = EndAt(from, fromOffset, wrap);
        TubeEnd stop = EndAt(to, toOffset, wrap);
        _tubes.Add(new Tube(
            name, start, stop, GroupIndex(group), TubeAxes.Along(stop.Point - start.Point), [], null, Place));
        return this;
    }

    /// <summary>Bends the tube of a name round corners.</summary>
    public FrameBuilder Bend(string tube, double radius, params Vector3[] corners)
    {
        int t = TubeIndex(tube);
        var path = TubePath.Through([_tubes[t].From.Point, .. corners, _tubes[t].To.Point], radius);
        _tubes[t] = _tubes[t] with { Bent = path, Axes = TubeAxes.Along(path.Pieces[0].Along) };
        return this;
    }

    /// <summary>Turns a tube's top line, at its start, towards a direction.</summary>
    public FrameBuilder Up(string tube, Vector3 up)
    {
        int t = TubeIndex(tube);
        _tubes[t] = _tubes[t] with { Axes = TubeAxes.Along(_tubes[t].Axes.X, up) };
        return this;
    }

    public FrameBuilder Hinge(string tube, Hinges hinges)
    {
        int t = TubeIndex(tube);
        _tubes[t] = _tubes[t] with { Hinges = hinges };
        return this;
    }

    /// <summary>Six rates, along x, y, z and about them; acts in all that is written already, too.</summary>
    public FrameBuilder Spring(string node, params double[] rates)
    {
        int spring = _supports.Count;
        _supports.Add(new Support(NodeIndex(node), new bool[6], Place) { Springs = rates });
        for (int i = 0; i < _cases.Count; i++)
        {
            _cases[i] = _cases[i] with { Supports = [.. _cases[i].Supports, spring] };
        }

        for (int i = 0; i < _targets.Count; i++)
        {
            _targets[i] = _targets[i] switch
            {
                StiffnessTarget t => t with { Supports = [.. t.Supports, spring] },
                FrequencyTarget t => t with { Supports = [.. t.Supports, spring] },
                Target t => t,
            };
        }

        return this;
    }

    public FrameBuilder Clamp(string node) => Hold(node, "x", "y", "z", "rx", "ry", "rz");

    public FrameBuilder Hold(string node, params string[] freedoms)
    {
        string[] all = ["x", "y", "z", "rx", "ry", "rz"];
        _supports.Add(new Support(NodeIndex(node), [.. all.Select(f => freedoms.Contains(f))], Place));
        return this;
    }

    public FrameBuilder MassOnNode(string node, double kg)
    {
        _masses.Add(new CarriedMass(NodeIndex(node), null, kg));
        return this;
    }

    public FrameBuilder MassAlong(string tube, double kg)
    {
        _masses.Add(new CarriedMass(null, TubeIndex(tube), kg));
        return this;
    }

    /// <summary>A case under all supports given so far.</summary>
    public FrameBuilder Case(string name, Vector3 selfWeight = default, params object[] loads)
    {
        _cases.Add(new LoadCase(
            name,
            selfWeight,
            [.. loads.OfType<NodeLoad>()],
            [.. loads.OfType<LineLoad>()],
            [.. loads.OfType<PointLoad>()],
            [.. Enumerable.Range(0, _supports.Count)],
            Place));
        return this;
    }

    public NodeLoad Force(string node, double x, double y, double z) => new(NodeIndex(node), new Vector3(x, y, z), Vector3.Zero);

    public NodeLoad Moment(string node, double x, double y, double z) => new(NodeIndex(node), Vector3.Zero, new Vector3(x, y, z));

    public LineLoad Line(string tube, double x, double y, double z) => new(TubeIndex(tube), new Vector3(x, y, z));

    public PointLoad Point(string tube, double distance, double x, double y, double z) =>
        new(TubeIndex(tube), distance, new Vector3(x, y, z), Vector3.Zero);

    public FrameBuilder Displacement(string loadCase, string node, Vector3? along, double max, string? from = null) =>
        Add(i => new DisplacementTarget(i, CaseIndex(loadCase), from is null ? null : NodeIndex(from), NodeIndex(node), along, max, Place));

    public FrameBuilder Rotation(string loadCase, string node, Vector3? about, double max) =>
        Add(i => new RotationTarget(i, CaseIndex(loadCase), null, NodeIndex(node), about, max, Place));

    public FrameBuilder Stiffness(string node, Vector3 direction, double min, bool turning = false, string? from = null) =>
        Add(i => new StiffnessTarget(
            i,
            from is null ? null : NodeIndex(from),
            NodeIndex(node),
            direction,
            turning,
            min,
            [.. Enumerable.Range(0, _supports.Count)],
            Place));

    public FrameBuilder Strength(double factor) => Add(i => new StrengthTarget(
        i, [.. Enumerable.Range(0, _cases.Count)], factor, [.. Enumerable.Range(0, _groups.Count)], Place));

    public FrameBuilder Buckling(double factor, params string[] cases) => Add(i => new BucklingTarget(
        i, cases.Length == 0 ? [.. Enumerable.Range(0, _cases.Count)] : [.. cases.Select(CaseIndex)], factor, Place));

    public FrameBuilder Slenderness(double max, bool wall = false) => Add(i => new SlendernessTarget(i, max, wall, Place));

    public FrameBuilder Frequency(double hertz) =>
        Add(i => new FrequencyTarget(i, hertz, [.. Enumerable.Range(0, _supports.Count)], Place));

    public FrameBuilder MemberDeflection(string group, SpanKind span, double load, double max) => Add(i =>
        new MemberDeflectionTarget(i, TubesOf(group), $"group {group}", BendingDirection.Weaker, span, load, max, Place));

    public FrameBuilder MemberStiffness(string group, double? bending, double? torsion) => Add(i =>
        new MemberStiffnessTarget(i, TubesOf(group), $"group {group}", BendingDirection.Weaker, bending, torsion, Place));

    public FrameBuilder Miter(string node, string a, string b)
    {
        _joints.Add(new JointRequest(NodeIndex(node), (TubeIndex(a), TubeIndex(b)), [], Place));
        return this;
    }

    public FrameBuilder Order(string node, params string[] tubes)
    {
        _joints.Add(new JointRequest(NodeIndex(node), null, [.. tubes.Select(TubeIndex)], Place));
        return this;
    }

    public int NodeIndex(string name) => Find(_nodes.Select(n => n.Name), name);

    public int TubeIndex(string name) => Find(_tubes.Select(t => t.Name), name);

    public FrameModel Build() => new(
        new SpecIdentity([new SourceFile("test.yaml", ReadOnlyMemory<byte>.Empty)], [], "test.yaml", new string('0', 64), "test", "", ""),
        DisplaySpec.Metric,
        [.. _nodes],
        [.. _tubes],
        [.. _groups],
        [.. _supports],
        [.. _masses],
        [.. _cases],
        [.. _targets],
        [.. _joints],
        new(CutMode.Radial, 0.1, 0.02, 2, 0, PageSize.A4));

    /// <summary>Sizes the frame; nothing may be said against it but warnings.</summary>
    public SizedFrame Size(out DiagnosticList diagnostics, int threads = 1)
    {
        diagnostics = [];
        SizedFrame? sized = SectionSizer.Size(Build(), diagnostics, null, threads);
        Assert.True(sized is not null, string.Join("\n", diagnostics));
        return sized;
    }

    public SizedFrame Size() => Size(out _);

    /// <summary>The errors of a frame that can't be sized.</summary>
    public IReadOnlyList<string> Errors()
    {
        DiagnosticList diagnostics = [];
        Assert.Null(SectionSizer.Size(Build(), diagnostics, null, 1));
        return [.. diagnostics.Where(d => d.Severity == Severity.Error).Select(d => d.Message)];
    }

    private static int Find(IEnumerable<string> names, string name)
    {
        int index = names.ToList().IndexOf(name);
        return index >= 0 ? index : throw new ArgumentOutOfRangeException(nameof(name), name, "No such name.");
    }

    private int GroupIndex(string name) => Find(_groups.Select(g => g.Name), name);

    private int CaseIndex(string name) => Find(_cases.Select(c => c.Name), name);

    private int[] TubesOf(string group) =>
        [.. Enumerable.Range(0, _tubes.Count).Where(t => _tubes[t].Group == GroupIndex(group))];

    private TubeEnd EndAt(string node, Vector3? offset, bool wrap)
    {
        int n = NodeIndex(node);
        return new TubeEnd(n, _nodes[n].Position + (offset ?? Vector3.Zero), RequestedCut.Default, null, 0, wrap, Place);
    }

    private FrameBuilder Add(TubeGroup group)
    {
        _groups.Add(group);
        return this;
    }

    private FrameBuilder Add(Func<int, Target> target)
    {
        _targets.Add(target(_targets.Count));
        return this;
    }
}
