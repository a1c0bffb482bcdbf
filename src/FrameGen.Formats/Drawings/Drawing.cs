using FrameGen.Geometry;

namespace FrameGen.Formats.Drawings;

/// <summary>Flat shapes on named layers, mm, x to the right and y up: what every drawing writer takes.</summary>
/// <param name="Layers">Every layer that a shape stands on, each once; a layer may be empty.</param>
/// <param name="Shapes">In drawing order.</param>
public sealed record Drawing(IReadOnlyList<Layer> Layers, IReadOnlyList<Shape> Shapes)
{
    /// <summary>The smallest box round all shapes, texts by their measured width; null for an empty drawing.</summary>
    public Box2? Bounds()
    {
        Box2? box = null;
        foreach (Shape shape in Shapes)
        {
            Box2 own = shape.Bounds();
            box = box is { } all ? all.Union(own) : own;
        }

        return box;
    }
}

/// <summary>One thing drawn on one layer.</summary>
/// <param name="Layer">Name of the layer.</param>
public abstract record Shape(string Layer)
{
    /// <summary>The smallest box round it.</summary>
    public abstract Box2 Bounds();
}

/// <summary>Straight segments through points.</summary>
/// <param name="Layer">Name of the layer.</param>
/// <param name="Points">Two at least; the first is not repeated at the end of a closed line.</param>
/// <param name="Closed">True where the last point joins the first.</param>
public sealed record Polyline(string Layer, IReadOnlyList<Point2> Points, bool Closed) : Shape(Layer)
{
    /// <summary>An open line from a to b.</summary>
    public static Polyline Segment(string layer, Point2 a, Point2 b) => new(layer, [a, b], Closed: false);

    /// <inheritdoc/>
    public override Box2 Bounds() => Box2.Around(Points);
}

/// <summary>One line of text.</summary>
/// <param name="Layer">Name of the layer.</param>
/// <param name="At">Left end of the base line before turning.</param>
/// <param name="Height">Of capitals, mm.</param>
/// <param name="Turn">Counter-clockwise about <paramref name="At"/>, rad.</param>
/// <param name="Content">Printed as it stands.</param>
public sealed record Text(string Layer, Point2 At, double Height, double Turn, string Content) : Shape(Layer)
{
    /// <summary>Length along the base line, mm, as Helvetica prints it.</summary>
    public double Width => Helvetica.Width(Content, Height);

    /// <summary>Box from descenders to capitals, as Helvetica prints it.</summary>
    public override Box2 Bounds()
    {
        (double sin, double cos) = Math.SinCos(Turn);
        double below = -Helvetica.Descent * Height;
        Point2 along = Width * new Point2(cos, sin);
        Point2 up = new(-sin, cos);
        Point2 bottom = At + (below * up);
        Point2 top = At + (Height * up);
        return Box2.Around([bottom, top, bottom + along, top + along]);
    }
}
