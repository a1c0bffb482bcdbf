using FrameGen.Diagnostics;

namespace FrameGen.Spec;

/// <summary>A spec as written: parsed, every value with its place, nothing evaluated and no name bound yet.</summary>
/// <param name="Files">The root file first, then what it includes, in the order of reading, each once.</param>
/// <param name="Includes">For each included file: the path as written and the index into <paramref name="Files"/>.</param>
/// <param name="Title">Printed on every paper.</param>
/// <param name="Revision">Printed on every paper.</param>
/// <param name="Notes">Printed on the report.</param>
/// <param name="Display">How papers print quantities.</param>
/// <param name="Parameters">Named quantities, those of included files too.</param>
/// <param name="Mirror">The mirror plane, if any.</param>
/// <param name="Nodes">Nodes in the order written.</param>
/// <param name="Tubes">Tubes in the order written.</param>
/// <param name="Groups">Groups in the order written.</param>
/// <param name="Materials">Materials of the spec and its included files.</param>
/// <param name="Stock">Stock lists of the spec and its included files.</param>
/// <param name="Have">Tubes on the rack.</param>
/// <param name="Supports">Held nodes.</param>
/// <param name="Masses">Masses carried.</param>
/// <param name="Cases">Load cases in the order written.</param>
/// <param name="Targets">Targets in the order written.</param>
/// <param name="Joints">Joint orders and miters asked for.</param>
/// <param name="Fabrication">Shop preferences.</param>
public sealed record FrameSpec(
    IReadOnlyList<SourceFile> Files,
    IReadOnlyList<(string Path, int File)> Includes,
    string Title,
    string Revision,
    string Notes,
    DisplaySpec Display,
    IReadOnlyList<ParameterSpec> Parameters,
    MirrorSpec? Mirror,
    IReadOnlyList<NodeSpec> Nodes,
    IReadOnlyList<TubeSpec> Tubes,
    IReadOnlyList<GroupSpec> Groups,
    IReadOnlyList<MaterialSpec> Materials,
    IReadOnlyList<StockListSpec> Stock,
    IReadOnlyList<RackSpec> Have,
    IReadOnlyList<SupportSpec> Supports,
    IReadOnlyList<MassSpec> Masses,
    IReadOnlyList<CaseSpec> Cases,
    IReadOnlyList<TargetSpec> Targets,
    IReadOnlyList<JointSpec> Joints,
    FabricationSpec Fabrication)
{
    /// <summary>Sizes of tubes in hand, in the order written.</summary>
    public IReadOnlyList<MeasuredSpec> Measured { get; init; } = [];

    /// <summary>How sizes are chosen.</summary>
    public SizingSpec Sizing { get; init; } = SizingSpec.Default;

    /// <summary>The pinned sizes beside the spec; null where there are none.</summary>
    public FrozenSpec? Frozen { get; init; }
}

/// <summary>A named quantity; its kind follows from its value.</summary>
public sealed record ParameterSpec(Placed<string> Name, Expression Value, SourcePlace At);

/// <summary>The mirror plane through the origin and the two name endings.</summary>
/// <param name="Axis">0, 1 or 2: the plane's normal is x, y or z.</param>
/// <param name="Suffix">Ending of names that get a twin.</param>
/// <param name="TwinSuffix">Ending of the twins' names.</param>
/// <param name="At">Where.</param>
public sealed record MirrorSpec(int Axis, string Suffix, string TwinSuffix, SourcePlace At);
