using FrameGen.Formats.Drawings;
using static FrameGen.Formats.Dxf.DxfHandles;

namespace FrameGen.Formats.Dxf;

/// <summary>The TABLES and BLOCKS sections.</summary>
internal static class DxfTables
{
    // Line widths that DXF knows, in hundredths of a millimetre.
    private static readonly int[] Lineweights =
        [0, 5, 9, 13, 15, 18, 20, 25, 30, 35, 40, 50, 53, 60, 70, 80, 90, 100, 106, 120, 140, 158, 200, 211];

    /// <summary>Writes both sections.</summary>
    public static void Write(DxfSink dxf, IReadOnlyList<Layer> layers, Box2 view)
    {
        dxf.Section("TABLES");
        Viewports(dxf, view);
        Linetypes(dxf);
        Layers(dxf, layers);
        Styles(dxf);
        Table(dxf, "VIEW", ViewTable, 0).Add(0, "ENDTAB");
        Table(dxf, "UCS", UcsTable, 0).Add(0, "ENDTAB");
        Table(dxf, "APPID", ApplicationTable, 1);
        Record(dxf, "APPID", Application, ApplicationTable, "AcDbRegAppTableRecord").Add(2, "ACAD").Add(70, 0).Add(0, "ENDTAB");
        Table(dxf, "DIMSTYLE", DimensionStyleTable, 1).Add(100, "AcDbDimStyleTable").Add(71, 0);
        dxf.Add(0, "DIMSTYLE").Handle(105, DimensionStyle).Handle(330, DimensionStyleTable)
            .Add(100, "AcDbSymbolTableRecord").Add(100, "AcDbDimStyleTableRecord").Add(2, "STANDARD").Add(70, 0)
            .Handle(340, Style).Add(0, "ENDTAB");
        Table(dxf, "BLOCK_RECORD", BlockRecordTable, 2);
        Record(dxf, "BLOCK_RECORD", ModelSpace, BlockRecordTable, "AcDbBlockTableRecord").Add(2, "*Model_Space").Handle(340, ModelLayout);
        Record(dxf, "BLOCK_RECORD", PaperSpace, BlockRecordTable, "AcDbBlockTableRecord").Add(2, "*Paper_Space").Handle(340, PaperLayout);
        dxf.Add(0, "ENDTAB").EndSection();

        dxf.Section("BLOCKS");
        Block(dxf, "*Model_Space", ModelSpace, ModelBlock, ModelBlockEnd, onPaper: false);
        Block(dxf, "*Paper_Space", PaperSpace, PaperBlock, PaperBlockEnd, onPaper: true);
        dxf.EndSection();
    }

    private static DxfSink Table(DxfSink dxf, string name, int handle, int count) =>
        dxf.Add(0, "TABLE").Add(2, name).Handle(5, handle).Handle(330, 0).Add(100, "AcDbSymbolTable").Add(70, count);

    private static DxfSink Record(DxfSink dxf, string type, int handle, int owner, string subclass) =>
        dxf.Add(0, type).Handle(5, handle).Handle(330, owner).Add(100, "AcDbSymbolTableRecord").Add(100, subclass);

    /// <summary>The view a program opens with: all of the drawing.</summary>
    private static void Viewports(DxfSink dxf, Box2 view)
    {
        Table(dxf, "VPORT", ViewportTable, 1);
        Record(dxf, "VPORT", Viewport, ViewportTable, "AcDbViewportTableRecord")
            .Add(2, "*ACTIVE").Add(70, 0)
            .Flat(10, 0, 0).Flat(11, 1, 1)
            .Flat(12, (view.Left + view.Right) / 2, (view.Bottom + view.Top) / 2)
            .Flat(13, 0, 0).Flat(14, 10, 10).Flat(15, 10, 10)
            .Point(16, 0, 0).Real(36, 1).Point(17, 0, 0)
            .Real(40, ViewHeight(view)).Real(41, 1.5).Real(42, 50)
            .Real(43, 0).Real(44, 0).Real(50, 0).Real(51, 0)
            .Add(71, 0).Add(72, 1000).Add(73, 1).Add(74, 3).Add(75, 0).Add(76, 0).Add(77, 0).Add(78, 0)
            .Add(0, "ENDTAB");
    }

