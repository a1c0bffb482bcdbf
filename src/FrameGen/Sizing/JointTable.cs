using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Sizing;

/// <summary>
/// The joints of all designs: at every node, for each combination of the sections that meet there, whether it can be made and which
/// tubes stand first. Filled as designs ask; an entry depends on nothing but its own combination, so threads may fill it together.
/// </summary>
internal sealed class JointTable
{
    // An entry in one word, so that it is written whole: two flags, the corner in two bits, the first two slots plus one.
    private const long Known = 1;
    private const long Good = 2;
    private const int CornerShift = 2;
    private const long CornerMask = 3;
    private const int FirstShift = 4;
    private const int SecondShift = 24;
    private const long SlotMask = 0xFFFFF;

    private readonly DesignSpace _space;
    private readonly NodeEntries[] _nodes;

    public JointTable(DesignSpace space)
    {
        _space = space;
        FrameModel model = space.Model;
        var nodes = new List<NodeEntries>();
        for (int n = 0; n < model.Nodes.Count; n++)
        {
            if (model.EndsAt[n].Count + (model.Nodes[n].Through is null ? 0 : 1) > 1)
            {
                nodes.Add(new NodeEntries(space, n, model.Nodes[n].Through, model.EndsAt[n]));
            }
        }

        _nodes = [.. nodes];
    }

    /// <summary>Nodes where more than one tube meets.</summary>
    public ReadOnlySpan<NodeEntries> Nodes => _nodes;

    /// <summary>True when every joint of a design can be made.</summary>
    /// <param name="choice">The design.</param>
    /// <param name="sections">Its sections, by group.</param>
    public bool Fits(ReadOnlySpan<int> choice, Section[] sections)
    {
        foreach (NodeEntries node in _nodes)
        {
            if (!At(node, choice, sections).Fits)
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>The joint of one node in a design.</summary>
    public JointEntry At(NodeEntries node, ReadOnlySpan<int> choice, Section[] sections)
    {
        long cell = node.CellOf(choice);
        long entry = node.Read(cell);
        if (entry == 0)
        {
            entry = Find(node, sections);
            node.Write(cell, entry);
        }

        return new JointEntry(
            (entry & Good) != 0,
            (Corner)((entry >> CornerShift) & CornerMask),
            (int)((entry >> FirstShift) & SlotMask) - 1,
            (int)((entry >> SecondShift) & SlotMask) - 1);
    }

    /// <summary>What stands in the way at a node, where a size that can be chosen is involved.</summary>
    public IReadOnlyList<FitProblem> ProblemsAt(NodeEntries node, Section[] sections)
    {
        NodeJoint joint = JointOrder.At(_space.Model, node.Node, sections);
        return [.. JointFit.Check(_space.Model, joint, sections).Where(p => IsChosen(p.End.Tube) || IsChosen(p.Mate))];
    }

    private bool IsChosen(int tube) => !_space.Model.Groups[_space.Model.Tubes[tube].Group].IsFixed;

    private long Find(NodeEntries node, Section[] sections)
    {
        NodeJoint joint = JointOrder.At(_space.Model, node.Node, sections);
        bool fits = true;
        foreach (FitProblem problem in node.HasChosen ? JointFit.Check(_space.Model, joint, sections) : [])
        {
            fits &= !IsChosen(problem.End.Tube) && !IsChosen(problem.Mate);
        }

        long first = joint.Ends.Count > 0 ? node.IndexOf(joint.Ends[0]) : -1;
        long second = joint.Ends.Count > 1 ? node.IndexOf(joint.Ends[1]) : -1;
        return Known | (fits ? Good : 0) | ((long)joint.Corner << CornerShift) | ((first + 1) << FirstShift) | ((second + 1) << SecondShift);
    }
}

/// <summary>A joint in one design.</summary>
/// <param name="Fits">Whether it can be made.</param>
/// <param name="Corner">What the first ends do.</param>
/// <param name="First">Position in <see cref="NodeEntries.Ends"/> of the first end; −1 for none.</param>
/// <param name="Second">Position of the second end; −1 for none.</param>
internal readonly record struct JointEntry(bool Fits, Corner Corner, int First, int Second);
