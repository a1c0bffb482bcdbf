using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Sizing.Explanation;

/// <summary>
/// How the targets answer to small changes of one group, by central differences of exact reanalyses: the same arithmetic as the targets themselves, so that it holds for
/// every kind of target, with all that hangs on a size (stiffness, weight, stress, reach of welds).
/// </summary>
internal sealed class Sensitivities
{
    /// <summary>
    /// Relative change to either side: small enough that what the difference leaves out is about a millionth, large enough that eigenvalues' last digits don't show.
    /// </summary>
    public const double Step = 1e-3;

    private readonly double[]? _perStiffness;
    private readonly double[]? _perMass;

    private Sensitivities(double[]? perStiffness, double[]? perMass) => (_perStiffness, _perMass) = (perStiffness, perMass);

    /// <summary>Percent of a target's limit per percent of the group's stiffness; null where unknown.</summary>
    /// <param name="target">Its position.</param>
    public double? PerStiffness(int target) => Finite(_perStiffness?[target]);

    /// <summary>Percent of a target's limit per percent of the group's mass; null where unknown.</summary>
    /// <param name="target">Its position.</param>
    public double? PerMass(int target) => Finite(_perMass?[target]);

    /// <summary>Finds them.</summary>
    public static Sensitivities Of(SizedFrame sized, int group)
    {
        double stiffness = Math.Log((1 + Step) / (1 - Step));
        double[]? perStiffness = Slopes(Reanalysis.Stiffer(sized, group, 1 - Step), Reanalysis.Stiffer(sized, group, 1 + Step), stiffness);
        Candidate own = sized.Chosen[group];
        if (WithWall(own.Section, 1 - Step) is not { } thinner || WithWall(own.Section, 1 + Step) is not { } thicker)
        {
            return new Sensitivities(perStiffness, null);
        }

        var less = Reanalysis.With(sized, group, own with { Section = thinner });
        var more = Reanalysis.With(sized, group, own with { Section = thicker });
        bool smooth = less.HasSameOrder(sized) && more.HasSameOrder(sized);
        return new Sensitivities(perStiffness, smooth ? Slopes(less, more, Math.Log(thicker.Area / thinner.Area)) : null);
    }

    private static double[]? Slopes(Reanalysis less, Reanalysis more, double change) => less.Targets is { } low && more.Targets is { } high
        ? [.. low.Zip(high, (l, h) => (h.Ratio - l.Ratio) / change)]
        : null;

    private static double? Finite(double? value) => value is { } v && double.IsFinite(v) ? v : null;

    // A rod's outside is all it has. A wall can be so near the bore's end that there is no thicker one.
    private static Section? WithWall(Section section, double factor)
    {
        try
        {
            return section switch
            {
                RoundTube tube => new RoundTube(tube.OutsideDiameter, factor * tube.Wall),
                Rod rod => new Rod(factor * rod.Diameter),
                FlatSidedTube { HasOwnInnerCorner: true } tube => new FlatSidedTube(tube.Height, tube.Width, factor * tube.Wall, tube.OuterCorner, tube.InnerCorner),
                FlatSidedTube tube => new FlatSidedTube(tube.Height, tube.Width, factor * tube.Wall, tube.OuterCorner),
                EllipseTube tube => new EllipseTube(tube.Height, tube.Width, factor * tube.Wall),
                _ => null,
            };
        }
        catch (ArgumentOutOfRangeException)
        {
            return null;
        }
    }
}
