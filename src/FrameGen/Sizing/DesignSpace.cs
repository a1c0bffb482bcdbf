using FrameGen.Mechanics.Frames;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Sizing;

/// <summary>
/// The designs to choose from: one option a group. A design is a list of positions in the groups' options, or the number that
/// stands for it; the tables hold what the search asks of an option, so that trying a design computes no section twice.
/// </summary>
internal sealed class DesignSpace
{
    /// <summary>Units in a kilogram: far below any difference that sizes make, so that rounding decides nothing.</summary>
    public const double UnitsPerKg = 1e9;

    /// <summary>Units in the shop's own money, where cost is made least.</summary>
    public const double UnitsPerMoney = 1e6;

    private readonly Option[][] _options;

    private DesignSpace(FrameModel model, Option[][] options)
    {
        Model = model;
        _options = options;
        Count = 1;
        foreach (Option[] group in options)
        {
            Count = Count > long.MaxValue / group.Length ? long.MaxValue : Count * group.Length;
        }
    }

    /// <summary>Different sizes at most; null for any number.</summary>
    public int? MostSizes { get; private init; }

    public FrameModel Model { get; }

    /// <summary>How many designs there are; <see cref="long.MaxValue"/> for that many or more.</summary>
    public long Count { get; }

    public int Groups => _options.Length;

    /// <summary>A group's options, by mass per metre, then by name.</summary>
    public ReadOnlySpan<Option> this[int group] => _options[group];

    /// <summary>All candidates that a filter lets pass.</summary>
    /// <param name="model">The frame.</param>
    /// <param name="keep">Whether a group may use a candidate; a group left with none keeps them all.</param>
    /// <param name="emptied">Groups that the filter would leave with nothing.</param>
    public static DesignSpace Create(FrameModel model, Func<int, Section, bool> keep, out IReadOnlyList<int> emptied)
    {
        var lengths = new double[model.Groups.Count];
        foreach (Tube tube in model.Tubes)
        {
            lengths[tube.Group] += tube.Length;
        }

        var none = new List<int>();
        var options = new Option[model.Groups.Count][];
        for (int g = 0; g < options.Length; g++)
        {
            TubeGroup group = model.Groups[g];

            // A group without tubes weighs nothing whatever it has: its first candidate stands for all.
            IEnumerable<Candidate> all = lengths[g] > 0 ? group.Candidates : group.Candidates.Take(1);
            List<Candidate> kept = [.. all.Where(c => keep(g, c.Section))];
            if (kept.Count == 0)
            {
                none.Add(g);
                kept = [.. group.Candidates];
            }

            options[g] = Describe(kept, group.Material, lengths[g], model.Sizing.Objective == SizingObjective.Cost);
        }

        emptied = none;
        return new DesignSpace(model, options) { MostSizes = model.Sizing.DifferentSizes };
    }

    /// <summary>The same with any number of different sizes.</summary>
    public DesignSpace WithAnySizes() => new(Model, _options);

    /// <summary>The design of a number, into <paramref name="choice"/>.</summary>
    public void Decode(int design, Span<int> choice)
    {
        for (int g = _options.Length - 1; g >= 0; g--)
        {
            design = Math.DivRem(design, _options[g].Length, out choice[g]);
        }
    }

    /// <summary>Mass of a design's tubes on their axis lengths, kg.</summary>
    public double MassOf(ReadOnlySpan<int> choice)
    {
        double mass = 0;
        for (int g = 0; g < choice.Length; g++)
        {
            mass += _options[g][choice[g]].MassKg;
        }

        return mass;
    }

    /// <summary>What is minimised, in whole units: sums of them are equal or not, and never nearly so.</summary>
    public long UnitsOf(ReadOnlySpan<int> choice)
    {
        long units = 0;
        for (int g = 0; g < choice.Length; g++)
        {
            units += _options[g][choice[g]].Units;
        }

        return units;
    }

    /// <summary>
    /// Every design, lightest first; equal masses (to 1e-9 kg, far below any difference that sizes make, so that rounding decides
    /// nothing) by fewer different sizes, then by the sections' names group by group.
    /// </summary>
    public int[] InOrder()
    {
        int count = checked((int)Count);
        var designs = new int[count];
        var masses = new long[count];
        var choice = new int[_options.Length];
        for (int design = 0; design < count; design++)
        {
            Decode(design, choice);
            designs[design] = design;
            masses[design] = UnitsOf(choice);
        }

        Array.Sort(masses, designs);
        for (int start = 0, stop; start < count; start = stop)
        {
            stop = start + 1;
            while (stop < count && masses[stop] == masses[start])
            {
                stop++;
            }

            if (stop - start > 1)
            {
                designs.AsSpan(start, stop - start).Sort(CompareEquallyHeavy);
            }
        }

        return designs;
    }

