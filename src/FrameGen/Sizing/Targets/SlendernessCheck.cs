using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing.Analysis;

namespace FrameGen.Sizing.Targets;

/// <summary>
/// Length between neighbouring nodes over the radius of gyration, tube by tube; with the wall's limit, class 3 of <see cref="WallSlenderness"/>, the
/// worse of the two is reported. Settled group by group, before any frame is analysed.
/// </summary>
internal sealed class SlendernessCheck : TargetCheck
{
    private readonly SlendernessTarget _target;
    private readonly Span[] _longest;

    public SlendernessCheck(FrameModel model, SlendernessTarget target)
        : base(model, target)
    {
        _target = target;
        _longest = [.. Enumerable.Range(0, model.Groups.Count).Select(g => LongestOf(model, g))];
    }

    /// <inheritdoc/>
    public override string Kind => "slenderness";

    /// <inheritdoc/>
    public override int Cost => 0;

    /// <inheritdoc/>
    public override bool NeedsFrame => false;

    /// <inheritdoc/>
    public override bool Allows(int group, Section section) => Ratio(group, section) <= 1;

    /// <inheritdoc/>
    public override double Ratio(DesignAnalysis analysis)
    {
        int worst = WorstGroup(analysis.Sections);
        return Ratio(worst, analysis.Sections[worst]);
    }

    /// <inheritdoc/>
    public override TargetResult Result(DesignAnalysis analysis)
    {
        int worst = WorstGroup(analysis.Sections);
        Section section = analysis.Sections[worst];
        Span span = _longest[worst];
        double length = span.Length / Radius(section);
        (double wall, double wallLimit) = Wall(worst, section);
        const string Label = "all tubes";
        return wall / wallLimit > length / _target.Max
            ? new TargetResult(
                _target.Index, Kind, Label, wall, wallLimit, "", wall / wallLimit, $"wall of group {Model.Groups[worst].Name}: {Measured(section)} over thickness of {section.Name}")
            : new TargetResult(
                _target.Index, Kind, Label, length, _target.Max, "", length / _target.Max,
                $"{Model.Tubes[span.Tube].Name} between {Model.Nodes[span.From].Name} and {Model.Nodes[span.To].Name}, {Wording.Number(span.Length)} mm");
    }

    /// <inheritdoc/>
    public override double? RatioOf(DesignAnalysis analysis, int tube)
    {
        int group = Model.Tubes[tube].Group;
        return Ratio(group, analysis.Sections[group], LongestOfTube(Model, tube).Length);
    }

    private static double Radius(Section section) => Math.Min(section.RadiusOfGyrationY, section.RadiusOfGyrationZ);

    private static Span LongestOf(FrameModel model, int group)
    {
        var longest = new Span(-1, 0, -1, -1);
        for (int t = 0; t < model.Tubes.Count; t++)
        {
            if (model.Tubes[t].Group == group && LongestOfTube(model, t) is var span && span.Length > longest.Length)
            {
                longest = span;
            }
        }

        return longest;
    }

    private static Span LongestOfTube(FrameModel model, int index)
    {
        Tube tube = model.Tubes[index];
        var longest = new Span(-1, 0, -1, -1);
        (double at, int from) = (0, tube.From.Node);
        foreach (int node in tube.NodesOn.OrderBy(n => model.Nodes[n].ThroughDistance))
        {
            Offer(model.Nodes[node].ThroughDistance, node);
        }

        Offer(tube.Length, tube.To.Node);
        return longest;

        void Offer(double next, int node)
        {
            if (next - at > longest.Length)
            {
                longest = new Span(index, next - at, from, node);
            }

            (at, from) = (next, node);
        }
    }

    private double Ratio(int group, Section section) => Ratio(group, section, _longest[group].Length);

    private double Ratio(int group, Section section, double length)
    {
        (double wall, double limit) = Wall(group, section);
        return Math.Max(length / Radius(section) / _target.Max, wall / limit);
    }

    // Diameter or flat over thickness and its limit; 0 where the wall isn't looked at, or there is none.
    private (double Value, double Limit) Wall(int group, Section section)
    {
        Material material = Model.Groups[group].Material;
        if (!_target.Wall || section is Rod || _longest[group].Tube < 0)
        {
            return (0, 1);
        }

        WallSlenderness wall = WallSlenderness.Of(section, material)
            ?? throw new InvalidOperationException($"{material.Name} has no yield, and a wall's limit needs it.");
        return (wall.Value, wall.Class3);
    }

    private static string Measured(Section section) => section switch
    {
        FlatSidedTube => "flat of the longer side",
        RoundTube => "diameter",
        _ => "equivalent diameter",
    };

    private int WorstGroup(Section[] sections)
    {
        int worst = 0;
        for (int g = 1; g < sections.Length; g++)
        {
            worst = Ratio(g, sections[g]) > Ratio(worst, sections[worst]) ? g : worst;
        }

        return worst;
    }

    /// <summary>The longest stretch between nodes of a group's tubes; no tube for a group without any.</summary>
    private readonly record struct Span(int Tube, double Length, int From, int To);
}
