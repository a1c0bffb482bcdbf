using FrameGen.Formats.Drawings;
using FrameGen.Geometry;

namespace FrameGen.Formats.Dxf;

/// <summary>Release 12 (AC1009): no handles, no objects, lines of several points as POLYLINE, VERTEX and SEQEND.</summary>
/// <remarks><c>$INSUNITS</c> and <c>$MEASUREMENT</c> came later; they are written all the same, since readers that know them ask for them
/// whatever the version, and the others pass over header variables they don't know.</remarks>
internal static class DxfRelease12
{
    /// <summary>Writes all but the check of the layers.</summary>
    public static void Write(DxfSink dxf, Drawing drawing, Box2 view, bool inches)
    {
        dxf.Section("HEADER");
        dxf.Add(9, "$ACADVER").Add(1, "AC1009");
        dxf.Add(9, "$INSBASE").Point(10, 0, 0);
        dxf.Add(9, "$EXTMIN").Point(10, view.Left, view.Bottom);
        dxf.Add(9, "$EXTMAX").Point(10, view.Right, view.Top);
        dxf.Add(9, "$LIMMIN").Flat(10, view.Left, view.Bottom);
        dxf.Add(9, "$LIMMAX").Flat(10, view.Right, view.Top);
        dxf.Add(9, "$LUNITS").Add(70, 2);
        DxfWriter.Units(dxf, inches);
        dxf.EndSection();
        Tables(dxf, drawing.Layers, view);
        dxf.Section("BLOCKS").EndSection();
        dxf.Section("ENTITIES");
        foreach (Shape shape in drawing.Shapes)
        {
            Entity(dxf, shape);
        }

        dxf.EndSection();
    }

    private static void Tables(DxfSink dxf, IReadOnlyList<Layer> layers, Box2 view)
    {
        dxf.Section("TABLES");
        dxf.Add(0, "TABLE").Add(2, "VPORT").Add(70, 1)
            .Add(0, "VPORT").Add(2, "*ACTIVE").Add(70, 0)
            .Flat(10, 0, 0).Flat(11, 1, 1).Flat(12, (view.Left + view.Right) / 2, (view.Bottom + view.Top) / 2)
            .Flat(13, 0, 0).Flat(14, 1, 1).Flat(15, 0, 0).Point(16, 0, 0).Real(36, 1).Point(17, 0, 0)
            .Real(40, DxfTables.ViewHeight(view)).Real(41, 1.5).Real(42, 50).Real(43, 0).Real(44, 0).Real(50, 0).Real(51, 0)
            .Add(71, 0).Add(72, 100).Add(73, 1).Add(74, 1).Add(75, 0).Add(76, 0).Add(77, 0).Add(78, 0)
            .Add(0, "ENDTAB");
        dxf.Add(0, "TABLE").Add(2, "LTYPE").Add(70, 1)
            .Add(0, "LTYPE").Add(2, "CONTINUOUS").Add(70, 0).Add(3, "Solid line").Add(72, 65).Add(73, 0).Real(40, 0)
            .Add(0, "ENDTAB");
        dxf.Add(0, "TABLE").Add(2, "LAYER").Add(70, layers.Count + 1);
        LayerRecord(dxf, "0", 7);
        foreach (Layer layer in layers)
        {
            LayerRecord(dxf, layer.Name, layer.ColourIndex);
        }

        dxf.Add(0, "ENDTAB");
        dxf.Add(0, "TABLE").Add(2, "STYLE").Add(70, 1)
            .Add(0, "STYLE").Add(2, "STANDARD").Add(70, 0).Real(40, 0).Real(41, 1).Real(50, 0).Add(71, 0).Real(42, 2.5).Add(3, "txt").Add(4, string.Empty)
            .Add(0, "ENDTAB");
        dxf.EndSection();
    }

    private static void LayerRecord(DxfSink dxf, string name, int colour) =>
        dxf.Add(0, "LAYER").Add(2, name).Add(70, 0).Add(62, colour).Add(6, "CONTINUOUS");

    private static void Entity(DxfSink dxf, Shape shape)
    {
        switch (shape)
        {
            case Polyline { Points.Count: < 2 }:
                throw new ArgumentException("A line needs two points.", nameof(shape));
            case Polyline { Points: [Point2 a, Point2 b] } line:
                dxf.Add(0, "LINE").Add(8, line.Layer).Point(10, a.X, a.Y).Point(11, b.X, b.Y);
                break;
            case Polyline line:
                dxf.Add(0, "POLYLINE").Add(8, line.Layer).Add(66, 1).Point(10, 0, 0).Add(70, line.Closed ? 1 : 0);
                foreach (Point2 point in line.Points)
                {
                    dxf.Add(0, "VERTEX").Add(8, line.Layer).Point(10, point.X, point.Y);
                }

                dxf.Add(0, "SEQEND").Add(8, line.Layer);
                break;
            case Text text:
                dxf.Add(0, "TEXT").Add(8, text.Layer).Point(10, text.At.X, text.At.Y).Real(40, text.Height)
                    .Add(1, DxfText.Encode(text.Content)).Real(50, text.Turn * 180 / Math.PI);
                break;
            default:
                throw new ArgumentException($"DXF has no entity for a {shape.GetType().Name}.", nameof(shape));
        }
    }
}
