using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Looks at the tubes on the rack, so that a slip there is told with all others.</summary>
internal static class RackCheck
{
    /// <summary>Binds materials and evaluates lengths.</summary>
    public static void Run(IReadOnlyList<RackSpec> specs, MaterialTable materials, SpecValues values)
    {
        foreach (RackSpec spec in specs)
        {
            materials.Find(spec.Material, "have");
            foreach (SpecQuantity length in spec.Lengths)
            {
                values.Positive(length, "have: a length");
            }
        }
    }
}
