using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>A node whose place is not known yet.</summary>
/// <param name="Name">Its name, or its twin's.</param>
/// <param name="Position">As written; the original's for a twin.</param>
/// <param name="Original">Number of the node it is the made twin of; null for what the spec writes out.</param>
/// <param name="At">Where it, or its original, is written.</param>
internal sealed record NodeDraft(string Name, NodePositionSpec Position, int? Original, SourcePlace At);

/// <summary>A tube whose ends are bound to nodes and not placed yet.</summary>
/// <param name="Name">Its name, or its twin's.</param>
/// <param name="Spec">As written; the original's for a twin.</param>
/// <param name="From">Number of the node it begins at; null after an error.</param>
/// <param name="To">Number of the node it ends at; null after an error.</param>
/// <param name="FromOffset">From that node to the axis' end, mm; null after an error.</param>
/// <param name="ToOffset">Likewise.</param>
/// <param name="Original">Number of the tube it is the made twin of; null for what the spec writes out.</param>
/// <param name="At">Where it, or its original, is written.</param>
internal sealed record TubeDraft(
    string Name, TubeSpec Spec, int? From, int? To, Vector3? FromOffset, Vector3? ToOffset, int? Original, SourcePlace At)
{
    /// <summary>Numbers of the nodes where it bends; null after an error. None for a straight tube.</summary>
    public IReadOnlyList<int?> Via { get; init; } = [];
}

/// <summary>All nodes and tubes of a spec with their made twins, each twin right after its original.</summary>
internal sealed class FrameDraft
{
    private readonly List<NodeDraft> _nodes = [];
    private readonly List<TubeDraft> _tubes = [];

    private FrameDraft()
    {
    }

    /// <summary>Nodes by number.</summary>
    public IReadOnlyList<NodeDraft> Nodes => _nodes;

    /// <summary>Tubes by number.</summary>
    public IReadOnlyList<TubeDraft> Tubes => _tubes;

    /// <summary>Numbers of the nodes.</summary>
    public NameIndex NodeNames { get; } = new("node");

    /// <summary>Numbers of the tubes.</summary>
    public NameIndex TubeNames { get; } = new("tube");

    /// <summary>Lists nodes and tubes and makes the twins that the spec does not write out.</summary>
    public static FrameDraft Of(FrameSpec spec, Reflection? mirror, SpecValues values)
    {
        var draft = new FrameDraft();
        draft.ListNodes(spec.Nodes, mirror, values.Diagnostics);
        draft.ListTubes(spec.Tubes, mirror, values);
        return draft;
    }

    /// <summary>True when one of two tubes is the made twin of the other, and runs the same way between their nodes.</summary>
    public bool AreTwins(int tube, int other) => _tubes[tube].Original == other || _tubes[other].Original == tube;

    /// <summary>Number of the node that is a node's mirror image: its twin, its original, or itself.</summary>
    public int ImageOfNode(int node, Reflection mirror) => NodeNames.Find(mirror.ImageOf(_nodes[node].Name, NodeNames)) ?? node;

    /// <summary>Number of the tube that is a tube's mirror image: its twin, its original, or itself.</summary>
    public int ImageOfTube(int tube, Reflection mirror) => TubeNames.Find(mirror.ImageOf(_tubes[tube].Name, TubeNames)) ?? tube;

    private void ListNodes(IReadOnlyList<NodeSpec> specs, Reflection? mirror, DiagnosticList diagnostics)
    {
        HashSet<string> written = NameIndex.Written(specs.Select(n => n.Name));
        foreach (NodeSpec spec in specs)
        {
            SourcePlace at = spec.Name.At;
            int original = Add(new NodeDraft(spec.Name.Value, spec.Position, null, at), diagnostics);
            if (mirror is not null && mirror.HasTwin(spec.Name.Value)
                && mirror.TwinOf(spec.Name, diagnostics) is { } twin && !written.Contains(twin))
            {
                Add(new NodeDraft(twin, spec.Position, original, at), diagnostics);
            }
        }
    }

    private void ListTubes(IReadOnlyList<TubeSpec> specs, Reflection? mirror, SpecValues values)
    {
        DiagnosticList diagnostics = values.Diagnostics;
        HashSet<string> written = NameIndex.Written(specs.Select(t => t.Name));
        foreach (TubeSpec spec in specs)
        {
            string whose = $"tube {spec.Name.Value}";
            var draft = new TubeDraft(
                spec.Name.Value,
                spec,
                NodeNames.Find(spec.From.Node, whose, diagnostics),
                NodeNames.Find(spec.To.Node, whose, diagnostics),
                values.OrZero(spec.From.Offset),
                values.OrZero(spec.To.Offset),
                null,
                spec.Name.At)
            {
                Via = [.. (spec.Bend?.Via ?? []).Select(node => NodeNames.Find(node, whose, diagnostics))],
            };
            int original = Add(draft, diagnostics);
            if (mirror is not null && mirror.HasTwin(spec.Name.Value)
                && mirror.TwinOf(spec.Name, diagnostics) is { } twin && !written.Contains(twin))
            {
                Add(Twin(draft, twin, original, mirror), diagnostics);
            }
        }
    }

    private TubeDraft Twin(TubeDraft draft, string name, int original, Reflection mirror) => draft with
    {
        Name = name,
        From = draft.From is { } from ? ImageOfNode(from, mirror) : null,
        To = draft.To is { } to ? ImageOfNode(to, mirror) : null,
        FromOffset = draft.FromOffset is { } fromOffset ? mirror.Of(fromOffset) : null,
        ToOffset = draft.ToOffset is { } toOffset ? mirror.Of(toOffset) : null,
        Original = original,
        Via = [.. draft.Via.Select(node => node is { } corner ? ImageOfNode(corner, mirror) : (int?)null)],
    };

    private int Add(NodeDraft node, DiagnosticList diagnostics)
    {
        NodeNames.Add(node.Name, node.At, diagnostics);
        _nodes.Add(node);
        return _nodes.Count - 1;
    }

    private int Add(TubeDraft tube, DiagnosticList diagnostics)
    {
        TubeNames.Add(tube.Name, tube.At, diagnostics);
        _tubes.Add(tube);
        return _tubes.Count - 1;
    }
}
