using FrameGen.Spec.Forms;
using static FrameGen.Spec.Keys.CommonForms;

namespace FrameGen.Spec.Keys;

/// <summary>Supports, masses, load cases and loads.</summary>
internal static class LoadKeys
{
    private static readonly string[] Freedoms = ["x", "y", "z", "rx", "ry", "rz"];

    private static readonly Key<IReadOnlyList<int>> Hold = new(
        "hold",
        new ListForm<int>(
            "directions (x, y, z, rx, ry, rz)",
            new WordForm<int>([.. Freedoms.Select((word, index) => (word, index))]),
            1,
            6,
            index => Freedoms[index]),
        "what can't move or turn",
        "[x, y, z]");

    private static readonly Key<SpecQuantity>[] SpringRates =
    [
        .. Freedoms.Select(word => new Key<SpecQuantity>(
            word,
            Positive(word.StartsWith('r') ? QuantityKind.TurningStiffness : QuantityKind.Stiffness),
            $"its rate {(word.StartsWith('r') ? "about" : "along")} {word[^1]}",
            word.StartsWith('r') ? "12 N.m/deg" : "40 N/mm")),
    ];

    private static readonly Key<IReadOnlyList<SpecQuantity?>> Spring = new(
        "spring",
        new MapForm<IReadOnlyList<SpecQuantity?>>(
            "a spring", SpringRates, map => [.. SpringRates.Select(map.Find)], map => map.AtLeastOne(SpringRates)),
        "springs it stands on, in directions that `hold` leaves free",
        "{z: 40 N/mm}");

    private static readonly Key<bool> SupportMirror = MirrorKey();

    /// <summary>All supports.</summary>
    public static readonly NamedForm<SupportSpec> Supports = new(
        "support",
        NodeName,
        new MapForm<SupportSpec>(
            "a support",
            [Hold, Spring, SupportMirror],
            map => new SupportSpec(
                map.Owner,
                [.. Enumerable.Range(0, Freedoms.Length).Select(map.Items(Hold).Contains)],
                map.FindValue(SupportMirror) ?? true)
            {
                Springs = map.Find(Spring) ?? new SpecQuantity?[Freedoms.Length],
            },
            CheckSupport));

    private static void CheckSupport(MapReading map)
    {
        map.AtLeastOne(Hold, Spring);
        IReadOnlyList<SpecQuantity?> springs = map.Find(Spring) ?? [];
        foreach (int both in map.Items(Hold).Where(f => f < springs.Count && springs[f] is not null))
        {
            map.Error(
                springs[both]!.At, $"'{Freedoms[both]}' is held, and a spring there does nothing; remove it from 'hold' or from 'spring'");
        }
    }

    private static readonly Key<Placed<string>> MassNode = new("node", NodeName, "the node it sits on", "coupling");

    private static readonly Key<Placed<string>> MassTube = new("tube", TubeName, "the tube it is spread along", "rail-l");

    private static readonly Key<SpecQuantity> Mass = new("mass", Positive(QuantityKind.Mass), "how heavy", "2.5 kg") { IsRequired = true };

    private static readonly Key<bool> MassMirror = MirrorKey();

    /// <summary>Masses carried.</summary>
    public static readonly ListForm<MassSpec> Masses = new(
        "masses",
        new MapForm<MassSpec>(
            "a mass",
            [MassNode, MassTube, Mass, MassMirror],
            map => new MassSpec(map.Find(MassNode), map.Find(MassTube), map.Get(Mass), map.FindValue(MassMirror) ?? true, map.At),
            map => map.ExactlyOne(MassNode, MassTube)));

    private static readonly Key<Placed<string>> LoadNode = new("node", NodeName, "the node it acts on", "axle-l") { IsRequired = true };

    private static readonly Key<Placed<string>> LoadTube = new("tube", TubeName, "the tube it acts on", "rail-l") { IsRequired = true };

    private static readonly Key<SpecVector> LoadForce = new("force", ForceVector, "force, global axes", "[-900 N, 0 N, 0 N]");

