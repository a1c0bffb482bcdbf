namespace FrameGen.Mechanics.Frames;

/// <summary>
/// Linear statics of one frame under one set of supports. The ordering and the symbolic factor are made once, here;
/// <see cref="Factor(IReadOnlyList{BeamProfile}, FactoredFrame?)"/> is called once a design and its result solved for as many load sets
/// as wanted. Safe to share between threads: all that changes lives in <see cref="FactoredFrame"/>, which belongs to one.
/// Every number comes out the same, to the last bit, whatever runs beside it.
/// </summary>
public sealed class FrameSolver
{
    private readonly FrameLayout _layout;

    /// <summary>Prepares the frame's pattern and ordering.</summary>
    /// <param name="frame">Topology.</param>
    /// <param name="restraints">Held freedoms; several on one node add up.</param>
    /// <exception cref="ArgumentException">An element joins a node with itself or with one that is not there, has no length or axes that
    /// don't run along it; or a restraint names a node that is not there, or not six freedoms.</exception>
    public FrameSolver(BeamFrame frame, IReadOnlyList<Restraint> restraints)
    {
        ArgumentNullException.ThrowIfNull(frame);
        ArgumentNullException.ThrowIfNull(restraints);
        (Frame, Restraints, _layout) = (frame, restraints, new FrameLayout(frame, restraints));
    }

    /// <summary>The frame.</summary>
    public BeamFrame Frame { get; }

    /// <summary>The held freedoms.</summary>
    public IReadOnlyList<Restraint> Restraints { get; }

    /// <summary>All that does not depend on the design.</summary>
    internal FrameLayout Layout => _layout;

    /// <summary>Assembles and factors the stiffness of one design.</summary>
    /// <param name="profiles">By <see cref="BeamElement.Profile"/>.</param>
    /// <exception cref="ArgumentException">Fewer profiles than the elements name.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A profile's property is negative or not a number, or E, G or a shear area is zero.</exception>
    /// <exception cref="MechanismException">The frame, or a part of it, can move without strain.</exception>
    public FactoredFrame Factor(IReadOnlyList<BeamProfile> profiles) => Factor(profiles, reuse: null);

    /// <summary>Assembles and factors the stiffness of one design in the memory of an earlier one.</summary>
    /// <param name="profiles">By <see cref="BeamElement.Profile"/>.</param>
    /// <param name="reuse">A result of this solver that is not needed any more: it is overwritten and returned. Null makes a new one.</param>
    /// <exception cref="ArgumentException">Fewer profiles than the elements name, or <paramref name="reuse"/> is of another solver.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A profile's property is negative or not a number, or E, G or a shear area is zero.</exception>
    /// <exception cref="MechanismException">The frame, or a part of it, can move without strain.</exception>
    public FactoredFrame Factor(IReadOnlyList<BeamProfile> profiles, FactoredFrame? reuse)
    {
        ArgumentNullException.ThrowIfNull(profiles);
        if (profiles.Count < _layout.ProfileCount)
        {
            throw new ArgumentException(
                $"The frame's elements name {_layout.ProfileCount} profiles, the design has {profiles.Count}.", nameof(profiles));
        }

        for (int k = 0; k < _layout.ProfileCount; k++)
        {
            Check(profiles[k], k);
        }

        if (reuse is not null && !reuse.IsOf(_layout))
        {
            throw new ArgumentException("Only a result of the same solver can be overwritten.", nameof(reuse));
        }

        FactoredFrame factored = reuse ?? new FactoredFrame(_layout);
        factored.Factor(profiles);
        return factored;
    }

    private static void Check(in BeamProfile profile, int index)
    {
        if (!(IsPositive(profile.E) && IsPositive(profile.G) && IsStiffness(profile.Area) && IsStiffness(profile.Iy)
            && IsStiffness(profile.Iz) && IsStiffness(profile.J) && profile.ShearAreaY > 0 && profile.ShearAreaZ > 0))
        {
            throw new ArgumentOutOfRangeException(
                nameof(profile), profile, $"Profile {index} needs positive E, G and shear areas, and no negative property.");
        }

        static bool IsPositive(double value) => value > 0 && double.IsFinite(value);
        static bool IsStiffness(double value) => value >= 0 && double.IsFinite(value);
    }
}
