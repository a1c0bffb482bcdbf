using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Binds carried masses and makes their twins.</summary>
internal static class MassResolver
{
    /// <summary>All masses, each twin right after its original.</summary>
    public static IReadOnlyList<CarriedMass> Resolve(IReadOnlyList<MassSpec> specs, Frame frame)
    {
        var masses = new List<CarriedMass>();
        HashSet<string> writtenNodes = NameIndex.Written(specs.Select(m => m.Node));
        HashSet<string> writtenTubes = NameIndex.Written(specs.Select(m => m.Tube));
        foreach (MassSpec spec in specs)
        {
            string whose = $"mass on {(spec.Node ?? spec.Tube)?.Value}";
            double? kg = frame.Values.NotNegative(spec.Mass, whose);
            if (spec.Node is { } nodeName)
            {
                int? node = frame.FindJoinedNode(nodeName, whose);
                int? twin = spec.Mirror ? frame.TwinOfNode(nodeName.Value) : null;
                if (kg is { } mass && node is not null)
                {
                    masses.Add(new CarriedMass(node, Tube: null, mass));
                    if (twin is { } other && !writtenNodes.Contains(frame.Draft.Nodes[other].Name))
                    {
                        masses.Add(new CarriedMass(other, Tube: null, mass));
                    }
                }
            }
            else if (spec.Tube is { } tubeName)
            {
                int? tube = frame.FindTube(tubeName, whose);
                int? twin = spec.Mirror ? frame.TwinOfTube(tubeName.Value) : null;
                if (kg is { } mass && tube is not null)
                {
                    masses.Add(new CarriedMass(Node: null, tube, mass));
                    if (twin is { } other && !writtenTubes.Contains(frame.Draft.Tubes[other].Name))
                    {
                        masses.Add(new CarriedMass(Node: null, other, mass));
                    }
                }
            }
        }

        return masses;
    }
}
