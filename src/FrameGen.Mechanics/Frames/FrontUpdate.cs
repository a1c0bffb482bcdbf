namespace FrameGen.Mechanics.Frames;

/// <summary>How an earlier front reaches into a later one's columns.</summary>
/// <param name="Source">The earlier front.</param>
/// <param name="Target">The later one.</param>
/// <param name="Start">The first of the earlier one's rows below, in nodes, that is an own column of the later one.</param>
/// <param name="End">One past the last of these.</param>
/// <param name="Runs">Rows below from <paramref name="Start"/> on, by runs that follow one another in the later front too.</param>
internal sealed record FrontUpdate(Front Source, Front Target, int Start, int End, FrontUpdate.Run[] Runs)
{
    /// <summary>Rows below of the earlier front, in nodes, from Start to End, that stand in the later one from Row (in freedoms) on.</summary>
    internal readonly record struct Run(int Start, int End, int Row);
}
