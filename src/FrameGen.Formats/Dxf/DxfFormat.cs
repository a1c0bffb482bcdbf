namespace FrameGen.Formats.Dxf;

/// <summary>Which DXF a reader asks for.</summary>
/// <param name="Version">Of the format.</param>
/// <param name="Inches">True to write lengths in inches, for machines that take every drawing as such; false for millimetres.</param>
public readonly record struct DxfFormat(DxfVersion Version, bool Inches);

/// <summary>A version of DXF.</summary>
public enum DxfVersion
{
    /// <summary>Of the year 2000, AC1015: light polylines, handles, line widths.</summary>
    R2000,

    /// <summary>Release 12, AC1009: what old machines read.</summary>
    R12,
}
