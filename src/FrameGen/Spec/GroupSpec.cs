using FrameGen.Diagnostics;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Spec;

/// <summary>A group as written: a fixed section, or candidates to choose from.</summary>
public sealed record GroupSpec(
    Placed<string> Name, Placed<string> Material, Placed<Section>? Section, ChooseSpec? Choose, bool Welded);

/// <summary>The size of a group's tube in hand, as measured; null where a measure was not taken.</summary>
/// <param name="Group">The group.</param>
/// <param name="Od">Outside diameter.</param>
/// <param name="Height">Outer size along the top line.</param>
/// <param name="Width">Outer size across.</param>
/// <param name="Wall">Wall.</param>
public sealed record MeasuredSpec(Placed<string> Group, SpecQuantity? Od, SpecQuantity? Height, SpecQuantity? Width, SpecQuantity? Wall);

/// <summary>What a group may choose from.</summary>
/// <param name="Lists">Names of stock lists, at least one.</param>
/// <param name="Shape">Only this shape; null for any.</param>
/// <param name="Od">Outside diameter or larger outer size.</param>
/// <param name="Height">Outer size along the top line.</param>
/// <param name="Width">Outer size across.</param>
/// <param name="Wall">Wall.</param>
/// <param name="At">Where.</param>
public sealed record ChooseSpec(
    IReadOnlyList<Placed<string>> Lists,
    Placed<string>? Shape,
    RangeSpec? Od,
    RangeSpec? Height,
    RangeSpec? Width,
    RangeSpec? Wall,
    SourcePlace At);

/// <summary>A range of lengths, both ends included.</summary>
/// <param name="Min">Null for no lower limit.</param>
/// <param name="Max">Null for no upper limit.</param>
/// <param name="Text">As written.</param>
/// <param name="At">Where.</param>
public sealed record RangeSpec(SpecQuantity? Min, SpecQuantity? Max, string Text, SourcePlace At);
