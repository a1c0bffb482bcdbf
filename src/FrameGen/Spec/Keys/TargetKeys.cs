using FrameGen.Spec.Forms;
using FrameGen.Spec.Quantities;
using static FrameGen.Spec.Keys.CommonForms;

namespace FrameGen.Spec.Keys;

/// <summary>Targets: each entry of the list is a map of one key, the kind.</summary>
internal static class TargetKeys
{
    private static readonly Key<Placed<string>> Case = new("case", CaseName, "the load case", "standing") { IsRequired = true };

    private static readonly Key<Placed<string>> Node = new("node", NodeName, "the node", "rear-l");

    private static readonly Key<Placed<string>> From = new("from", NodeName, "node it is measured from", "rear-l");

    private static readonly Key<Placed<string>> To = new("to", NodeName, "node it is measured to", "rear-r");

    private static readonly Key<Direction> AlongOrAny = new("along", DirectionOrAny, "the component looked at", "z") { IsRequired = true };

    private static readonly Key<Direction> AboutOrAny = new("about", DirectionOrAny, "the axis looked at", "z") { IsRequired = true };

    private static readonly Key<SpecQuantity> MaxDisplacement =
        new("max", Positive(QuantityKind.Length), "largest allowed", "3 mm") { IsRequired = true };

    private static readonly Key<SpecQuantity> MaxRotation =
        new("max", Positive(QuantityKind.Angle), "largest allowed", "0.5 deg") { IsRequired = true };

    private static readonly MapForm<TargetSpec> Displacement = new(
        "a displacement target",
        [Case, Node, From, To, AlongOrAny, MaxDisplacement],
        map => new DisplacementTargetSpec(
            map.Get(Case), map.Find(Node), map.Find(From), map.Find(To), map.Get(AlongOrAny).Vector, map.Get(MaxDisplacement), map.At),
        CheckNodes);

    private static readonly MapForm<TargetSpec> Rotation = new(
        "a rotation target",
        [Case, Node, From, To, AboutOrAny, MaxRotation],
        map => new RotationTargetSpec(
            map.Get(Case), map.Find(Node), map.Find(From), map.Find(To), map.Get(AboutOrAny).Vector, map.Get(MaxRotation), map.At),
        CheckNodes);

    private static readonly Key<Direction> Along = new("along", AxisDirection, "direction of the push", "z");

    private static readonly Key<Direction> About = new("about", AxisDirection, "axis of the couple", "x");

    private static readonly Key<SpecQuantity> MinStiffness = new(
        "min",
        new QuantityForm(ValueRange.Positive, QuantityKind.Stiffness, QuantityKind.TurningStiffness),
        "smallest allowed: a stiffness with 'along', a turning stiffness with 'about'",
        "60 N/mm")
    {
        IsRequired = true,
    };

    private static readonly Key<IReadOnlyList<Placed<string>>> Supports =
        new("supports", NodeNames, "nodes whose supports act; without it all do", "[axle-l, axle-r]");

    private static readonly MapForm<TargetSpec> Stiffness = new(
        "a stiffness target", [Node, From, To, Along, About, MinStiffness, Supports], StiffnessTarget, CheckStiffness);

    private static readonly Key<CaseChoice> AllOrSomeCases = new("cases", Cases, "load cases looked at; without it all", "[standing, bump]");

    private static readonly Key<SpecQuantity> SafetyFactor =
        new("safety_factor", Positive(QuantityKind.Number), "yield over stress, at least", "2.0") { IsRequired = true };

    private static readonly Key<IReadOnlyList<Placed<string>>> Groups =
        new("groups", GroupNames, "groups looked at; without it all", "[rails]");

    private static readonly MapForm<TargetSpec> Strength = new(
        "a strength target",
        [AllOrSomeCases, SafetyFactor, Groups],
        map => new StrengthTargetSpec(map.Find(AllOrSomeCases)?.Names, map.Get(SafetyFactor), map.Find(Groups), map.At));

    private static readonly Key<SpecQuantity> MinFactor =
        new("min_factor", Positive(QuantityKind.Number), "the case times this does not buckle the frame", "3") { IsRequired = true };

    private static readonly MapForm<TargetSpec> Buckling = new(
        "a buckling target",
        [AllOrSomeCases, MinFactor],
        map => new BucklingTargetSpec(map.Find(AllOrSomeCases)?.Names, map.Get(MinFactor), map.At));

    private static readonly Key<SpecQuantity> MaxSlenderness =
        new("max", Positive(QuantityKind.Number), "member length over radius of gyration, at most", "150") { IsRequired = true };

    private static readonly Key<bool> WallLimit = new("wall", Flag, "true: the wall's own limit too", "true");

    private static readonly MapForm<TargetSpec> Slenderness = new(
        "a slenderness target",
        [MaxSlenderness, WallLimit],
        map => new SlendernessTargetSpec(map.Get(MaxSlenderness), map.FindValue(WallLimit) ?? false, map.At));

    private static readonly Key<SpecQuantity> MinFrequency =
        new("min", Positive(QuantityKind.Frequency), "lowest natural frequency, at least", "12 Hz") { IsRequired = true };

    private static readonly MapForm<TargetSpec> Frequency = new(
        "a frequency target", [MinFrequency], map => new FrequencyTargetSpec(map.Get(MinFrequency), map.At));

    private static readonly Key<Placed<string>> Tube = new("tube", TubeName, "the tube", "bow");

    private static readonly Key<Placed<string>> Group = new("group", GroupName, "each tube of this group", "beams");

    private static readonly Key<SpanKind> As = new(
        "as",
        new WordForm<SpanKind>(
            [("cantilever", SpanKind.Cantilever), ("simply-supported", SpanKind.SimplySupported), ("fixed-fixed", SpanKind.FixedFixed)]),
        "how it is thought to be held",
        "cantilever");

