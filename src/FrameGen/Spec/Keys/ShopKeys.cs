using FrameGen.Spec.Forms;
using FrameGen.Spec.Quantities;
using static FrameGen.Spec.Keys.CommonForms;

namespace FrameGen.Spec.Keys;

/// <summary>How papers print, the mirror, joints and the shop's preferences.</summary>
internal static class ShopKeys
{
    private static readonly Key<LengthUnit> Length = new(
        "length",
        new WordForm<LengthUnit>([("mm", LengthUnit.Millimetre), ("cm", LengthUnit.Centimetre), ("in", LengthUnit.Inch)]),
        "unit of lengths",
        "mm");

    private static readonly Key<int> Fraction = new(
        "fraction",
        new WordForm<int>([("1/8", 8), ("1/16", 16), ("1/32", 32), ("1/64", 64)]),
        "what inches are rounded to",
        "1/16");

    private static readonly Key<MassUnit> Mass = new(
        "mass", new WordForm<MassUnit>([("kg", MassUnit.Kilogram), ("lb", MassUnit.Pound)]), "unit of masses", "kg");

    private static readonly Key<ForceUnit> Force = new(
        "force",
        new WordForm<ForceUnit>([("N", ForceUnit.Newton), ("kN", ForceUnit.Kilonewton), ("lbf", ForceUnit.PoundForce)]),
        "unit of forces",
        "N");

    /// <summary>How papers print.</summary>
    public static readonly MapForm<DisplaySpec> Display = new(
        "display",
        [Length, Fraction, Mass, Force],
        map => new DisplaySpec(
            map.FindValue(Length) ?? DisplaySpec.Metric.Length,
            map.FindValue(Fraction),
            map.FindValue(Mass) ?? DisplaySpec.Metric.Mass,
            map.FindValue(Force) ?? DisplaySpec.Metric.Force),
        CheckDisplay);

    private static readonly Key<int> Across = new(
        "across",
        new WordForm<int>([("x", 0), ("y", 1), ("z", 2)]),
        "normal of the mirror plane, which goes through the origin",
        "y")
    {
        IsRequired = true,
    };

    private static readonly Key<IReadOnlyList<Placed<string>>> Suffix = new(
        "suffix",
        new ListForm<Placed<string>>("name endings", new SuffixForm(), 2, 2, ending => ending.Value),
        "ending of the names that get a twin, and of the twins' names",
        "[-l, -r]")
    {
        IsRequired = true,
    };

    /// <summary>The mirror.</summary>
    public static readonly MapForm<MirrorSpec> Mirror = new(
        "a mirror",
        [Across, Suffix],
        map => new MirrorSpec(map.Get(Across), map.Get(Suffix)[0].Value, map.Get(Suffix)[1].Value, map.At),
        CheckMirror);

    private static readonly Key<IReadOnlyList<Placed<string>>> Order =
        new("order", TubeNames, "tubes in the order of fitting: each is cut to fit those before it", "[bow, rail-l, shaft-l]");

    private static readonly Key<IReadOnlyList<Placed<string>>> Miter =
        new("miter", Names("tubes", TubeName, 2, 2), "two tubes, both cut on the plane that halves their angle", "[shaft-l, shaft-r]");

    private static readonly Key<bool> JointMirror = MirrorKey();

    /// <summary>Joints.</summary>
    public static readonly NamedForm<JointSpec> Joints = new(
        "joint",
        NodeName,
        new MapForm<JointSpec>(
            "a joint",
            [Order, Miter, JointMirror],
            map => new JointSpec(map.Owner, map.Find(Miter), map.Find(Order), map.FindValue(JointMirror) ?? true, map.Owner.At),
            CheckJoint));

    private static readonly Key<CutMode> Cut = new(
        "cut",
        new WordForm<CutMode>([("radial", CutMode.Radial), ("contour", CutMode.Contour)]),
        "radial for a template and a hand-held saw, torch or grinder; contour for a hole saw, mill or tilting laser",
        "radial");

    private static readonly Key<SpecQuantity> Gap =
        new("gap", NotNegative(QuantityKind.Length), "left between a cut end and its mate", "0 mm");

    private static readonly Key<SpecQuantity> Paper =
        new("paper", NotNegative(QuantityKind.Length), "thickness of a wrapped template", "0.1 mm");

    private static readonly Key<SpecQuantity> Tolerance = new(
        "tolerance",
        new QuantityForm(new ValueRange(0.0001, 1, false, "from 0.0001 mm to 1 mm"), QuantityKind.Length),
        "how far a drawn curve may lie from the exact one",
        "0.02 mm");

    private static readonly Key<SpecQuantity> Kerf = new("kerf", NotNegative(QuantityKind.Length), "width of the saw's cut", "2 mm");

    private static readonly Key<SpecQuantity> BarTrim =
        new("bar_trim", NotNegative(QuantityKind.Length), "cut off both ends of a bar", "10 mm");

    private static readonly Key<PageSize> Page = new(
        "page",
        new WordForm<PageSize>([("A4", PageSize.A4), ("A3", PageSize.A3), ("letter", PageSize.Letter), ("tabloid", PageSize.Tabloid)]),
        "paper size of templates",
        "A4");

    private static readonly Key<SpecQuantity> Grip =
        new("grip", NotNegative(QuantityKind.Length), "shortest straight that the bender needs", "60 mm");

    private static readonly Key<SpecQuantity> Springback = new(
        "springback",
        new QuantityForm(ValueRange.NotNegative, QuantityKind.Angle, QuantityKind.Share),
        "what a bend opens after bending: degrees, or a share of its angle; the machine is set to so much more",
        "2 deg");

    /// <summary>The shop's preferences.</summary>
    public static readonly MapForm<FabricationSpec> Fabrication = new(
        "fabrication",
        [Cut, Gap, Paper, Tolerance, Kerf, BarTrim, Page, Grip, Springback],
        map => new FabricationSpec(
            map.FindValue(Cut),
            map.Find(Gap),
            map.Find(Paper),
            map.Find(Tolerance),
            map.Find(Kerf),
            map.Find(BarTrim),
            map.FindValue(Page),
            map.Find(Grip),
            map.Find(Springback),
            map.At));

    private static void CheckDisplay(MapReading map)
    {
        if (map.Has(Fraction) && map.FindValue(Length) is not LengthUnit.Inch && !(map.Has(Length) && map.FindValue(Length) is null))
        {
            map.Error(map.PlaceOf(Fraction), "'fraction' rounds inches; write `length: in` beside it, or remove it");
        }
    }

    private static void CheckMirror(MapReading map)
    {
        if (map.Find(Suffix) is [{ } first, { } second]
            && (first.Value.EndsWith(second.Value, StringComparison.OrdinalIgnoreCase)
                || second.Value.EndsWith(first.Value, StringComparison.OrdinalIgnoreCase)))
        {
            map.Error(second.At, $"a name can't tell '{first.Value}' from '{second.Value}': one is the ending of the other; choose others");
        }
    }

    private static void CheckJoint(MapReading map)
    {
        map.AtLeastOne(Order, Miter);
        IReadOnlyList<Placed<string>> mitred = map.Items(Miter);
        foreach (Placed<string> tube in map.Items(Order))
        {
            if (mitred.Any(other => string.Equals(other.Value, tube.Value, StringComparison.OrdinalIgnoreCase)))
            {
                map.Error(tube.At, $"tube '{tube.Value}' stands in 'miter' already, before all of 'order'; name it once");
            }
        }
    }
}