    private static readonly Key<SpecVector> LoadMoment = new("moment", MomentVector, "moment, global axes", "[0 N.m, 40 N.m, 0 N.m]");

    private static readonly Key<SpecVector> Line =
        new("line", new VectorForm(QuantityKind.LineLoad), "force per length along its whole axis, global axes", "[0 N/m, 0 N/m, -500 N/m]");

    private static readonly Key<SpecQuantity> LoadShare = new("at", WholeShare, "share of the axis from its `from` end", "40 %");

    private static readonly Key<SpecQuantity> LoadDistance =
        new("distance", NotNegative(QuantityKind.Length), "distance along the axis from its `from` end", "300 mm");

    private static readonly Key<bool> LoadMirror = MirrorKey();

    private static readonly Key<IReadOnlyList<LoadSpec>> Loads = new(
        "loads",
        new ListForm<LoadSpec>(
            "loads",
            new ChoiceForm<LoadSpec>(
                "a load",
                [
                    ("node", new(
                        "a load on a node",
                        [LoadNode, LoadForce, LoadMoment, LoadMirror],
                        map => new NodeLoadSpec(
                            map.Get(LoadNode), map.Find(LoadForce), map.Find(LoadMoment), map.FindValue(LoadMirror) ?? true, map.At),
                        map => map.AtLeastOne(LoadForce, LoadMoment))),
                    ("line", new(
                        "a load along a tube",
                        [LoadTube, Line, LoadMirror],
                        map => new LineLoadSpec(map.Get(LoadTube), map.Get(Line), map.FindValue(LoadMirror) ?? true, map.At))),
                    ("tube", new(
                        "a load at a place on a tube",
                        [LoadTube, LoadShare, LoadDistance, LoadForce, LoadMoment, LoadMirror],
                        map => new PointLoadSpec(
                            map.Get(LoadTube),
                            map.Find(LoadShare),
                            map.Find(LoadDistance),
                            map.Find(LoadForce),
                            map.Find(LoadMoment),
                            map.FindValue(LoadMirror) ?? true,
                            map.At),
                        CheckPointLoad)),
                ])),
        "forces and moments",
        "[{node: axle-l, force: [0 N, 0 N, -900 N]}]");

    private static readonly Key<SpecVector> SelfWeight =
        new("self_weight", new VectorForm(QuantityKind.Number), "acceleration of all masses, in multiples of g", "[0, 0, -1]");

    private static readonly Key<IReadOnlyList<(Placed<string> Case, SpecQuantity Factor)>> Add = new(
        "add",
        new NamedForm<(Placed<string> Case, SpecQuantity Factor)>(
            "case",
            CaseName,
            new OwnedForm<SpecQuantity, (Placed<string> Case, SpecQuantity Factor)>(
                AnyValue(QuantityKind.Number), (name, factor) => (name, factor))),
        "loads and self weight of other cases, each times a factor",
        "{standing: 1}");

    private static readonly Key<IReadOnlyList<Placed<string>>> CaseSupports =
        new("supports", NodeNames, "nodes whose supports act; without it all do", "[axle-l, coupling]");

    private static readonly Key<bool> CaseMirror = MirrorKey();

    /// <summary>All load cases.</summary>
    public static readonly NamedForm<CaseSpec> Cases = new(
        "case",
        CaseName,
        new MapForm<CaseSpec>(
            "a load case",
            [SelfWeight, Loads, Add, CaseSupports, CaseMirror],
            map => new CaseSpec(
                map.Owner,
                map.Find(SelfWeight),
                map.Items(Loads),
                map.Items(Add),
                map.Find(CaseSupports),
                map.FindValue(CaseMirror) ?? true),
            map => map.AtLeastOne(SelfWeight, Loads, Add)));

    private static void CheckPointLoad(MapReading map)
    {
        if (!map.Has(LoadShare) && !map.Has(LoadDistance))
        {
            map.Error(map.At, "where on the tube is missing: 'at' or 'distance' for one place, or 'line' for a load along the whole tube");
        }
        else
        {
            map.ExactlyOne(LoadShare, LoadDistance);
        }

        map.AtLeastOne(LoadForce, LoadMoment);
    }
}