    /// <summary>Different sizes in a design: the same section in two materials counts twice.</summary>
    public int DifferentSizes(ReadOnlySpan<int> choice)
    {
        int different = 0;
        for (int g = 0; g < choice.Length; g++)
        {
            bool first = true;
            for (int before = 0; before < g && first; before++)
            {
                first = !string.Equals(Model.Groups[g].Material.Name, Model.Groups[before].Material.Name, StringComparison.Ordinal)
                    || !_options[g][choice[g]].Candidate.Nominal.Equals(_options[before][choice[before]].Candidate.Nominal);
            }

            different += first ? 1 : 0;
        }

        return different;
    }

    private static Option[] Describe(List<Candidate> candidates, Material material, double length, bool byCost)
    {
        // Positions by name decide ties; ordinal, so that no culture does.
        List<string> names = [.. candidates.Select(c => c.Section.Name).Order(StringComparer.Ordinal)];
        return [.. candidates.Select(candidate =>
        {
            Section section = candidate.Section;
            (double shearY, double shearZ) = section.ShearAreas(material.PoissonRatio);
            double massPerLength = material.Density * section.Area;
            return new Option(
                candidate,
                new BeamProfile(material.E, material.G, section.Area, section.Iy, section.Iz, section.J, shearY, shearZ),
                massPerLength,
                massPerLength * length,
                section.OuterSize / 2,
                names.IndexOf(section.Name))
            {
                MassUnits = (long)Math.Round(massPerLength * length * UnitsPerKg),
                Units = (long)Math.Round(byCost ? (candidate.PricePerMetre ?? 0) * length / 1000 * UnitsPerMoney : massPerLength * length * UnitsPerKg),
            };
        })];
    }

    /// <summary>True where a design has no more different sizes than the spec allows.</summary>
    public bool IsAllowed(ReadOnlySpan<int> choice) => MostSizes is not { } most || DifferentSizes(choice) <= most;

    /// <summary>Which of two designs that come to the same comes first: the lighter, then fewer different sizes, then the sections' names group by group.</summary>
    public int CompareTies(ReadOnlySpan<int> a, ReadOnlySpan<int> b)
    {
        long heavier = 0;
        for (int g = 0; g < _options.Length; g++)
        {
            heavier += _options[g][a[g]].MassUnits - _options[g][b[g]].MassUnits;
        }

        int order = heavier != 0 ? Math.Sign(heavier) : DifferentSizes(a).CompareTo(DifferentSizes(b));
        for (int g = 0; g < _options.Length && order == 0; g++)
        {
            order = _options[g][a[g]].NameRank.CompareTo(_options[g][b[g]].NameRank);
        }

        for (int g = 0; g < _options.Length && order == 0; g++)
        {
            order = a[g].CompareTo(b[g]);
        }

        return order;
    }

    private int CompareEquallyHeavy(int a, int b)
    {
        Span<int> choiceA = stackalloc int[_options.Length];
        Span<int> choiceB = stackalloc int[_options.Length];
        Decode(a, choiceA);
        Decode(b, choiceB);
        return CompareTies(choiceA, choiceB);
    }
}

/// <summary>One candidate of a group, with what the search asks of it.</summary>
/// <param name="Candidate">The candidate.</param>
/// <param name="Profile">Its stiffness in the group's material.</param>
/// <param name="MassPerLength">kg/mm.</param>
/// <param name="MassKg">Of all the group's tubes on their axis lengths.</param>
/// <param name="HalfWidth">Half the larger outer size, mm.</param>
/// <param name="NameRank">Position of its name among the group's options.</param>
internal sealed record Option(
    Candidate Candidate, BeamProfile Profile, double MassPerLength, double MassKg, double HalfWidth, int NameRank)
{
    public Section Section => Candidate.Section;

    /// <summary>What it adds to the objective.</summary>
    public long Units { get; init; }

    /// <summary>Its mass in units.</summary>
    public long MassUnits { get; init; }
}
