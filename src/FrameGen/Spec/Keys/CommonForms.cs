using FrameGen.Spec.Forms;
using FrameGen.Spec.Quantities;

namespace FrameGen.Spec.Keys;

/// <summary>Forms that many keys share.</summary>
internal static class CommonForms
{
    public static readonly TextForm Text = new();

    public static readonly FlagForm Flag = new();

    public static readonly NameForm NodeName = new("a node's name");

    public static readonly NameForm TubeName = new("a tube's name", NameRule.File);

    public static readonly NameForm GroupName = new("a group's name", NameRule.File);

    public static readonly NameForm MaterialName = new("a material's name such as S235 or 4130-N", NameRule.Material);

    public static readonly NameForm StockName = new("a stock list's name such as en10305");

    public static readonly NameForm CaseName = new("a load case's name", NameRule.Any, "all");

    public static readonly NameForm ParameterName = new("a parameter's name");

    public static readonly ListForm<Placed<string>> NodeNames = Names("nodes", NodeName);

    public static readonly ListForm<Placed<string>> TubeNames = Names("tubes", TubeName);

    public static readonly ListForm<Placed<string>> GroupNames = Names("groups", GroupName);

    public static readonly SectionForm SectionSize = new();

    public static readonly RangeForm LengthRange = new();

    public static readonly DirectionForm AxisDirection = new(allowsAny: false);

    public static readonly DirectionForm DirectionOrAny = new(allowsAny: true);

    public static readonly VectorForm Point = new(QuantityKind.Length);

    public static readonly VectorForm ForceVector = new(QuantityKind.Force);

    public static readonly VectorForm MomentVector = new(QuantityKind.Moment);

    public static readonly QuantityForm WholeShare = new(ValueRange.WholeShare, QuantityKind.Share);

    /// <summary>All cases, or a list of them; null for all.</summary>
    public static readonly ByShapeForm<CaseChoice> Cases = new(
        "`all` or a list of load cases",
        scalar: new WordForm<CaseChoice>([("all", new CaseChoice(null))]),
        sequence: Names("load cases", CaseName).As(names => new CaseChoice(names)));

    public static QuantityForm Positive(QuantityKind kind) => new(ValueRange.Positive, kind);

    public static QuantityForm NotNegative(QuantityKind kind) => new(ValueRange.NotNegative, kind);

    public static QuantityForm AnyValue(QuantityKind kind) => new(ValueRange.Any, kind);

    public static ListForm<Placed<string>> Names(string words, NameForm name, int least = 1, int most = int.MaxValue) =>
        new(words, name, least, most, placed => placed.Value);

    /// <summary>A name, or a list of one or more.</summary>
    public static ByShapeForm<IReadOnlyList<Placed<string>>> OneOrMore(string words, NameForm name) => new(
        $"{name.Words}, or a list of them",
        scalar: name.As<IReadOnlyList<Placed<string>>>(one => [one]),
        sequence: Names(words, name));

    /// <summary><c>mirror: false</c>.</summary>
    public static Key<bool> MirrorKey() =>
        new("mirror", Flag, "false: no twin is made by the spec's mirror", "false");
}

/// <summary>Cases a target looks at.</summary>
/// <param name="Names">Null for all.</param>
internal sealed record CaseChoice(IReadOnlyList<Placed<string>>? Names);
