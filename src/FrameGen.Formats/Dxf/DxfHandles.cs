namespace FrameGen.Formats.Dxf;

/// <summary>Handles of what every file holds: fixed, so that the same drawing gives the same bytes.</summary>
internal static class DxfHandles
{
    public const int BlockRecordTable = 0x1;
    public const int LayerTable = 0x2;
    public const int StyleTable = 0x3;
    public const int LinetypeTable = 0x5;
    public const int ViewTable = 0x6;
    public const int UcsTable = 0x7;
    public const int ViewportTable = 0x8;
    public const int ApplicationTable = 0x9;
    public const int DimensionStyleTable = 0xA;
    public const int RootDictionary = 0xC;
    public const int GroupDictionary = 0xD;
    public const int PlotStyleDictionary = 0xE;
    public const int PlotStyle = 0xF;
    public const int LayerZero = 0x10;
    public const int Style = 0x11;
    public const int Application = 0x12;
    public const int DimensionStyle = 0x13;
    public const int ByBlock = 0x14;
    public const int ByLayer = 0x15;
    public const int Continuous = 0x16;
    public const int MultilineDictionary = 0x17;
    public const int MultilineStyle = 0x18;
    public const int Viewport = 0x19;
    public const int LayoutDictionary = 0x1A;
    public const int ModelSpace = 0x1B;
    public const int ModelBlock = 0x1C;
    public const int ModelBlockEnd = 0x1D;
    public const int ModelLayout = 0x1E;
    public const int PaperSpace = 0x1F;
    public const int PaperBlock = 0x20;
    public const int PaperBlockEnd = 0x21;
    public const int PaperLayout = 0x22;

    /// <summary>The drawing's own layers count from here, then its shapes.</summary>
    public const int FirstFree = 0x30;
}
