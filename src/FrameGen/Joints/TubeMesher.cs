using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;

namespace FrameGen.Joints;

/// <summary>Closed meshes of cut tubes, oriented outwards, within min(tolerance, half the smaller size / 3000) of the exact part.</summary>
/// <remarks>
/// The skins are cut into columns at clock angles shared by all curves, so that every edge is used by two triangles.
/// Between the skins each cut face is a ring of quads, or several where it bends through the wall. A radially cut rod is
/// the exception to the tolerance: its face is many-valued at the axis itself, and is closed there by a cone of a
/// fiftieth of the radius. A bent tube is meshed straight, with rings of vertices where its bends begin and end and between, and
/// then laid along its axis.
/// </remarks>
public static class TubeMesher
{
    /// <summary>Share of its radius within which a rod's sag and a tube's stay.</summary>
    private const double SagShare = 1.0 / 3000;

    /// <summary>The part in its own axes: z along it, its from point at 0, the top line along x.</summary>
    /// <param name="cut">The frame.</param>
    /// <param name="index">Index of the tube.</param>
    public static TriangleMesh Mesh(CutFrame cut, int index)
    {
        Tube tube = cut.Sized.Model.Tubes[index];
        Section section = cut.Sized.SectionOf(index);
        (Outline outer, Outline inner) = (section.Outline, section.Bore);
        double sag = Math.Min(cut.Sized.Model.Fabrication.Tolerance, Math.Min(outer.HalfHeight, outer.HalfWidth) * SagShare);
        CutTube part = cut.Tubes[index];
        EndRings from = EndRings.Of(part.From, inner, outer, sag);
        EndRings to = EndRings.Of(part.To, inner, outer, sag);
        Columns columns = Columns.Of(from, to, outer, inner, sag);
        MeshBuilder builder = new(columns);
        EndLoops first = from.Loops(columns, builder, static t => t);
        EndLoops last = to.Loops(columns, builder, t => tube.Length - t);
        double[] stations = tube.Bent is { } bent ? BentMesh.Stations(bent, part, outer, cut.Sized.Model.Fabrication.Tolerance) : [];
        builder.Skin(first.Outer, last.Outer, outer, stations, outward: true);
        if (!inner.IsPoint)
        {
            builder.Skin(first.Inner!, last.Inner!, inner, stations, outward: false);
        }

        builder.Face(first, outward: false);
        builder.Face(last, outward: true);
        TriangleMesh mesh = builder.Build();
        return tube.Bent is null ? mesh : BentMesh.Lay(mesh, tube);
    }

    /// <summary>The part where it stands in the frame, in global axes.</summary>
    /// <param name="tube">Its tube.</param>
    /// <param name="own">The part in its own axes.</param>
    public static TriangleMesh InPlace(Tube tube, TriangleMesh own)
    {
        (Vector3 start, TubeAxes axes) = (tube.From.Point, tube.Axes);
        return own with { Vertices = [.. own.Vertices.Select(v => start + (v.Z * axes.X) + (v.X * axes.Z) - (v.Y * axes.Y))] };
    }
}
