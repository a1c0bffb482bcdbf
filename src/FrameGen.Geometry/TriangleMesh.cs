namespace FrameGen.Geometry;

/// <summary>A surface of triangles, counter-clockwise seen from outside.</summary>
/// <param name="Vertices">Points, mm.</param>
/// <param name="Triangles">Three indices into <paramref name="Vertices"/> a triangle, one triangle after the other.</param>
public sealed record TriangleMesh(IReadOnlyList<Vector3> Vertices, IReadOnlyList<int> Triangles)
{
    /// <summary>How many triangles.</summary>
    public int Count => Triangles.Count / 3;

    /// <summary>Enclosed volume, mm³, by the divergence theorem; right for closed meshes only.</summary>
    public double Volume()
    {
        double sixfold = 0;
        for (int i = 0; i < Triangles.Count; i += 3)
        {
            sixfold += Vertices[Triangles[i]].Dot(Vertices[Triangles[i + 1]].Cross(Vertices[Triangles[i + 2]]));
        }

        return sixfold / 6;
    }
}
