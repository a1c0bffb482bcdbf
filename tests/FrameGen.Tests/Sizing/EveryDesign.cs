using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Targets;
using FrameGen.Spec;

namespace FrameGen.Tests.Sizing;

/// <summary>All designs of a small frame, and the first that meets the targets: by cost where that is asked for, mass, different sizes, names.</summary>
internal sealed record EveryDesign(DesignSpace Space, IReadOnlyList<TargetCheck> Checks, StructuralModel Structure, JointTable Joints, WeldPairs Welds)
{
    public int[]? First { get; private init; }

    public DesignAnalysis NewAnalysis() => new(Space, Joints, Welds, Structure);

    public static EveryDesign Of(FrameModel model)
    {
        IReadOnlyList<TargetCheck> checks = TargetCheck.All(model);
        DesignSpace space = DesignSpace.Create(model, (_, _) => true, out _);
        var structure = StructuralModel.Build(model);
        var joints = new JointTable(space);
        var welds = WeldPairs.Build(joints, model);
        var all = new EveryDesign(space, checks, structure, joints, welds);
        DesignAnalysis analysis = all.NewAnalysis();
        TargetCheck[] cheapFirst = [.. checks.OrderBy(c => c.Cost)];
        double[] lengths = [.. model.Groups.Select((_, g) => model.Tubes.Where(t => t.Group == g).Sum(t => t.Length))];
        (Key Key, int[] Choice)? first = null;
        var choice = new int[space.Groups];
        for (int design = 0; design < space.Count; design++)
        {
            space.Decode(design, choice);
            var key = Key.Of(model, lengths, [.. choice.Select((c, g) => space[g][c].Candidate)]);
            if ((first is null || key.Against(first.Value.Key) < 0) && key.Different <= (model.Sizing.DifferentSizes ?? int.MaxValue))
            {
                analysis.Set(choice);
                if (joints.Fits(choice, analysis.Sections) && cheapFirst.All(c => c.Ratio(analysis) <= 1))
                {
                    first = (key, [.. choice]);
                }
            }
        }

        return all with { First = first?.Choice };
    }

    // Money to a millionth, kilograms to a billionth: finer than any two sizes differ.
    private sealed record Key(long Cost, long Mass, int Different, IReadOnlyList<string> Names)
    {
        public static Key Of(FrameModel model, double[] lengths, Candidate[] chosen)
        {
            (long cost, long mass) = (0, 0);
            for (int g = 0; g < chosen.Length; g++)
            {
                cost += model.Sizing.Objective == SizingObjective.Cost ? (long)Math.Round(chosen[g].PricePerMetre!.Value * lengths[g] / 1000 * 1e6) : 0;
                mass += (long)Math.Round(model.Groups[g].Material.Density * chosen[g].Section.Area * lengths[g] * 1e9);
            }

            int different = chosen.Select((c, g) => (model.Groups[g].Material.Name, c.Section)).Distinct().Count();
            return new Key(cost, mass, different, [.. chosen.Select(c => c.Section.Name)]);
        }

        public int Against(Key other)
        {
            int order = Cost.CompareTo(other.Cost);
            order = order != 0 ? order : Mass.CompareTo(other.Mass);
            order = order != 0 ? order : Different.CompareTo(other.Different);
            for (int g = 0; g < Names.Count && order == 0; g++)
            {
                order = string.CompareOrdinal(Names[g], other.Names[g]);
            }

            return order;
        }
    }
}
