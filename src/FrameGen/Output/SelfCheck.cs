using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>Two outputs of a build say different things: a fault of the program, not of the spec.</summary>
/// <param name="message">Which, and by how much.</param>
public sealed class SelfCheckException(string message) : Exception(message);

/// <summary>Checks that every build runs on its own outputs before it writes anything.</summary>
internal static class SelfCheck
{
    /// <summary>The cut list's masses and the frame's: the same within 1e-6, and what the tolerance leaves between the tubes of one part.</summary>
    public static void Totals(ShopPackage package)
    {
        double list = package.Parts.Sum(p => p.Quantity * p.Drawn.MassKg);
        double frame = package.Totals.MassKg;
        double merged = package.Parts.Sum(p => (p.Quantity - 1) * PerMillimetre(package, p));
        double allowed = (1e-6 * frame) + (2 * package.Cut.Sized.Model.Fabrication.Tolerance * merged);
        Require(Math.Abs(list - frame) <= allowed, $"the cut list weighs {list} kg and the frame {frame} kg");
        int pieces = package.Parts.Sum(p => p.Quantity);
        Require(pieces == package.Cut.Tubes.Count, $"the cut list has {pieces} pieces for {package.Cut.Tubes.Count} tubes");
    }

    private static double PerMillimetre(ShopPackage package, Part part)
    {
        SizedFrame sized = package.Cut.Sized;
        Material material = sized.Model.Groups[sized.Model.Tubes[part.Drawn.Tube].Group].Material;
        return material.Density * sized.SectionOf(part.Drawn.Tube).Area;
    }

    /// <summary>Every piece of the cut list is cut from one bar, once, and no bar is cut into more than it holds.</summary>
    public static void Stock(ShopPackage package)
    {
        double kerf = package.Cut.Sized.Model.Fabrication.Kerf;
        double trim = package.Cut.Sized.Model.Fabrication.BarTrim;
        StockCut[] all = [.. package.Stock.Lots.SelectMany(l => l.Bars).SelectMany(b => b.Cuts)];
        ILookup<Part, StockCut> cuts = all.ToLookup<StockCut, Part>(c => c.Part, ReferenceEqualityComparer.Instance);
        foreach (Part part in package.Parts)
        {
            int cut = cuts[part].Count();
            Require(cut == part.Quantity, $"the stock plan has {cut} of {part.Mark} and the cut list {part.Quantity}");
        }

        Require(all.Length == package.Parts.Sum(p => p.Quantity), $"the stock plan has {all.Length} pieces");
        foreach (StockLot lot in package.Stock.Lots)
        {
            foreach (StockBar bar in lot.Bars)
            {
                double pieces = bar.Cuts.Sum(c => c.Part.Drawn.CutLength) + ((bar.Cuts.Count - 1) * kerf) + (2 * trim);
                bool fits = bar.Offcut >= 0 && Math.Abs(pieces + bar.Offcut - lot.BarLength) <= 0.001 * (bar.Cuts.Count + 2);
                Require(fits, $"bar {bar.Label} of {lot.Section.Name} is {lot.BarLength} mm long and is cut into {pieces} mm and {bar.Offcut} mm");
            }
        }
    }

    /// <summary>The seams of the weld list are as long as the frame's weld length.</summary>
    public static void Welds(ShopPackage package, WeldList welds)
    {
        double frame = package.Totals.WeldLength;
        Require(Math.Abs(welds.Length - frame) <= 1e-6 * frame, $"the weld list is {welds.Length} mm long and the frame's seams {frame} mm");
    }

    /// <summary>Reactions and loads of every case: the same within 1e-9.</summary>
    public static void Equilibrium(SizedFrame sized)
    {
        foreach (CaseResult result in sized.Cases)
        {
            Require(
                result.EquilibriumError <= SizingFinish.LargestError,
                $"case {sized.Model.Cases[result.Case].Name}: loads and reactions differ by {result.EquilibriumError} of the largest");
        }
    }

    /// <summary>A part's mesh is closed, has no flat triangle, and weighs what the integral says within 0.1 %.</summary>
    public static void Mesh(string mark, TriangleMesh mesh, double volume)
    {
        string? fault = MeshFault(mesh);
        Require(fault is null, $"the mesh of {mark} {fault}");
        double meshed = mesh.Volume();
        Require(Math.Abs(meshed - volume) <= 1e-3 * volume, $"the mesh of {mark} holds {meshed} mm3 and the part {volume} mm3");
    }

