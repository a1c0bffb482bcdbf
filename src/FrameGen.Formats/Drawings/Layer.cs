namespace FrameGen.Formats.Drawings;

/// <summary>A named layer and how its lines look.</summary>
/// <param name="Name">Letters, digits, <c>-</c> and <c>_</c>.</param>
/// <param name="ColourIndex">Colour number of CAD files, 1 to 255: 1 red, 3 green, 5 blue, 7 black or white.</param>
/// <param name="Pen">On paper.</param>
public sealed record Layer(string Name, int ColourIndex, Pen Pen);

/// <summary>A line on paper.</summary>
/// <param name="Width">mm.</param>
/// <param name="Ink">Colour.</param>
/// <param name="Dashes">Lengths drawn and left out in turn, mm; empty for an unbroken line.</param>
public sealed record Pen(double Width, Ink Ink, IReadOnlyList<double> Dashes)
{
    /// <summary>An unbroken black line.</summary>
    /// <param name="width">mm.</param>
    public static Pen Black(double width) => new(width, Ink.Black, []);
}

/// <summary>A colour: shares of red, green and blue light, 0 to 1.</summary>
/// <param name="Red">0 to 1.</param>
/// <param name="Green">0 to 1.</param>
/// <param name="Blue">0 to 1.</param>
public readonly record struct Ink(double Red, double Green, double Blue)
{
    /// <summary>No light.</summary>
    public static readonly Ink Black;

    /// <summary>A grey.</summary>
    /// <param name="light">0 black, 1 white.</param>
    public static Ink Grey(double light) => new(light, light, light);
}
