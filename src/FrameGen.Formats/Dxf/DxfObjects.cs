using FrameGen.Formats.Drawings;
using static FrameGen.Formats.Dxf.DxfHandles;

namespace FrameGen.Formats.Dxf;

/// <summary>The OBJECTS section: the dictionaries and layouts that AC1015 asks for.</summary>
internal static class DxfObjects
{
    /// <summary>Writes the section.</summary>
    public static void Write(DxfSink dxf, Box2 view)
    {
        dxf.Section("OBJECTS");
        Dictionary(dxf, RootDictionary, owner: 0)
            .Add(3, "ACAD_GROUP").Handle(350, GroupDictionary)
            .Add(3, "ACAD_LAYOUT").Handle(350, LayoutDictionary)
            .Add(3, "ACAD_MLINESTYLE").Handle(350, MultilineDictionary)
            .Add(3, "ACAD_PLOTSTYLENAME").Handle(350, PlotStyleDictionary);
        Dictionary(dxf, GroupDictionary, RootDictionary);
        Dictionary(dxf, LayoutDictionary, RootDictionary)
            .Add(3, "Layout1").Handle(350, PaperLayout).Add(3, "Model").Handle(350, ModelLayout);
        Dictionary(dxf, MultilineDictionary, RootDictionary).Add(3, "Standard").Handle(350, MultilineStyle);

        dxf.Add(0, "ACDBDICTIONARYWDFLT").Handle(5, PlotStyleDictionary).Handle(330, RootDictionary)
            .Add(100, "AcDbDictionary").Add(281, 1).Add(3, "Normal").Handle(350, PlotStyle)
            .Add(100, "AcDbDictionaryWithDefault").Handle(340, PlotStyle);
        dxf.Add(0, "ACDBPLACEHOLDER").Handle(5, PlotStyle).Handle(330, PlotStyleDictionary);

        dxf.Add(0, "MLINESTYLE").Handle(5, MultilineStyle).Handle(330, MultilineDictionary)
            .Add(100, "AcDbMlineStyle").Add(2, "STANDARD").Add(70, 0).Add(3, string.Empty).Add(62, 256)
            .Real(51, 90).Real(52, 90).Add(71, 2)
            .Real(49, 0.5).Add(62, 256).Add(6, "ByLayer").Real(49, -0.5).Add(62, 256).Add(6, "ByLayer");

        Layout(dxf, ModelLayout, "Model", 0, ModelSpace, plotFlags: 1712, view);
        Layout(dxf, PaperLayout, "Layout1", 1, PaperSpace, plotFlags: 688, new Box2(0, 0, 420, 297));
        dxf.EndSection();
    }

    private static DxfSink Dictionary(DxfSink dxf, int handle, int owner) =>
        dxf.Add(0, "DICTIONARY").Handle(5, handle).Handle(330, owner).Add(100, "AcDbDictionary").Add(281, 1);

    private static void Layout(DxfSink dxf, int handle, string name, int order, int block, int plotFlags, Box2 view)
    {
        dxf.Add(0, "LAYOUT").Handle(5, handle).Handle(330, LayoutDictionary)
            .Add(100, "AcDbPlotSettings").Add(1, string.Empty).Add(2, "none_device").Add(4, string.Empty).Add(6, string.Empty)
            .Real(40, 0).Real(41, 0).Real(42, 0).Real(43, 0).Real(44, 0).Real(45, 0).Real(46, 0).Real(47, 0).Real(48, 0).Real(49, 0)
            .Real(140, 0).Real(141, 0).Real(142, 1).Real(143, 1)
            .Add(70, plotFlags).Add(72, 1).Add(73, 0).Add(74, order == 0 ? 1 : 5).Add(7, string.Empty).Add(75, 16).Real(147, 1)
            .Real(148, 0).Real(149, 0);
        dxf.Add(100, "AcDbLayout").Add(1, name).Add(70, 1).Add(71, order)
            .Flat(10, view.Left, view.Bottom).Flat(11, view.Right, view.Top).Point(12, 0, 0)
            .Point(14, view.Left, view.Bottom).Point(15, view.Right, view.Top).Real(146, 0)
            .Point(13, 0, 0).Point(16, 1, 0).Real(17, 0).Real(27, 1).Real(37, 0).Add(76, 0).Handle(330, block);
    }
}
