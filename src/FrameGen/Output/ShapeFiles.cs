using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Formats.Dxf;
using FrameGen.Formats.Stl;
using FrameGen.Formats.Svg;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Output.Drawings;
using FrameGen.Spec;

namespace FrameGen.Output;

/// <summary>The files that show shapes: developed patterns, templates, meshes. Each is checked as it is made.</summary>
internal static class ShapeFiles
{
    /// <summary>Makes them, part by part.</summary>
    /// <exception cref="SelfCheckException">A drawing or a mesh does not agree with its part.</exception>
    /// <param name="package">The frame's papers.</param>
    /// <param name="options">Which DXF, and whether SVG too.</param>
    public static IEnumerable<OutputFile> Create(ShopPackage package, PaperOptions options)
    {
        CutFrame cut = package.Cut;
        var meshes = new TriangleMesh?[cut.Tubes.Count];
        foreach (Part part in package.Parts)
        {
            SelfCheck.NoInterference(cut, part.Drawn);
            Drawing developed = DevelopedPattern.Draw(package, part);
            int vents = (part.Drawn.From.Vent is null ? 0 : 1) + (part.Drawn.To.Vent is null ? 0 : 1);
            SelfCheck.DevelopedWidth(part.Name, developed, cut.Sized.SectionOf(part.Drawn.Tube), vents);
            yield return new OutputFile($"developed/{part.Name}.dxf", Dxf(developed));
            if (TemplatePieces.Draw(package, part) is { } pieces)
            {
                yield return new OutputFile($"templates/{part.Name}.dxf", Dxf(pieces));
                if (options.Svg)
                {
                    yield return new OutputFile($"templates/{part.Name}.svg", SvgWriter.Write(WithSquare(pieces), part.Name, background: false));
                }
            }

            TriangleMesh mesh = meshes[part.Drawn.Tube] = TubeMesher.Mesh(cut, part.Drawn.Tube);
            SelfCheck.Mesh(part.Name, mesh, part.Drawn.Volume);
            yield return new OutputFile($"preview/{part.Name}.stl", StlWriter.Write(mesh));
        }

        yield return new OutputFile(
            "preview/frame.stl", StlWriter.Write([.. cut.Tubes.Select(t => InPlace(t.Tube))]));

        yield return new OutputFile("templates.pdf", TemplatesPdf.Write(package));
        yield return new OutputFile("layout.dxf", Dxf(LayoutDrawing.Draw(package)));

        byte[] Dxf(Drawing drawing) => DxfWriter.Write(WithSquare(drawing), options.Dxf);

        Drawing WithSquare(Drawing drawing) =>
            CheckSquare.Beside(drawing, options.Dxf.Inches || cut.Sized.Model.Display.Length == LengthUnit.Inch);

        TriangleMesh InPlace(int tube) =>
            TubeMesher.InPlace(cut.Sized.Model.Tubes[tube], meshes[tube] ?? TubeMesher.Mesh(cut, tube));
    }
}
