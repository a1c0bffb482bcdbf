using FrameGen.Joints;
using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Targets;

namespace FrameGen.Sizing.Explanation;

/// <summary>A sized frame with one group changed, analysed anew as sizing does it.</summary>
/// <param name="Targets">In the spec's order; null where the frame can't be solved.</param>
/// <param name="Fits">What stands in the way of joints where a size that can be chosen is involved.</param>
/// <param name="HasTooManySizes">True where it has more different sizes than the spec allows.</param>
/// <param name="Joints">By node.</param>
/// <param name="Sections">By group.</param>
internal sealed record Reanalysis(
    IReadOnlyList<TargetResult>? Targets,
    IReadOnlyList<FitProblem> Fits,
    bool HasTooManySizes,
    IReadOnlyList<NodeJoint> Joints,
    IReadOnlyList<Section> Sections)
{
    /// <summary>Analyses the frame with another candidate in one group, which counts as one that can be chosen.</summary>
    public static Reanalysis With(SizedFrame sized, int group, Candidate candidate) => Of(sized, group, candidate, sized.Model.Groups[group].Material);

    /// <summary>Analyses the frame with one group's tubes stiffer by a factor in every way, of the same mass and strength.</summary>
    public static Reanalysis Stiffer(SizedFrame sized, int group, double factor)
    {
        Material metal = sized.Model.Groups[group].Material;
        return Of(sized, group, sized.Chosen[group], metal with { E = factor * metal.E, G = factor * metal.G });
    }

    /// <summary>True where every joint is made in the same order.</summary>
    public bool HasSameOrder(SizedFrame sized) => Joints.Zip(sized.Joints).All(j => j.First.Ends.SequenceEqual(j.Second.Ends) && j.First.Corner == j.Second.Corner);

    private static Reanalysis Of(SizedFrame sized, int group, Candidate candidate, Material material)
    {
        FrameModel model = sized.Model with
        {
            Groups =
            [
                .. sized.Model.Groups.Select((g, i) => i == group
                    ? g with { Candidates = [candidate], IsFixed = false, Material = material }
                    : g with { Candidates = [sized.Chosen[i]] }),
            ],
        };
        IReadOnlyList<TargetCheck> checks = TargetCheck.All(model);
        var space = DesignSpace.Create(model, (_, _) => true, out _);
        var joints = new JointTable(space);
        StructuralModel? structure = checks.Any(c => c.NeedsFrame) ? StructuralModel.Build(model) : null;
        var analysis = new DesignAnalysis(space, joints, WeldPairs.Build(joints, model), structure);
        var fits = new List<FitProblem>();
        foreach (NodeEntries node in joints.Nodes)
        {
            fits.AddRange(joints.ProblemsAt(node, analysis.Sections));
        }

        return new Reanalysis(
            Results(checks, analysis),
            fits,
            !space.IsAllowed(analysis.Choice),
            [.. Enumerable.Range(0, model.Nodes.Count).Select(n => JointOrder.At(model, n, analysis.Sections))],
            analysis.Sections);
    }

    private static TargetResult[]? Results(IReadOnlyList<TargetCheck> checks, DesignAnalysis analysis)
    {
        try
        {
            return [.. checks.Select(c => c.Result(analysis))];
        }
        catch (MechanismException)
        {
            return null;
        }
    }
}
