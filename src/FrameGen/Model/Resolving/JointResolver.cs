using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Binds what the spec asks of joints, and makes the twins.</summary>
internal sealed class JointResolver
{
    private readonly Frame _frame;
    private readonly List<JointRequest> _joints = [];
    private readonly HashSet<int> _taken = [];

    private JointResolver(Frame frame) => _frame = frame;

    /// <summary>All joints asked for, each twin right after its original.</summary>
    public static IReadOnlyList<JointRequest> Resolve(IReadOnlyList<JointSpec> specs, Frame frame)
    {
        var resolver = new JointResolver(frame);
        HashSet<string> written = NameIndex.Written(specs.Select(j => j.Node));
        foreach (JointSpec spec in specs)
        {
            JointRequest? joint = resolver.Bind(spec);
            if (spec.Mirror && frame.TwinOfNode(spec.Node.Value) is { } twin && !written.Contains(frame.Draft.Nodes[twin].Name))
            {
                // An original that can't be made has had its error; its twin has nothing to add.
                resolver.Add(joint is null ? null : resolver.Twin(joint, twin));
            }
        }

        return resolver._joints;
    }

    private JointRequest? Bind(JointSpec spec)
    {
        string whose = $"joint {spec.Node.Value}";
        int? node = _frame.FindNode(spec.Node, whose);
        List<int>? miter = Tubes(spec.Miter, whose);
        List<int>? order = Tubes(spec.Order, whose);
        if (node is not { } n || miter is null || order is null)
        {
            return null;
        }

        if (spec.Miter is not null && miter.Count != 2)
        {
            Error(spec.At, $"{whose}: miter takes two tubes, and has {miter.Count}; write miter: [a, b]");
            return null;
        }

        return Add(new JointRequest(n, spec.Miter is null ? null : (miter[0], miter[1]), order, spec.At));
    }

    private List<int>? Tubes(IReadOnlyList<Placed<string>>? names, string whose)
    {
        var tubes = new List<int>();
        bool isSound = true;
        foreach (Placed<string> name in names ?? [])
        {
            int? tube = _frame.FindTube(name, whose);
            isSound &= tube is not null;
            tubes.Add(tube ?? -1);
        }

        return isSound ? tubes : null;
    }

    private JointRequest Twin(JointRequest joint, int node) => joint with
    {
        Node = node,
        Miter = joint.Miter is { } pair ? (Image(pair.A), Image(pair.B)) : null,
        Order = [.. joint.Order.Select(Image)],
    };

    private int Image(int tube) => _frame.Draft.ImageOfTube(tube, _frame.Mirror!);

    private JointRequest? Add(JointRequest? joint)
    {
        if (joint is null || !IsSound(joint))
        {
            return null;
        }

        _joints.Add(joint);
        return joint;
    }

    private bool IsSound(JointRequest joint)
    {
        string whose = $"joint {_frame.Draft.Nodes[joint.Node].Name}";
        if (!_taken.Add(joint.Node))
        {
            Error(joint.At, $"{whose} is written twice; put both into one entry");
            return false;
        }

        int[] named = joint.Miter is { } pair ? [pair.A, pair.B, .. joint.Order] : [.. joint.Order];
        int? through = _frame.Nodes.ThroughOf(joint.Node)?.Tube;
        bool isSound = true;
        var seen = new HashSet<int>();
        for (int i = 0; i < named.Length; i++)
        {
            string name = _frame.Draft.Tubes[named[i]].Name;
            if (!seen.Add(named[i]))
            {
                isSound = Error(joint.At, $"{whose} names tube {name} twice; name each once (miter puts its two first)");
            }
            else if (named[i] != through && EndAt(named[i], joint.Node) is null)
            {
                isSound = Error(joint.At, $"{whose}: tube {name} does not meet this node; name only tubes that end here: {TubesAt(joint.Node)}");
            }
            else if (named[i] == through && i > 0)
            {
                isSound = Error(joint.At, $"{whose}: tube {name} runs through and always stands first; name it first or leave it out");
            }
        }

        return isSound && (joint.Miter is not { } two || IsMiterSound(joint, two, through, whose));
    }

    private bool IsMiterSound(JointRequest joint, (int A, int B) pair, int? through, string whose)
    {
        string names = $"{_frame.Draft.Tubes[pair.A].Name} and {_frame.Draft.Tubes[pair.B].Name}";
        if (through is { } tube)
        {
            return Error(
                joint.At,
                $"{whose}: {names} can't be mitred where tube {_frame.Draft.Tubes[tube].Name} runs through: both are cut to that one; write order: [..]");
        }

        if (_frame.Tubes[pair.A] is not { } a || _frame.Tubes[pair.B] is not { } b)
        {
            return false;
        }

        End endA = EndAt(pair.A, joint.Node)!.Value;
        End endB = EndAt(pair.B, joint.Node)!.Value;
        double apart = (a.At(endA).Point - b.At(endB).Point).Length;
        bool isSound = true;
        if (apart > Lengths.Same)
        {
            isSound = Error(
                joint.At,
                $"{whose}: {names} can't be mitred, since their axes end {apart:0.###} mm apart; give both the same offset, or write order: [..]");
        }

        Vector3 intoA = a.Into(endA);
        Vector3 intoB = b.Into(endB);
        if (intoA.AngleTo(intoB) < 1e-3)
        {
            isSound = Error(joint.At, $"{whose}: {names} can't be mitred, since they lie on each other; no plane parts them");
        }

        return IsLeftToTheMiter(pair.A, a.At(endA), whose) & IsLeftToTheMiter(pair.B, b.At(endB), whose) & isSound;
    }

    private bool IsLeftToTheMiter(int tube, TubeEnd end, string whose)
    {
        string name = _frame.Draft.Tubes[tube].Name;
        if (end.Extend is not null)
        {
            return Error(end.At, $"{whose}: tube {name} is mitred here, and extend moves square ends only; leave out one of them");
        }

        if (end.Cut != RequestedCut.Default)
        {
            string cut = end.Cut switch
            {
                RequestedCut.Cope => "cope",
                RequestedCut.Plane => "{plane: ...}",
                _ => "square",
            };
            return Error(end.At, $"{whose}: tube {name} is to be mitred here, and its end asks for cut: {cut}; leave out one of them");
        }

        return true;
    }

    private End? EndAt(int tube, int node)
    {
        TubeDraft draft = _frame.Draft.Tubes[tube];
        return draft.From == node ? End.From : draft.To == node ? End.To : null;
    }

    private string TubesAt(int node)
    {
        string[] names = [.. _frame.Draft.Tubes.Where(t => t.From == node || t.To == node).Select(t => t.Name)];
        return names.Length == 0 ? "none" : string.Join(", ", names);
    }

    private bool Error(SourcePlace at, string message)
    {
        _frame.Diagnostics.Error(at, message);
        return false;
    }
}
