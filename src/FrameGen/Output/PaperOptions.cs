using FrameGen.Formats.Dxf;

namespace FrameGen.Output;

/// <summary>What a build is asked for beside the spec: it changes files, so the manifest keeps it.</summary>
/// <param name="Dxf">Version and unit of DXF files.</param>
/// <param name="Svg">True for the template pieces as SVG files too.</param>
public sealed record PaperOptions(DxfFormat Dxf, bool Svg)
{
    /// <summary>DXF of the year 2000 in millimetres, nothing more.</summary>
    public static readonly PaperOptions Default = new(default, Svg: false);
}
