using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>Words for a tube's ends, the same on every paper.</summary>
internal static class EndText
{
    /// <summary>The word of the spec and of frame.json: cope, miter, square, plane.</summary>
    public static string Kind(CutKind kind) => kind switch
    {
        CutKind.Cope => "cope",
        CutKind.Miter => "miter",
        CutKind.Plane => "plane",
        _ => "square",
    };

    /// <summary>The kind and what cuts the end: <c>cope rail-l tail</c>, <c>square</c>.</summary>
    public static string WithMates(FrameModel model, EndCut end) =>
        string.Join(' ', [Kind(end.Kind), .. end.Contacts.Select(c => model.Tubes[c.Tube].Name)]);

    /// <summary>The same for people: <c>cope to rail-l, tail</c>, <c>miter with shaft-r</c>, <c>square</c>.</summary>
    public static string ForPeople(FrameModel model, EndCut end)
    {
        string mates = string.Join(", ", end.Contacts.Select(c => model.Tubes[c.Tube].Name));
        return mates.Length == 0 ? Kind(end.Kind) : $"{Kind(end.Kind)} {(end.Kind == CutKind.Miter ? "with" : "to")} {mates}";
    }

    /// <summary><c>from</c> or <c>to</c>.</summary>
    public static string Name(End end) => end == End.From ? "from" : "to";
}