    /// <summary>A developed pattern is as wide as the tube's outline is long, within 1e-6 mm, and has one closed line to cut, and one for each vent.</summary>
    public static void DevelopedWidth(string mark, Drawing drawing, Section section, int vents)
    {
        List<Polyline> cut = [.. drawing.Shapes.OfType<Polyline>().Where(p => p.Layer is "CUT")];
        Require(cut.Count == 1 + vents && cut.TrueForAll(c => c.Closed), $"the developed pattern of {mark} has {cut.Count} lines to cut");
        double width = cut[0].Points.Max(p => p.X) - cut[0].Points.Min(p => p.X);
        Require(
            Math.Abs(width - section.Outline.Perimeter) <= 1e-6,
            $"the developed pattern of {mark} is {width} mm wide on a tube {section.Outline.Perimeter} mm round");
    }

    /// <summary>A cut line rolled back on its tube stays clear of every round mate's wall, but for the tolerance.</summary>
    public static void NoInterference(CutFrame cut, CutTube tube)
    {
        foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
        {
            foreach (Contact contact in tube[end].Contacts)
            {
                if (tube[end].Kind == CutKind.Cope)
                {
                    ClearOf(cut, tube, end, cut.Tubes[contact.Tube]);
                }
            }
        }
    }

    private static void ClearOf(CutFrame cut, CutTube tube, End end, CutTube mate)
    {
        FrameModel model = cut.Sized.Model;
        Tube own = model.Tubes[tube.Tube];
        Tube other = model.Tubes[mate.Tube];
        TubeStraight straight = model.StraightAt(mate.Tube, own[end].Node);
        TubeAxes axes = own.AxesAt(end);
        Outline outer = cut.Sized.SectionOf(tube.Tube).Outline;
        Outline wall = cut.Sized.SectionOf(mate.Tube).Outline;

        // Measured along rays from the mate's axis, nowhere shorter than across its skin.
        double spare = tube[end].Gap - model.Fabrication.Tolerance - 1e-6;

        // Metal of the mate, whatever its own ends look like: between its node points, and inside its longest cuts.
        double first = Math.Max(straight.From, mate.From.Outer.Max);
        double last = Math.Min(straight.To, other.Length - Math.Max(0, mate.To.Outer.Max));
        foreach (CurvePoint point in tube[end].Outer.Points)
        {
            (double sin, double cos) = Math.SinCos(point.Clock);
            Vector3 at = own[end].Point + (point.T * own.Into(end)) + (outer.RadiusAt(sin, cos) * axes.Radial(point.Clock));
            double along = straight.Along(at);
            Point2 across = straight.InSection(at);
            double distance = across.DistanceTo(default);
            double clear = wall.RadiusAt(across.Y / distance, across.X / distance) + spare;
            if (!(along < first || along > last || distance >= clear))
            {
                Require(holds: false, $"the {EndText.Name(end)} end of {own.Name} cuts {clear - distance} mm into {other.Name}");
            }
        }
    }

    private static string? MeshFault(TriangleMesh mesh)
    {
        var edges = new HashSet<(int From, int To)>(mesh.Triangles.Count);
        for (int i = 0; i < mesh.Triangles.Count; i += 3)
        {
            (int a, int b, int c) = (mesh.Triangles[i], mesh.Triangles[i + 1], mesh.Triangles[i + 2]);
            Vector3 corner = mesh.Vertices[a];
            if (!((mesh.Vertices[b] - corner).Cross(mesh.Vertices[c] - corner).Length > 0))
            {
                return "has a triangle without area";
            }

            if (!edges.Add((a, b)) || !edges.Add((b, c)) || !edges.Add((c, a)))
            {
                return "has two triangles on one side of an edge";
            }
        }

        return edges.All(e => edges.Contains((e.To, e.From))) ? null : "is not closed";
    }

    private static void Require(bool holds, FormattableString what)
    {
        if (!holds)
        {
            throw new SelfCheckException(FormattableString.Invariant(what));
        }
    }
}
