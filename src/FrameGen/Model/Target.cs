using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>A target with its names bound and its limits in working units.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="At">Where it is written.</param>
public abstract record Target(int Index, SourcePlace At);

/// <summary>Displacement of <paramref name="To"/>, less that of <paramref name="From"/> where given.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="Case">Index of the case.</param>
/// <param name="From">Null for the displacement of one node.</param>
/// <param name="To">The node.</param>
/// <param name="Along">Unit direction; null for any.</param>
/// <param name="Max">mm.</param>
/// <param name="At">Where it is written.</param>
public sealed record DisplacementTarget(int Index, int Case, int? From, int To, Vector3? Along, double Max, SourcePlace At) : Target(Index, At);

/// <summary>Rotation, likewise; the limit in rad.</summary>
public sealed record RotationTarget(int Index, int Case, int? From, int To, Vector3? About, double Max, SourcePlace At) : Target(Index, At);

/// <summary>A unit push or couple over the movement it causes.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="From">Node of the opposite push; null for none.</param>
/// <param name="To">Node of the push.</param>
/// <param name="Direction">Unit direction of the push or axis of the couple.</param>
/// <param name="Turning">True for a couple.</param>
/// <param name="Min">N/mm, or N·mm/rad.</param>
/// <param name="Supports">Indices into <see cref="FrameModel.Supports"/> of those that act.</param>
/// <param name="At">Where it is written.</param>
public sealed record StiffnessTarget(
    int Index, int? From, int To, Vector3 Direction, bool Turning, double Min, IReadOnlyList<int> Supports, SourcePlace At) : Target(Index, At);

/// <summary>Von Mises stress times the safety factor no more than yield.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="Cases">Indices of the cases looked at.</param>
/// <param name="SafetyFactor">At least this.</param>
/// <param name="Groups">Indices of the groups looked at.</param>
/// <param name="At">Where it is written.</param>
public sealed record StrengthTarget(
    int Index, IReadOnlyList<int> Cases, double SafetyFactor, IReadOnlyList<int> Groups, SourcePlace At) : Target(Index, At);

/// <summary>The cases, times the factor, do not buckle the frame.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="Cases">Indices of the cases looked at.</param>
/// <param name="MinFactor">At least this.</param>
/// <param name="At">Where it is written.</param>
public sealed record BucklingTarget(int Index, IReadOnlyList<int> Cases, double MinFactor, SourcePlace At) : Target(Index, At);

/// <summary>No tube is too slender between its nodes.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="Max">Length between neighbouring nodes over the smaller radius of gyration, at most.</param>
/// <param name="Wall">True where the wall's own limit, class 3 of EN 1993-1-1, is looked at too.</param>
/// <param name="At">Where it is written.</param>
public sealed record SlendernessTarget(int Index, double Max, bool Wall, SourcePlace At) : Target(Index, At);

/// <summary>The frame with its masses vibrates no slower.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="Min">Hz.</param>
/// <param name="Supports">Indices into <see cref="FrameModel.Supports"/> of those that act: all.</param>
/// <param name="At">Where it is written.</param>
public sealed record FrequencyTarget(int Index, double Min, IReadOnlyList<int> Supports, SourcePlace At) : Target(Index, At);

/// <summary>A closed-form limit on single tubes.</summary>
/// <param name="Index">Position in the spec's list.</param>
/// <param name="Tubes">Indices of the tubes, twins included.</param>
/// <param name="Subject">As the spec names it: <c>tube brace</c>, <c>group rails</c>.</param>
/// <param name="Along">Bending direction.</param>
/// <param name="At">Where it is written.</param>
public abstract record MemberTarget(int Index, IReadOnlyList<int> Tubes, string Subject, BendingDirection Along, SourcePlace At)
    : Target(Index, At);

/// <summary>Deflection of a tube thought of alone.</summary>
public sealed record MemberDeflectionTarget(
    int Index, IReadOnlyList<int> Tubes, string Subject, BendingDirection Along, SpanKind As, double Load, double Max, SourcePlace At)
    : MemberTarget(Index, Tubes, Subject, Along, At);

/// <summary>A floor for EI and for GJ, N·mm²; null where not asked, one at least is.</summary>
public sealed record MemberStiffnessTarget(
    int Index,
    IReadOnlyList<int> Tubes,
    string Subject,
    BendingDirection Along,
    double? MinBendingStiffness,
    double? MinTorsionalStiffness,
    SourcePlace At) : MemberTarget(Index, Tubes, Subject, Along, At);
