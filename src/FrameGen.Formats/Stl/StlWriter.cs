using System.Buffers.Binary;
using FrameGen.Geometry;

namespace FrameGen.Formats.Stl;

/// <summary>Writes triangle meshes as binary STL, mm.</summary>
/// <remarks>
/// STL keeps single-precision corners and no indices: corners that round to the same place are one. A triangle two of whose corners
/// fall together is left out; its two other edges are then the same line in opposite directions, so a closed mesh stays closed.
/// </remarks>
public static class StlWriter
{
    private const int HeaderSize = 80;
    private const int FacetSize = 50;

    /// <summary>Writes one mesh.</summary>
    /// <param name="mesh">mm.</param>
    /// <exception cref="ArgumentOutOfRangeException">A corner is not finite.</exception>
    public static byte[] Write(TriangleMesh mesh) => Write([mesh]);

    /// <summary>Writes several meshes, one after the other, a shell each.</summary>
    /// <param name="shells">mm.</param>
    /// <exception cref="ArgumentOutOfRangeException">A corner is not finite, or there are too many triangles for one file.</exception>
    public static byte[] Write(IReadOnlyList<TriangleMesh> shells)
    {
        long size = HeaderSize + 4 + shells.Sum(m => (long)m.Count * FacetSize);
        if (size > Array.MaxLength)
        {
            throw new ArgumentOutOfRangeException(nameof(shells), size, "The meshes are too large for one file.");
        }

        // Every byte below is written: no need to clear 50 bytes a triangle first.
        byte[] file = GC.AllocateUninitializedArray<byte>((int)size);
        file.AsSpan(0, HeaderSize).Clear();
        "Binary STL, lengths in mm, written by FrameGen"u8.CopyTo(file);
        int at = HeaderSize + 4;
        foreach (TriangleMesh mesh in shells)
        {
            at = Facets(mesh, file, at);
        }

        BinaryPrimitives.WriteUInt32LittleEndian(file.AsSpan(HeaderSize), (uint)((at - HeaderSize - 4) / FacetSize));
        if (at < file.Length)
        {
            Array.Resize(ref file, at);
        }

        return file;
    }

    private static int Facets(TriangleMesh mesh, byte[] file, int at)
    {
        ReadOnlySpan<float> corners = Corners(mesh.Vertices);
        ReadOnlySpan<int> triangles = mesh.Triangles as int[] ?? [.. mesh.Triangles];
        for (int i = 0; i + 2 < triangles.Length; i += 3)
        {
            ReadOnlySpan<float> a = corners.Slice(3 * triangles[i], 3);
            ReadOnlySpan<float> b = corners.Slice(3 * triangles[i + 1], 3);
            ReadOnlySpan<float> c = corners.Slice(3 * triangles[i + 2], 3);
            (float ax, float ay, float az) = (a[0], a[1], a[2]);
            (float bx, float by, float bz) = (b[0], b[1], b[2]);
            (float cx, float cy, float cz) = (c[0], c[1], c[2]);
            if ((ax == bx && ay == by && az == bz) || (bx == cx && by == cy && bz == cz) || (cx == ax && cy == ay && cz == az))
            {
                continue;
            }

            // The unit normal of the rounded corners: what a reader computes to check it.
            (double ux, double uy, double uz) = ((double)bx - ax, (double)by - ay, (double)bz - az);
            (double vx, double vy, double vz) = ((double)cx - ax, (double)cy - ay, (double)cz - az);
            (double nx, double ny, double nz) = ((uy * vz) - (uz * vy), (uz * vx) - (ux * vz), (ux * vy) - (uy * vx));
            double length = Math.Sqrt((nx * nx) + (ny * ny) + (nz * nz));
            double scale = length > 0 ? 1 / length : 0;

            Span<byte> facet = file.AsSpan(at, FacetSize);
            Put(facet, 0, (float)(nx * scale) + 0f, (float)(ny * scale) + 0f, (float)(nz * scale) + 0f);
            Put(facet, 12, ax, ay, az);
            Put(facet, 24, bx, by, bz);
            Put(facet, 36, cx, cy, cz);
            BinaryPrimitives.WriteUInt16LittleEndian(facet[48..], 0);
            at += FacetSize;
        }

        return at;
    }

    /// <summary>Corners in single precision, x, y, z after one another; no negative zero, which readers tell from zero.</summary>
    private static float[] Corners(IReadOnlyList<Vector3> vertices)
    {
        float[] corners = new float[3 * vertices.Count];
        for (int i = 0; i < vertices.Count; i++)
        {
            Vector3 v = vertices[i];
            (float x, float y, float z) = ((float)v.X + 0f, (float)v.Y + 0f, (float)v.Z + 0f);
            if (!(float.IsFinite(x) && float.IsFinite(y) && float.IsFinite(z)))
            {
                throw new ArgumentOutOfRangeException(nameof(vertices), v, "A mesh holds finite corners.");
            }

            (corners[3 * i], corners[(3 * i) + 1], corners[(3 * i) + 2]) = (x, y, z);
        }

        return corners;
    }

    private static void Put(Span<byte> facet, int at, float x, float y, float z)
    {
        BinaryPrimitives.WriteSingleLittleEndian(facet[at..], x);
        BinaryPrimitives.WriteSingleLittleEndian(facet[(at + 4)..], y);
        BinaryPrimitives.WriteSingleLittleEndian(facet[(at + 8)..], z);
    }
}
