namespace FrameGen.Model;

/// <summary>What the first tubes of a joint without a through tube do.</summary>
public enum Corner
{
    /// <summary>A tube runs through, or a single end stands alone: nothing runs out.</summary>
    None,

    /// <summary>The first tube ends square and runs out past the node.</summary>
    RunOut,

    /// <summary>The first two are mitred.</summary>
    Miter,

    /// <summary>The first two are in line within 1 degree, and end square at the node.</summary>
    InLine,
}

/// <summary>The joint at a node in one design.</summary>
/// <param name="Node">Index of the node.</param>
/// <param name="Through">The tube that runs through, which stands before all ends; null for none.</param>
/// <param name="Ends">Tube ends in the order of fitting: each is cut to fit those before it.</param>
/// <param name="Corner">What the first ends do.</param>
public sealed record NodeJoint(int Node, int? Through, IReadOnlyList<TubeEndId> Ends, Corner Corner)
{
    /// <summary>Its tubes in the order of fitting, each once, the one that runs through first.</summary>
    public IEnumerable<int> Tubes
    {
        get
        {
            IEnumerable<int> ends = Ends.Select(e => e.Tube);
            return (Through is { } through ? ends.Prepend(through) : ends).Distinct();
        }
    }
}
