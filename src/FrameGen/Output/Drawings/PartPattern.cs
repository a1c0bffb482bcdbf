using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;

namespace FrameGen.Output.Drawings;

/// <summary>
/// What all papers of one part share: its outer surface laid flat, both cut lines in true position, and the datum line of each end.
/// x runs round the outer surface from the top line, growing with the clock angle; y along the axis from the from point; mm.
/// </summary>
internal sealed class PartPattern
{
    /// <summary>Lays a part flat.</summary>
    public PartPattern(ShopPackage package, Part part)
    {
        Package = package;
        Part = part;
        Sized = package.Cut.Sized;
        Tube = Sized.Model.Tubes[part.Drawn.Tube];
        Section = Sized.SectionOf(part.Drawn.Tube);
        Display = new DisplayFormat(Sized.Model.Display);
        Perimeter = Section.Perimeter;
        Radius = Perimeter / (2 * Math.PI);
        TextHeight = Math.Clamp(Math.Round(Perimeter / 48, 1), 1.6, 2.6);
        FoldLines = Section.Outline is FlatSidedOutline flat ? flat.CornerMiddles : [];
        From = new PatternEnd(this, End.From);
        To = new PatternEnd(this, End.To);
    }

    /// <summary>The frame's papers.</summary>
    public ShopPackage Package { get; }

    /// <summary>The part.</summary>
    public Part Part { get; }

    /// <summary>The frame.</summary>
    public SizedFrame Sized { get; }

    /// <summary>The tube the papers are drawn for.</summary>
    public Tube Tube { get; }

    /// <summary>Its section.</summary>
    public Section Section { get; }

    /// <summary>Units on paper.</summary>
    public DisplayFormat Display { get; }

    /// <summary>Of the outer surface, mm.</summary>
    public double Perimeter { get; }

    /// <summary>Of the outer surface, mm.</summary>
    public double Radius { get; }

    /// <summary>Height of plain text, mm: readable on a thin tube, at ease on a thick one.</summary>
    public double TextHeight { get; }

    /// <summary>x of the middles of a flat-sided tube's corners, mm: where a paper is folded. None on other tubes.</summary>
    public IReadOnlyList<double> FoldLines { get; }

    /// <summary>The from end.</summary>
    public PatternEnd From { get; }

    /// <summary>The to end.</summary>
    public PatternEnd To { get; }

    /// <summary>The end asked for.</summary>
    public PatternEnd this[End end] => end == End.From ? From : To;

    /// <summary>Datum lines stand at whole steps of this from the from point, mm: 1 mm, or 1/8 in on papers in inches.</summary>
    public double DatumStep => Sized.Model.Display.Length == LengthUnit.Inch ? 25.4 / 8 : 1;
}