    private static readonly Key<SpecQuantity> Load =
        new("load", Positive(QuantityKind.Force), "force at a cantilever's end, in the middle of the others", "400 N");

    private static readonly Key<SpecQuantity> MaxDeflection = new("max_deflection", Positive(QuantityKind.Length), "largest allowed", "2 mm");

    private static readonly Key<SpecQuantity> MinBendingStiffness =
        new("min_bending_stiffness", Positive(QuantityKind.BendingStiffness), "EI, at least", "900 N.m2");

    private static readonly Key<SpecQuantity> MinTorsionalStiffness =
        new("min_torsional_stiffness", Positive(QuantityKind.BendingStiffness), "GJ, at least", "600 N.m2");

    private static readonly Key<BendingDirection> BendingAlong = new(
        "along",
        new WordForm<BendingDirection>([("top", BendingDirection.Top), ("side", BendingDirection.Side)]),
        "deflection towards the top line, or across; without it the weaker of the two",
        "top");

    private static readonly MapForm<TargetSpec> Member = new(
        "a member target",
        [Tube, Group, As, Load, MaxDeflection, MinBendingStiffness, MinTorsionalStiffness, BendingAlong],
        map => new MemberTargetSpec(
            map.Find(Tube),
            map.Find(Group),
            map.FindValue(As),
            map.Find(Load),
            map.Find(MaxDeflection),
            map.Find(MinBendingStiffness),
            map.Find(MinTorsionalStiffness),
            map.FindValue(BendingAlong) ?? BendingDirection.Weaker,
            map.At),
        CheckMember);

    private static readonly Key<TargetSpec>[] Kinds =
    [
        new("displacement", Displacement, "a node moves no further", "{case: standing, node: rear-l, along: z, max: 3 mm}"),
        new("rotation", Rotation, "a node turns no further", "{case: kerb, node: rear-l, about: z, max: 0.5 deg}"),
        new("stiffness", Stiffness, "a push or couple, alone, over the movement it causes", "{node: rear-l, along: z, min: 60 N/mm}"),
        new("strength", Strength, "stress times the factor stays below yield", "{safety_factor: 2.0}"),
        new("buckling", Buckling, "the frame does not buckle", "{min_factor: 3}"),
        new("slenderness", Slenderness, "no member is too slender", "{max: 150}"),
        new("frequency", Frequency, "the frame does not shake slower", "{min: 12 Hz}"),
        new("member", Member, "a tube, thought of alone, is stiff enough", "{tube: bow, as: cantilever, load: 400 N, max_deflection: 2 mm}"),
    ];

    /// <summary>All targets.</summary>
    public static readonly ListForm<TargetSpec> Targets = new(
        "targets",
        new MapForm<TargetSpec>(
            "a target",
            Kinds,
            map => Kinds.Select(map.Find).First(target => target is not null)!,
            map => map.ExactlyOne(Kinds)));

    private static StiffnessTargetSpec StiffnessTarget(MapReading map)
    {
        SpecQuantity min = map.Get(MinStiffness);
        QuantityKind kind = map.Has(About) ? QuantityKind.TurningStiffness : QuantityKind.Stiffness;
        return new StiffnessTargetSpec(
            map.Find(Node),
            map.Find(From),
            map.Find(To),
            map.Find(Along)?.Vector,
            map.Find(About)?.Vector,
            min with { Kind = kind },
            map.Find(Supports),
            map.At);
    }

    private static void CheckStiffness(MapReading map)
    {
        CheckNodes(map);
        map.ExactlyOne(Along, About);
        if (map.Has(Along) == map.Has(About) || map.Find(MinStiffness) is not { Value: LiteralExpression literal } min || Values.IsExpression(literal))
        {
            return;
        }

        QuantityKind wanted = map.Has(About) ? QuantityKind.TurningStiffness : QuantityKind.Stiffness;
        if (min.Kind != wanted)
        {
            Key direction = map.Has(About) ? About : Along;
            map.Error(min.At, $"with '{direction.Name}' {QuantityCheck.WrongKind(literal, [wanted])}");
        }
    }

    private static void CheckMember(MapReading map)
    {
        map.ExactlyOne(Tube, Group);
        Key[] span = [As, Load, MaxDeflection];
        Key[] floors = [MinBendingStiffness, MinTorsionalStiffness];
        Key[] spanWritten = [.. span.Where(map.Has)];
        Key[] floorsWritten = [.. floors.Where(map.Has)];
        if (spanWritten.Length > 0 && floorsWritten.Length > 0)
        {
            map.Error(
                map.PlaceOf(floorsWritten[0]), $"'{floorsWritten[0].Name}' does not go with '{spanWritten[0].Name}'; write two targets");
        }
        else if (spanWritten.Length > 0)
        {
            foreach (Key missing in span.Where(key => !map.Has(key)))
            {
                map.Error(map.At, $"a member target with '{spanWritten[0].Name}' needs '{missing.Name}' too: {missing.Description}");
            }
        }
        else if (floorsWritten.Length == 0)
        {
            map.Error(map.At, "a member target needs 'as', 'load' and 'max_deflection', or 'min_bending_stiffness' or 'min_torsional_stiffness'");
        }
    }

    private static void CheckNodes(MapReading map)
    {
        map.OneOrPair(Node, From, To);
        if (map.Find(From) is { } from && map.Find(To) is { } to && string.Equals(from.Value, to.Value, StringComparison.OrdinalIgnoreCase))
        {
            map.Error(to.At, $"'from' and 'to' are both '{to.Value}'; name two nodes, or one with 'node'");
        }
    }
}
