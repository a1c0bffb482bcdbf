using FrameGen.Geometry;
using FrameGen.Mechanics.Frames;

namespace FrameGen.Mechanics.Stability;

/// <summary>
/// How the points of an element move when its two nodes do: for a place on it, twelve factors (global axes, at the nodes) a component. The
/// interpolation is the exact one of an unloaded Timoshenko beam (J. Przemieniecki, Theory of Matrix Structural Analysis (1968),
/// chapter 11; Z. Friedman, J. Kosmatka, Computers &amp; Structures 47 (1993) 473), so that mass and geometric stiffness fit the stiffness.
/// </summary>
internal readonly ref struct ElementFields
{
    private readonly BeamElement _element;
    private readonly double _length;
    private readonly double _phiY;
    private readonly double _phiZ;

    /// <summary>Fields of one element of a factored design.</summary>
    /// <param name="frame">The design.</param>
    /// <param name="index">Index of the element.</param>
    public ElementFields(FactoredFrame frame, int index)
    {
        _element = frame.Layout.Frame.Elements[index];
        _length = frame.Layout.Modes.Lengths[index];

        // The stiffnesses of even and of shearing bending are EI/L and 12 EI/(L³(1 + φ)).
        ReadOnlySpan<double> s = frame.OfModes.AsSpan(ElementModes.Modes * index, ElementModes.Modes);
        _phiY = Phi(s[2], s[4]);
        _phiZ = Phi(s[3], s[5]);
    }

    /// <summary>Fields of one element with six stiffnesses.</summary>
    /// <param name="element">The element.</param>
    /// <param name="length">L, mm.</param>
    /// <param name="stiffness">Six values, in the order of its modes.</param>
    public ElementFields(BeamElement element, double length, ReadOnlySpan<double> stiffness)
    {
        (_element, _length) = (element, length);
        _phiY = Phi(stiffness[2], stiffness[4]);
        _phiZ = Phi(stiffness[3], stiffness[5]);
    }

    /// <summary>Displacement along local x at ξ = x/L.</summary>
    public void Along(double xi, Span<double> field) => Linear(_element.Axes.X, xi, asRotation: false, field);

    /// <summary>Rotation about local x.</summary>
    public void Twist(double xi, Span<double> field) => Linear(_element.Axes.X, xi, asRotation: true, field);

    /// <summary>Displacement along local y.</summary>
    public void AcrossY(double xi, Span<double> field) => Put(_element.Axes.Y, _element.Axes.Z, Deflection(xi, _phiY), field);

    /// <summary>Displacement along local z.</summary>
    public void AcrossZ(double xi, Span<double> field) => Put(_element.Axes.Z, -_element.Axes.Y, Deflection(xi, _phiZ), field);

    /// <summary>Slope of the displacement along local y.</summary>
    public void SlopeY(double xi, Span<double> field) => Put(_element.Axes.Y, _element.Axes.Z, Slope(xi, _phiY), field);

    /// <summary>Slope of the displacement along local z.</summary>
    public void SlopeZ(double xi, Span<double> field) => Put(_element.Axes.Z, -_element.Axes.Y, Slope(xi, _phiZ), field);

    /// <summary>Rotation of the section about local z.</summary>
    public void TurnZ(double xi, Span<double> field) => Put(_element.Axes.Y, _element.Axes.Z, Turn(xi, _phiY), field);

    /// <summary>Rotation of the section about minus local y.</summary>
    public void TurnY(double xi, Span<double> field) => Put(_element.Axes.Z, -_element.Axes.Y, Turn(xi, _phiZ), field);

    private double Phi(double even, double shearing) =>
        shearing > 0 ? Math.Max(0, (12 * even / (_length * _length * shearing)) - 1) : 0;

    private void Linear(Vector3 axis, double xi, bool asRotation, Span<double> field)
    {
        if (asRotation)
        {
            Set(field, Vector3.Zero, (1 - xi) * axis, Vector3.Zero, xi * axis);
        }
        else
        {
            Set(field, (1 - xi) * axis, Vector3.Zero, xi * axis, Vector3.Zero);
        }
    }

    private void Put(Vector3 across, Vector3 about, (double V1, double T1, double V2, double T2) shape, Span<double> field) =>
        Set(field, shape.V1 * across, shape.T1 * about, shape.V2 * across, shape.T2 * about);

    // An axis end that stands off its node by o moves by θ × o more.
    private void Set(Span<double> field, Vector3 startShift, Vector3 startTurn, Vector3 endShift, Vector3 endTurn)
    {
        PutSix(field, startShift, startTurn + _element.StartOffset.Cross(startShift));
        PutSix(field[6..], endShift, endTurn + _element.EndOffset.Cross(endShift));
    }

    private static void PutSix(Span<double> six, Vector3 shift, Vector3 turn)
    {
        (six[0], six[1], six[2]) = (shift.X, shift.Y, shift.Z);
        (six[3], six[4], six[5]) = (turn.X, turn.Y, turn.Z);
    }

    private (double V1, double T1, double V2, double T2) Deflection(double x, double phi)
    {
        double f = 1 / (1 + phi);
        double end = f * x * ((x * (3 - (2 * x))) + phi);
        return (1 - end,
            f * _length * x * (1 - x) * (1 - x + (0.5 * phi)),
            end,
            -f * _length * x * (1 - x) * (x + (0.5 * phi)));
    }

    private (double V1, double T1, double V2, double T2) Slope(double x, double phi)
    {
        double f = 1 / (1 + phi);
        double end = f * ((6 * x * (1 - x)) + phi) / _length;
        return (-end,
            f * (1 - (4 * x) + (3 * x * x) + (phi * (0.5 - x))),
            end,
            f * ((3 * x * x) - (2 * x) - (phi * (0.5 - x))));
    }

    private (double V1, double T1, double V2, double T2) Turn(double x, double phi)
    {
        double f = 1 / (1 + phi);
        double end = 6 * f * x * (1 - x) / _length;
        return (-end,
            f * (1 - (4 * x) + (3 * x * x) + (phi * (1 - x))),
            end,
            f * ((3 * x * x) - (2 * x) + (phi * x)));
    }
}