    /// <summary>Height of a view, half as wide again as high, that shows all of a drawing.</summary>
    public static double ViewHeight(Box2 view) => Math.Max(1, 1.05 * Math.Max(view.Height, view.Width / 1.5));

    private static void Linetypes(DxfSink dxf)
    {
        Table(dxf, "LTYPE", LinetypeTable, 3);
        Linetype(dxf, ByBlock, "ByBlock", string.Empty);
        Linetype(dxf, ByLayer, "ByLayer", string.Empty);
        Linetype(dxf, Continuous, "Continuous", "Solid line");
        dxf.Add(0, "ENDTAB");
    }

    private static void Linetype(DxfSink dxf, int handle, string name, string description) =>
        Record(dxf, "LTYPE", handle, LinetypeTable, "AcDbLinetypeTableRecord")
            .Add(2, name).Add(70, 0).Add(3, description).Add(72, 65).Add(73, 0).Real(40, 0);

    private static void Layers(DxfSink dxf, IReadOnlyList<Layer> layers)
    {
        Table(dxf, "LAYER", LayerTable, layers.Count + 1);
        LayerRecord(dxf, LayerZero, "0", 7, lineweight: -3);
        for (int i = 0; i < layers.Count; i++)
        {
            LayerRecord(dxf, FirstFree + i, layers[i].Name, layers[i].ColourIndex, Lineweight(layers[i].Pen.Width));
        }

        dxf.Add(0, "ENDTAB");
    }

    private static void LayerRecord(DxfSink dxf, int handle, string name, int colour, int lineweight) =>
        Record(dxf, "LAYER", handle, LayerTable, "AcDbLayerTableRecord")
            .Add(2, name).Add(70, 0).Add(62, colour).Add(6, "Continuous").Add(370, lineweight).Handle(390, PlotStyle);

    private static int Lineweight(double width)
    {
        int best = Lineweights[0];
        foreach (int candidate in Lineweights)
        {
            if (Math.Abs(candidate - (100 * width)) < Math.Abs(best - (100 * width)))
            {
                best = candidate;
            }
        }

        return best;
    }

    /// <summary>One text style, a font made to Helvetica's widths: text that was fitted to them stays in its place.</summary>
    private static void Styles(DxfSink dxf)
    {
        Table(dxf, "STYLE", StyleTable, 1);
        Record(dxf, "STYLE", Style, StyleTable, "AcDbTextStyleTableRecord")
            .Add(2, "STANDARD").Add(70, 0).Real(40, 0).Real(41, 1).Real(50, 0).Add(71, 0).Real(42, 2.5).Add(3, "arial.ttf").Add(4, string.Empty)
            .Add(0, "ENDTAB");
    }

    private static void Block(DxfSink dxf, string name, int owner, int handle, int endHandle, bool onPaper)
    {
        dxf.Add(0, "BLOCK").Handle(5, handle).Handle(330, owner).Add(100, "AcDbEntity");
        if (onPaper)
        {
            dxf.Add(67, 1);
        }

        dxf.Add(8, "0").Add(100, "AcDbBlockBegin").Add(2, name).Add(70, 0).Point(10, 0, 0).Add(3, name).Add(1, string.Empty);
        dxf.Add(0, "ENDBLK").Handle(5, endHandle).Handle(330, owner).Add(100, "AcDbEntity");
        if (onPaper)
        {
            dxf.Add(67, 1);
        }

        dxf.Add(8, "0").Add(100, "AcDbBlockEnd");
    }
}
