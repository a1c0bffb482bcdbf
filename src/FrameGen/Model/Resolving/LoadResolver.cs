using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>The loads that a case writes itself, with their twins.</summary>
internal sealed class LoadResolver
{
    private readonly Frame _frame;
    private readonly bool _isMirrored;
    private readonly HashSet<string> _writtenNodes;
    private readonly HashSet<string> _writtenLines;
    private readonly HashSet<string> _writtenPoints;

    private LoadResolver(CaseSpec spec, Frame frame)
    {
        (_frame, _isMirrored) = (frame, spec.Mirror && frame.Mirror is not null);
        _writtenNodes = NameIndex.Written(spec.Loads.OfType<NodeLoadSpec>().Select(l => l.Node));
        _writtenLines = NameIndex.Written(spec.Loads.OfType<LineLoadSpec>().Select(l => l.Tube));
        _writtenPoints = NameIndex.Written(spec.Loads.OfType<PointLoadSpec>().Select(l => l.Tube));
    }

    /// <summary>Forces and moments on nodes, global.</summary>
    public List<NodeLoad> NodeLoads { get; } = [];

    /// <summary>Loads along tubes, global.</summary>
    public List<LineLoad> LineLoads { get; } = [];

    /// <summary>Forces and moments at places on tubes, global.</summary>
    public List<PointLoad> PointLoads { get; } = [];

    /// <summary>Binds a case's loads, each twin right after its original.</summary>
    public static LoadResolver Of(CaseSpec spec, Frame frame)
    {
        var loads = new LoadResolver(spec, frame);
        string whose = $"case {spec.Name.Value}";
        foreach (LoadSpec load in spec.Loads)
        {
            switch (load)
            {
                case NodeLoadSpec node:
                    loads.Add(node, whose);
                    break;
                case LineLoadSpec line:
                    loads.Add(line, whose);
                    break;
                case PointLoadSpec point:
                    loads.Add(point, whose);
                    break;
            }
        }

        return loads;
    }

    private void Add(NodeLoadSpec spec, string whose)
    {
        int? node = _frame.FindJoinedNode(spec.Node, whose);
        Vector3? force = _frame.Values.OrZero(spec.Force);
        Vector3? moment = _frame.Values.OrZero(spec.Moment);
        if (node is not { } n || force is not { } f || moment is not { } m)
        {
            return;
        }

        NodeLoads.Add(new NodeLoad(n, f, m));
        if (IsMirrored(spec) && _frame.TwinOfNode(spec.Node.Value) is { } twin && !_writtenNodes.Contains(_frame.Draft.Nodes[twin].Name))
        {
            NodeLoads.Add(new NodeLoad(twin, _frame.Mirror!.Of(f), _frame.Mirror.OfMoment(m)));
        }
    }

    private void Add(LineLoadSpec spec, string whose)
    {
        int? tube = _frame.FindTube(spec.Tube, whose);
        Vector3? perLength = _frame.Values.Of(spec.PerLength);
        if (tube is not { } t || perLength is not { } load)
        {
            return;
        }

        LineLoads.Add(new LineLoad(t, load));
        if (IsMirrored(spec) && _frame.TwinOfTube(spec.Tube.Value) is { } twin && !_writtenLines.Contains(_frame.Draft.Tubes[twin].Name))
        {
            LineLoads.Add(new LineLoad(twin, _frame.Mirror!.Of(load)));
        }
    }

    private void Add(PointLoadSpec spec, string whose)
    {
        int? tube = _frame.FindTube(spec.Tube, whose);
        Vector3? force = _frame.Values.OrZero(spec.Force);
        Vector3? moment = _frame.Values.OrZero(spec.Moment);
        double? share = spec.Share is null ? null : _frame.Values.Of(spec.Share);
        double? written = spec.Distance is null ? null : _frame.Values.Of(spec.Distance);
        if (tube is not { } t || force is not { } f || moment is not { } m || (share ?? written) is null || _frame.Tubes[t] is not { } placed)
        {
            return;
        }

        double distance = share * placed.Length ?? written!.Value;
        if (!(distance >= 0 && distance <= placed.Length + Lengths.Same))
        {
            _frame.Diagnostics.Error(
                spec.At,
                $"{whose}: the load on tube {spec.Tube.Value} lies at {distance:0.###} mm, beside the tube, which goes from 0 to {placed.Length:0.###} mm");
            return;
        }

        PointLoads.Add(new PointLoad(t, Math.Min(distance, placed.Length), f, m));
        if (IsMirrored(spec) && _frame.TwinOfTube(spec.Tube.Value) is { } twin && !_writtenPoints.Contains(_frame.Draft.Tubes[twin].Name)
            && DistanceOnTwin(t, twin, distance, spec, whose) is { } there)
        {
            PointLoads.Add(new PointLoad(twin, there, _frame.Mirror!.Of(f), _frame.Mirror.OfMoment(m)));
        }
    }

    private bool IsMirrored(LoadSpec spec) => _isMirrored && spec.Mirror;

    // A tube on the other side may be written out by hand, from its other end, or end at a node that is.
    private double? DistanceOnTwin(int tube, int twin, double distance, PointLoadSpec spec, string whose)
    {
        if (_frame.Tubes[tube] is not { } original || _frame.Tubes[twin] is not { } placed)
        {
            return null;
        }

        Vector3 image = _frame.Mirror!.Of(original.PointAt(distance));
        if (_frame.Draft.AreTwins(tube, twin) && (placed.PointAt(distance) - image).Length <= NodePlacement.Near)
        {
            return Math.Min(distance, placed.Length);
        }

        if (placed.Bent is not null && (placed.PointAt(placed.Length - distance) - image).Length <= NodePlacement.Near)
        {
            return Math.Max(0, placed.Length - distance);
        }

        double there = Math.Clamp((image - placed.From.Point).Dot(placed.Axes.X), 0, placed.Length);
        double miss = (image - (placed.From.Point + (there * placed.Axes.X))).Length;
        if (miss <= NodePlacement.Near && original.Bent is null && placed.Bent is null)
        {
            return there;
        }

        _frame.Diagnostics.Error(
            spec.At,
            $"{whose}: the mirror image of the load on tube {spec.Tube.Value} lies {miss:0.###} mm beside tube "
            + $"{_frame.Draft.Tubes[twin].Name}, which is no mirror image; write its load out, or mirror: false");
        return null;
    }
}
