using FrameGen.Diagnostics;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>The supports of a model, and how to find those that a case or target names.</summary>
internal sealed class SupportResolver
{
    private readonly Frame _frame;
    private readonly List<Support> _supports = [];
    private readonly List<int?> _twins = [];
    private readonly Dictionary<int, int> _byNode = [];
    private readonly HashSet<string> _written;

    private SupportResolver(Frame frame, IReadOnlyList<SupportSpec> specs) =>
        (_frame, _written) = (frame, NameIndex.Written(specs.Select(s => s.Node)));

    /// <summary>The supports, each twin right after its original.</summary>
    public IReadOnlyList<Support> All => _supports;

    /// <summary>Binds supports and makes their twins.</summary>
    public static SupportResolver Of(IReadOnlyList<SupportSpec> specs, Frame frame)
    {
        var resolver = new SupportResolver(frame, specs);
        foreach (SupportSpec spec in specs)
        {
            resolver.Add(spec);
        }

        resolver.LinkWrittenTwins(specs);
        return resolver;
    }

    /// <summary>Numbers of the supports that act: all where none are named; null after an error.</summary>
    /// <param name="names">Names of held nodes; null for all.</param>
    /// <param name="withTwins">True where the twins of those named act too.</param>
    /// <param name="whose">What names them, to begin the message with.</param>
    /// <param name="at">Where that is written.</param>
    public IReadOnlyList<int>? Acting(IReadOnlyList<Placed<string>>? names, bool withTwins, string whose, SourcePlace at)
    {
        if (_written.Count == 0 || names is { Count: 0 })
        {
            _frame.Diagnostics.Error(
                at, $"{whose}: nothing holds the frame; write supports, for example: supports: {{NODE: {{hold: [x, y, z]}}}}");
            return null;
        }

        if (names is null)
        {
            return [.. Enumerable.Range(0, _supports.Count)];
        }

        var acting = new SortedSet<int>();
        bool isSound = true;
        foreach (Placed<string> name in names)
        {
            if (Find(name, whose) is not { } support)
            {
                isSound = false;
                continue;
            }

            acting.Add(support);
            if (withTwins && _twins[support] is { } twin)
            {
                acting.Add(twin);
            }
        }

        return isSound ? [.. acting] : null;
    }

    private int? Find(Placed<string> name, string whose)
    {
        if (_frame.FindNode(name, whose) is not { } node)
        {
            return null;
        }

        if (_byNode.TryGetValue(node, out int support))
        {
            return support;
        }

        // A support that is written and not here has had its error.
        if (_written.Contains(name.Value))
        {
            return null;
        }

        string held = string.Join(", ", _supports.Select(s => _frame.Draft.Nodes[s.Node].Name));
        _frame.Diagnostics.Error(name.At, $"{whose}: node {name.Value} has no support; held are {held}");
        return null;
    }

    private void Add(SupportSpec spec)
    {
        string whose = $"support {spec.Node.Value}";
        if (_frame.FindJoinedNode(spec.Node, whose) is not { } node)
        {
            return;
        }

        if (!spec.Held.Contains(true) && spec.Springs.All(s => s is null))
        {
            _frame.Diagnostics.Error(spec.Node.At, $"{whose} holds nothing; write for example hold: [x, y, z]");
            return;
        }

        double?[] rates = [.. spec.Springs.Select(s => s is null ? 0 : _frame.Values.Positive(s, $"{whose}: a spring's rate"))];
        if (rates.Contains(null))
        {
            return;
        }

        double[] springs = [.. rates.Select(r => r!.Value)];
        int original = Merge(new Support(node, spec.Held, spec.Node.At) { Springs = springs });
        if (spec.Mirror && _frame.TwinOfNode(spec.Node.Value) is { } twin && !_written.Contains(_frame.Draft.Nodes[twin].Name))
        {
            // What is held in a direction is held in its mirror image: the flags are the same, and so are the rates.
            _twins[original] = Merge(new Support(twin, spec.Held, spec.Node.At) { Springs = springs });
        }
    }

    // A support that is written out by hand on the twin's node is the twin all the same.
    private void LinkWrittenTwins(IReadOnlyList<SupportSpec> specs)
    {
        foreach (SupportSpec spec in specs)
        {
            if (spec.Mirror
                && _frame.Draft.NodeNames.Find(spec.Node.Value) is { } node && _byNode.TryGetValue(node, out int original)
                && _frame.TwinOfNode(spec.Node.Value) is { } twin && _byNode.TryGetValue(twin, out int twinSupport))
            {
                _twins[original] = twinSupport;
            }
        }
    }

    private int Merge(Support support)
    {
        if (_byNode.TryGetValue(support.Node, out int same))
        {
            Support first = _supports[same];
            _supports[same] = first with
            {
                Held = [.. first.Held.Zip(support.Held, (a, b) => a || b)],
                Springs = [.. first.Springs.Zip(support.Springs, (a, b) => a + b)],
            };
            return same;
        }

        _byNode.Add(support.Node, _supports.Count);
        _supports.Add(support);
        _twins.Add(null);
        return _supports.Count - 1;
    }
}
