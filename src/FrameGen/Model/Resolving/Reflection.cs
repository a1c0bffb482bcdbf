using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>A mirror plane through the origin, and the endings of the names on its two sides.</summary>
internal sealed class Reflection
{
    private readonly int _axis;

    private Reflection(MirrorSpec spec) => (_axis, Ending, TwinEnding) = (spec.Axis, spec.Suffix, spec.TwinSuffix);

    /// <summary>Ending of names that get a twin.</summary>
    public string Ending { get; }

    /// <summary>Ending of the twins' names.</summary>
    public string TwinEnding { get; }

    /// <summary>The axis' letter, for messages.</summary>
    public char Axis => "xyz"[_axis];

    /// <summary>The reflection a spec asks for; null where it asks for none or an error was reported.</summary>
    public static Reflection? Of(MirrorSpec? spec, DiagnosticList diagnostics)
    {
        if (spec is null)
        {
            return null;
        }

        if (!IsEnding(spec.Suffix) || !IsEnding(spec.TwinSuffix))
        {
            diagnostics.Error(
                spec.At, $"mirror: the endings {spec.Suffix} and {spec.TwinSuffix} must be letters, digits, - or _, for example [-l, -r]");
            return null;
        }

        if (Ends(spec.Suffix, spec.TwinSuffix) || Ends(spec.TwinSuffix, spec.Suffix))
        {
            diagnostics.Error(
                spec.At, $"mirror: neither of the endings {spec.Suffix} and {spec.TwinSuffix} may end with the other; write for example [-l, -r]");
            return null;
        }

        return new Reflection(spec);
    }

    /// <summary>True for a name with the first ending.</summary>
    public bool HasTwin(string name) => name.Length > Ending.Length && Ends(name, Ending);

    /// <summary>The twin's name of a name with the first ending.</summary>
    public string TwinOf(string name) => string.Concat(name.AsSpan(0, name.Length - Ending.Length), TwinEnding);

    /// <summary>The twin's name, unless it is too long for a name, which is an error.</summary>
    public string? TwinOf(Placed<string> name, DiagnosticList diagnostics)
    {
        string twin = TwinOf(name.Value);
        if (twin.Length <= SpecName.Longest)
        {
            return twin;
        }

        diagnostics.Error(name.At, $"the name of {name.Value}'s twin would have {twin.Length} letters, and may have {SpecName.Longest}; shorten it");
        return null;
    }

    /// <summary>The name a thing's mirror image goes by: its twin's, its original's, or its own where it is single.</summary>
    /// <param name="name">Any name.</param>
    /// <param name="known">The names of its kind.</param>
    public string ImageOf(string name, NameIndex known)
    {
        if (HasTwin(name))
        {
            return TwinOf(name);
        }

        return OriginalOf(name) is { } original && known.Find(original) is not null ? original : name;
    }

    /// <summary>The name with the first ending of a name with the second one; null for others.</summary>
    public string? OriginalOf(string name) =>
        name.Length > TwinEnding.Length && Ends(name, TwinEnding)
            ? string.Concat(name.AsSpan(0, name.Length - TwinEnding.Length), Ending)
            : null;

    /// <summary>Distance of a point from the plane, mm, with its sign.</summary>
    public double Distance(Vector3 point) => _axis switch { 0 => point.X, 1 => point.Y, _ => point.Z };

    /// <summary>The image of a point, a direction or a force: the component square to the plane changes its sign.</summary>
    public Vector3 Of(Vector3 v) => _axis switch
    {
        0 => v with { X = -v.X },
        1 => v with { Y = -v.Y },
        _ => v with { Z = -v.Z },
    };

    /// <summary>The image of a moment or a rotation: the components in the plane change their sign.</summary>
    public Vector3 OfMoment(Vector3 v) => -Of(v);

    private static bool Ends(string name, string ending) => name.EndsWith(ending, StringComparison.OrdinalIgnoreCase);

    // Endings make names, and names make file names: nothing else may get into them here.
    private static bool IsEnding(string text) => text.Length > 0 && text.All(c => char.IsAsciiLetterOrDigit(c) || c is '-' or '_');
}
