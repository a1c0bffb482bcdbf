using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Tests.Joints;

/// <summary>Makes small frames by hand: tubes, and the joints between their ends in the order given.</summary>
internal sealed class FrameBuilder
{
    public static readonly Material Steel = new("test steel", 210_000, 81_000, 7.85e-6, 235, 360, 235, "invented for tests");
    private static readonly SourcePlace Nowhere = new("test.yaml", 1, 1);

    private readonly List<Node> _nodes = [];
    private readonly List<Tube> _tubes = [];
    private readonly List<TubeGroup> _groups = [];
    private readonly List<NodeJoint> _joints = [];

    public CutMode Mode { get; init; } = CutMode.Contour;

    public double Tolerance { get; init; } = 0.02;

    public int Node(Vector3 position, int? through = null)
    {
        _nodes.Add(new Node($"n{_nodes.Count}", position, through, 0, At(_nodes.Count)));
        return _nodes.Count - 1;
    }

    public int Tube(
        int from,
        int to,
        Section section,
        Vector3? up = null,
        Vector3? fromOffset = null,
        Vector3? toOffset = null,
        Func<TubeEnd, TubeEnd>? changeFrom = null,
        Func<TubeEnd, TubeEnd>? changeTo = null)
    {
        int index = _tubes.Count;
        TubeEnd first = new(from, _nodes[from].Position + (fromOffset ?? Vector3.Zero), RequestedCut.Default, null, 0, false, At(100 + index));
        TubeEnd last = new(to, _nodes[to].Position + (toOffset ?? Vector3.Zero), RequestedCut.Default, null, 0, false, At(200 + index));
        first = changeFrom?.Invoke(first) ?? first;
        last = changeTo?.Invoke(last) ?? last;
        _groups.Add(new TubeGroup($"g{index}", Steel, [new Candidate(section, "", 6000, null)], true, null, true, Nowhere));
        _tubes.Add(new Tube($"t{index}", first, last, index, TubeAxes.Along(last.Point - first.Point, up), [], null, At(300 + index)));
        return index;
    }

    public void Joint(int node, int? through, Corner corner, params TubeEndId[] ends) =>
        _joints.Add(new NodeJoint(node, through, ends, corner));

    public SizedFrame Build()
    {
        // Ends that no joint names stand alone and square.
        for (int i = 0; i < _tubes.Count; i++)
        {
            foreach (End end in (End[])[End.From, End.To])
            {
                TubeEndId id = new(i, end);
                if (!_joints.Any(j => j.Ends.Contains(id)))
                {
                    _joints.Add(new NodeJoint(_tubes[i][end].Node, null, [id], Corner.None));
                }
            }
        }

        SpecIdentity spec = new([], [], "test.yaml", "", "Test frame", "", "");
        FrameGen.Model.Fabrication fabrication = new(Mode, 0.1, Tolerance, 2, 0, PageSize.A4);

        FrameModel model = new(spec, DisplaySpec.Metric, _nodes, _tubes, _groups, [], [], [], [], [], fabrication);
        return new SizedFrame(model, [.. _groups.Select(g => g.Candidates[0])], SizingStatus.Fixed, 0, null, 0, [], [], _joints);
    }

    public CutFrame Cut()
    {
        DiagnosticList diagnostics = [];
        CutFrame? cut = EndCoper.Cope(Build(), diagnostics);
        return cut ?? throw new InvalidOperationException(string.Join('\n', diagnostics));
    }

    private static SourcePlace At(int line) => new("test.yaml", line, 1);
}
