using FrameGen.Spec.Forms;
using static FrameGen.Spec.Keys.CommonForms;

namespace FrameGen.Spec.Keys;

/// <summary>The keys at the root of a spec, and of a file that a spec includes.</summary>
internal static class FileKeys
{
    /// <summary>The format's version that this program reads.</summary>
    public const string Version = "1";

    public static readonly Key<bool> FrameGen =
        new("framegen", new WordForm<bool>([(Version, true)]), "the format's version, first in the file", Version) { IsRequired = true };

    public static readonly Key<string> Title = new("title", Text, "printed on every paper", "Quayside cargo trailer");

    public static readonly Key<string> Revision = new("revision", Text, "printed on every paper", "C");

    public static readonly Key<string> Notes = new("notes", Text, "printed on the report", "Two-wheel trailer for crates.");

    public static readonly Key<DisplaySpec> Display = new("display", ShopKeys.Display, "how papers print quantities", "{length: mm, mass: kg}");

    public static readonly Key<IReadOnlyList<Placed<string>>> Include = new(
        "include",
        new ListForm<Placed<string>>("paths", new PathForm()),
        "other spec files whose materials, stock and parameters are taken in",
        "[../lists/tube-rack.yaml]");

    public static readonly Key<IReadOnlyList<ParameterSpec>> Parameters = new(
        "parameters", new NamedForm<ParameterSpec>("parameter", ParameterName, new ParameterForm()), "named values for expressions", "{deck: 1200 mm}");

    public static readonly Key<MirrorSpec> Mirror =
        new("mirror", ShopKeys.Mirror, "gives what has one name ending a reflected twin", "{across: y, suffix: [-l, -r]}");

    public static readonly Key<IReadOnlyList<NodeSpec>> Nodes =
        new("nodes", FrameKeys.Nodes, "where tubes meet", "{front-l: [0 mm, 320 mm, 0 mm]}") { IsRequired = true };

    public static readonly Key<IReadOnlyList<TubeSpec>> Tubes =
        new("tubes", FrameKeys.Tubes, "from node to node", "{rail-l: {from: front-l, to: rear-l, group: rails}}") { IsRequired = true };

    public static readonly Key<IReadOnlyList<GroupSpec>> Groups = new(
        "groups", StockKeys.Groups, "tubes of one section and material", "{rails: {material: S235, section: round 30 x 2 mm}}")
    {
        IsRequired = true,
    };

    public static readonly Key<IReadOnlyList<MaterialSpec>> Materials = new(
        "materials", StockKeys.Materials, "materials beside the built-in ones", "{bamboo-steel: {E: 210 GPa, poisson: 0.3, density: 7.85 g/cm3}}");

    public static readonly Key<IReadOnlyList<StockListSpec>> Stock =
        new("stock", StockKeys.Stock, "stock lists beside the built-in ones", "{rack: {material: [S235], sizes: [round 25 x 1.5 mm]}}");

    public static readonly Key<IReadOnlyList<RackSpec>> Have = new(
        "have", StockKeys.Have, "tubes on the rack, used first", "[{section: round 28 x 2 mm, material: E235+N, lengths: [1850 mm]}]");

    public static readonly Key<IReadOnlyList<MeasuredSpec>> Measured =
        new("measured", StockKeys.Measured, "sizes of the tubes in hand", "{rails: {od: 38.06 mm, wall: 1.47 mm}}");

    public static readonly Key<IReadOnlyList<SupportSpec>> Supports =
        new("supports", LoadKeys.Supports, "held nodes", "{axle-l: {hold: [y, z]}}");

    public static readonly Key<IReadOnlyList<MassSpec>> Masses =
        new("masses", LoadKeys.Masses, "what the frame carries", "[{node: coupling, mass: 2.5 kg}]");

    public static readonly Key<IReadOnlyList<CaseSpec>> Cases =
        new("cases", LoadKeys.Cases, "load cases", "{standing: {self_weight: [0, 0, -1]}}");

    public static readonly Key<IReadOnlyList<TargetSpec>> Targets =
        new("targets", TargetKeys.Targets, "what the frame must meet", "[{strength: {safety_factor: 2.0}}]");

    public static readonly Key<IReadOnlyList<JointSpec>> Joints =
        new("joints", ShopKeys.Joints, "the order of fitting at nodes", "{front-l: {order: [bow, rail-l]}}");

    public static readonly Key<FabricationSpec> Fabrication =
        new("fabrication", ShopKeys.Fabrication, "how ends are cut and papers drawn", "{cut: radial, kerf: 2 mm}");

    public static readonly Key<SizingSpec> Sizing = new("sizing", StockKeys.Sizing, "how sizes are chosen", "{objective: mass}");

    /// <summary>A spec.</summary>
    public static readonly MapForm<MapReading> Spec = new(
        "a spec",
        [
            FrameGen, Title, Revision, Notes, Display, Include, Parameters, Mirror, Nodes, Tubes, Groups, Materials, Stock, Have, Measured,
            Sizing, Supports, Masses, Cases, Targets, Joints, Fabrication,
        ],
        map => map);

    /// <summary>A file that a spec includes.</summary>
    public static readonly MapForm<MapReading> Included =
        new("an included file", [FrameGen, Include, Parameters, Materials, Stock], map => map);
}
