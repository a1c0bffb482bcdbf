using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Sizing.Analysis;

/// <summary>Where welds soften the tubes of one design: along each tube, stretches in order that do not touch.</summary>
internal sealed class WeldZones
{
    private readonly WeldPairs _pairs;
    private readonly int[] _first;
    private readonly int[] _count;
    private readonly WeldZone[] _zones;

    public WeldZones(WeldPairs pairs)
    {
        _pairs = pairs;
        _first = new int[pairs.MostZones.Count];
        _count = new int[_first.Length];
        int total = 0;
        for (int t = 0; t < _first.Length; t++)
        {
            _first[t] = total;
            total += pairs.MostZones[t];
        }

        _zones = new WeldZone[total];
    }

    /// <summary>The stretches of a tube within reach of a weld.</summary>
    public ReadOnlySpan<WeldZone> Of(int tube) => _zones.AsSpan(_first[tube], _count[tube]);

    /// <summary>Works the zones out for a design.</summary>
    /// <param name="joints">The joints of all designs.</param>
    /// <param name="choice">The design.</param>
    /// <param name="sections">Its sections, by group.</param>
    /// <param name="halfWidths">Half the larger outer size, by group, mm.</param>
    public void Fill(JointTable joints, ReadOnlySpan<int> choice, Section[] sections, ReadOnlySpan<double> halfWidths)
    {
        Array.Clear(_count);
        IReadOnlyList<Tube> tubes = _pairs.Model.Tubes;
        for (int n = 0; n < joints.Nodes.Length; n++)
        {
            NodeEntries node = joints.Nodes[n];
            IReadOnlyList<WeldPair> pairs = _pairs.ByNode[n];
            if (pairs.Count == 0)
            {
                continue;
            }

            JointEntry joint = joints.At(node, choice, sections);
            for (int p = 0; p < pairs.Count; p++)
            {
                WeldPair pair = pairs[p];
                double a = halfWidths[tubes[pair.A.Tube].Group];
                double b = halfWidths[tubes[pair.B.Tube].Group];
                Add(pair.A, Reach(node, joint, pair, a, b));
                Add(pair.B, Reach(node, joint, pair, b, a));
            }
        }
    }

    private static double Reach(NodeEntries node, JointEntry joint, WeldPair pair, double r, double other)
    {
        bool firstTwo = (pair.A.Slot == joint.First && pair.B.Slot == joint.Second)
            || (pair.A.Slot == joint.Second && pair.B.Slot == joint.First);
        if (firstTwo && joint.Corner == Corner.Miter)
        {
            return WeldReach.Miter(r, pair.Sin, pair.Cos);
        }

        if (firstTwo && joint.Corner == Corner.InLine)
        {
            return WeldReach.HeatAffected;
        }

        bool stands = node.Through is not null
            ? pair.A.Slot < 0 || pair.B.Slot < 0
            : pair.A.Slot == joint.First || pair.B.Slot == joint.First;
        return stands
            ? WeldReach.Cope(r, other, pair.Sin, pair.Cos)
            : WeldReach.BothCut(r, other, pair.Sin, pair.Cos);
    }

    private void Add(WeldMember member, double reach)
    {
        // Inserts in order and merges with what it overlaps.
        double length = _pairs.Model.Tubes[member.Tube].Length;
        double from = Math.Max(0, member.At - reach);
        double to = Math.Min(length, member.At + reach);
        Span<WeldZone> zones = _zones.AsSpan(_first[member.Tube]);
        int count = _count[member.Tube];
        int i = 0;
        while (i < count && zones[i].To < from)
        {
            i++;
        }

        int j = i;
        while (j < count && zones[j].From <= to)
        {
            from = Math.Min(from, zones[j].From);
            to = Math.Max(to, zones[j].To);
            j++;
        }

        zones[j..count].CopyTo(zones[(i + 1)..]);
        zones[i] = new WeldZone(from, to);
        _count[member.Tube] = count - (j - i) + 1;
    }
}

/// <summary>A stretch of a tube within reach of a weld, mm from the tube's start.</summary>
internal readonly record struct WeldZone(double From, double To);
