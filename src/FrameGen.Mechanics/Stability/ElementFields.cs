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
    private readonly Plane _xy;
    private readonly Plane _xz;

    /// <summary>Fields of one element of a factored design.</summary>
    /// <param name="frame">The design.</param>
    /// <param name="index">Index of the element.</param>
    public ElementFields(FactoredFrame frame, int index)
    {
        _element = frame.Layout.Frame.Elements[index];
        _length = frame.Layout.Modes.Lengths[index];

        // The stiffnesses of even and of shearing bending are EI/L and 12 EI/(L³(1 + φ)).
        ReadOnlySpan<double> s = frame.OfModes.AsSpan(ElementModes.Modes * index, ElementModes.Modes);
        (double shearY, double shearZ) = frame.HingeShears.Length > 0 ? (frame.HingeShears[2 * index], frame.HingeShears[(2 * index) + 1]) : (0, 0);
        Hinges hinges = _element.Hinges;
        _xy = new Plane(_length, s[2], s[4], shearZ, (hinges & Hinges.StartZ) != Hinges.None, (hinges & Hinges.EndZ) != Hinges.None);
        _xz = new Plane(_length, s[3], s[5], shearY, (hinges & Hinges.StartY) != Hinges.None, (hinges & Hinges.EndY) != Hinges.None);
    }

    /// <summary>Fields of one element with six stiffnesses.</summary>
    /// <param name="element">The element; without hinges.</param>
    /// <param name="length">L, mm.</param>
    /// <param name="stiffness">Six values, in the order of its modes.</param>
    public ElementFields(BeamElement element, double length, ReadOnlySpan<double> stiffness)
    {
        (_element, _length) = (element, length);
        _xy = new Plane(length, stiffness[2], stiffness[4], 0, startHinged: false, endHinged: false);
        _xz = new Plane(length, stiffness[3], stiffness[5], 0, startHinged: false, endHinged: false);
    }

    /// <summary>EI, N·mm², and GA, N, of movement along local y; EI is 0 where an end is hinged, GA infinite where shear does not count.</summary>
    public (double Bending, double Shear) RigidityInY => _xy.Rigidity;

    /// <summary>EI, N·mm², and GA, N, of movement along local z.</summary>
    public (double Bending, double Shear) RigidityInZ => _xz.Rigidity;

    /// <summary>Displacement along local x at ξ = x/L.</summary>
    public void Along(double xi, Span<double> field) => Linear(_element.Axes.X, xi, asRotation: false, field);

    /// <summary>Rotation about local x.</summary>
    public void Twist(double xi, Span<double> field)
    {
        // Hinged against torque, it turns as its other end does.
        double share = (_element.Hinges & Hinges.StartX) != Hinges.None ? 1 : (_element.Hinges & Hinges.EndX) != Hinges.None ? 0 : xi;
        Linear(_element.Axes.X, share, asRotation: true, field);
    }

    /// <summary>Displacement along local y.</summary>
    public void AcrossY(double xi, Span<double> field) => Put(_element.Axes.Y, _element.Axes.Z, _xy.Deflection(xi), field);

    /// <summary>Displacement along local z.</summary>
    public void AcrossZ(double xi, Span<double> field) => Put(_element.Axes.Z, -_element.Axes.Y, _xz.Deflection(xi), field);

    /// <summary>Slope of the displacement along local y.</summary>
    public void SlopeY(double xi, Span<double> field) => Put(_element.Axes.Y, _element.Axes.Z, _xy.Slope(xi), field);

    /// <summary>Slope of the displacement along local z.</summary>
    public void SlopeZ(double xi, Span<double> field) => Put(_element.Axes.Z, -_element.Axes.Y, _xz.Slope(xi), field);

    /// <summary>Rotation of the section about local z.</summary>
    public void TurnZ(double xi, Span<double> field) => Put(_element.Axes.Y, _element.Axes.Z, _xy.Turn(xi), field);

    /// <summary>Rotation of the section about minus local y.</summary>
    public void TurnY(double xi, Span<double> field) => Put(_element.Axes.Z, -_element.Axes.Y, _xz.Turn(xi), field);

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

    /// <summary>Bending in one plane: factors of the displacement and the rotation of the start node, then of the end node.</summary>
    private readonly struct Plane
    {
        private readonly double _length;
        private readonly double _phi;
        private readonly double _hingeShear;
        private readonly bool _startHinged;
        private readonly bool _endHinged;

        public Plane(double length, double even, double shearing, double hingeShear, bool startHinged, bool endHinged)
        {
            (_length, _hingeShear, _startHinged, _endHinged) = (length, hingeShear, startHinged, endHinged);

            // The stiffnesses of even and of shearing bending are EI/L and 12 EI/(L³(1 + φ)); with one hinge their ratio is in 6/(L(4 + φ)).
            _phi = shearing > 0 && even > 0 ? Math.Max(0, (12 * even / (length * length * shearing)) - 1)
                : hingeShear > 0 ? Math.Max(0, (6 / (length * hingeShear)) - 4)
                : 0;
            Rigidity = startHinged || endHinged ? (0, double.PositiveInfinity) : (even * length, 12 * even / (_phi * length));
        }

        public (double Bending, double Shear) Rigidity { get; }

        public (double V1, double T1, double V2, double T2) Deflection(double x)
        {
            double f = 1 / (1 + _phi);
            double end = f * x * ((x * (3 - (2 * x))) + _phi);
            return LetGo(
                1 - end,
                f * _length * x * (1 - x) * (1 - x + (0.5 * _phi)),
                end,
                -f * _length * x * (1 - x) * (x + (0.5 * _phi)));
        }

        public (double V1, double T1, double V2, double T2) Slope(double x)
        {
            double f = 1 / (1 + _phi);
            double end = f * ((6 * x * (1 - x)) + _phi) / _length;
            return LetGo(
                -end,
                f * (1 - (4 * x) + (3 * x * x) + (_phi * (0.5 - x))),
                end,
                f * ((3 * x * x) - (2 * x) - (_phi * (0.5 - x))));
        }

        public (double V1, double T1, double V2, double T2) Turn(double x)
        {
            double f = 1 / (1 + _phi);
            double end = 6 * f * x * (1 - x) / _length;
            return LetGo(
                -end,
                f * (1 - (4 * x) + (3 * x * x) + (_phi * (1 - x))),
                end,
                f * ((3 * x * x) - (2 * x) + (_phi * x)));
        }

        // A hinged end turns as its moment's absence has it, not as its node does: by (1 − cL) times the other end's turn less c (v1 − v2), with c the
        // shear force per moment; with both hinged, as the straight line between the nodes.
        private (double V1, double T1, double V2, double T2) LetGo(double v1, double t1, double v2, double t2)
        {
            if (_startHinged && _endHinged)
            {
                double both = (t1 + t2) / _length;
                return (v1 - both, 0, v2 + both, 0);
            }

            double rest = 1 - (_hingeShear * _length);
            return (_startHinged, _endHinged) switch
            {
                (true, _) => (v1 - (_hingeShear * t1), 0, v2 + (_hingeShear * t1), t2 + (rest * t1)),
                (_, true) => (v1 - (_hingeShear * t2), t1 + (rest * t2), v2 + (_hingeShear * t2), 0),
                _ => (v1, t1, v2, t2),
            };
        }
    }
}
