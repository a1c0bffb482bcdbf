using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Spec;
using FrameGen.Spec.Quantities;

namespace FrameGen.Model.Resolving;

/// <summary>Evaluates a spec's values and checks their ranges. Null always means that an error has been reported.</summary>
internal sealed class SpecValues(ParameterTable parameters, DiagnosticList diagnostics)
{
    /// <summary>Where errors go.</summary>
    public DiagnosticList Diagnostics { get; } = diagnostics;

    /// <summary>The value in working units.</summary>
    public double? Of(SpecQuantity quantity) => parameters.Value(quantity, Diagnostics);

    /// <summary>The value, which must be more than 0.</summary>
    /// <param name="quantity">What was written.</param>
    /// <param name="what">What it is, to begin the message with: <c>group rails: the wall</c>.</param>
    public double? Positive(SpecQuantity quantity, string what) =>
        Of(quantity) is { } value ? Checked(value, value > 0, quantity, $"{what} must be more than 0") : null;

    /// <summary>The value, which must not be negative.</summary>
    /// <param name="quantity">What was written.</param>
    /// <param name="what">What it is, to begin the message with.</param>
    public double? NotNegative(SpecQuantity quantity, string what) =>
        Of(quantity) is { } value ? Checked(value, value >= 0, quantity, $"{what} must not be negative") : null;

    /// <summary>The value where one is written, else a default.</summary>
    public double? NotNegative(SpecQuantity? quantity, string what, double fallback) =>
        quantity is null ? fallback : NotNegative(quantity, what);

    /// <summary>Three components; all three are evaluated, so that every error is found.</summary>
    public Vector3? Of(SpecVector vector)
    {
        double? x = Of(vector.X);
        double? y = Of(vector.Y);
        double? z = Of(vector.Z);
        return x is { } vx && y is { } vy && z is { } vz ? new Vector3(vx, vy, vz) : null;
    }

    /// <summary>Three components where they are written, else zero.</summary>
    public Vector3? OrZero(SpecVector? vector) => vector is null ? Vector3.Zero : Of(vector);

    /// <summary>A unit direction.</summary>
    /// <param name="vector">What was written; may have any length but zero.</param>
    /// <param name="what">What it is, to begin the message with.</param>
    public Vector3? Direction(SpecVector vector, string what)
    {
        if (Of(vector) is not { } direction)
        {
            return null;
        }

        double largest = Math.Max(Math.Abs(direction.X), Math.Max(Math.Abs(direction.Y), Math.Abs(direction.Z)));
        if (!(largest > 0))
        {
            Diagnostics.Error(vector.At, $"{what} has no direction: all three numbers are 0; write for example [0, 0, 1]");
            return null;
        }

        // Scaled first: the squares of very small or large numbers would vanish or overflow.
        return (direction / largest).Normalized();
    }

    private double? Checked(double value, bool holds, SpecQuantity quantity, string rule)
    {
        if (holds)
        {
            return value;
        }

        Diagnostics.Error(quantity.At, $"{rule}, and is {value:G9} {KindInfo.Of(quantity.Kind).WorkingUnit}".TrimEnd());
        return null;
    }
}
