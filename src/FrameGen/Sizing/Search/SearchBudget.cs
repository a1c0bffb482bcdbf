namespace FrameGen.Sizing.Search;

/// <summary>What a search may spend: counts, never seconds, so that the answer is the same on any machine.</summary>
internal sealed record SearchBudget
{
    /// <summary>Designs analysed on the way to a proof, and as many again in exchanges.</summary>
    public int Analyses { get; init; } = 4096;

    /// <summary>Parts of the program's search.</summary>
    public long Parts { get; init; } = 20_000;

    /// <summary>So many designs are gone through one by one, and no more.</summary>
    public long OneByOne { get; init; } = SectionSizer.MostDesigns;

    /// <summary>Analyses of the exchanges that go on where a proof is out of reach.</summary>
    public int Exchanges { get; init; } = 4096;
}
