using FrameGen.Mechanics.Frames;
using FrameGen.Spec.Forms;
using static FrameGen.Spec.Keys.CommonForms;

namespace FrameGen.Spec.Keys;

/// <summary>Nodes, tubes and tube ends.</summary>
internal static class FrameKeys
{
    /// <summary>Most tubes of a spec.</summary>
    public const int MostTubes = 10_000;

    private static readonly Key<Placed<string>> OnTube = new("on", TubeName, "the tube it lies on; the tube stays one piece", "rail-l");

    private static readonly Key<SpecQuantity> AtShare = new("at", WholeShare, "share of the axis from its `from` end", "55 %");

    private static readonly Key<SpecQuantity> AtDistance =
        new("distance", NotNegative(QuantityKind.Length), "distance along the axis from its `from` end", "300 mm");

    private static readonly Key<IReadOnlyList<Placed<string>>> Between =
        new("between", Names("nodes", NodeName, 2, 2), "two nodes", "[front-l, rear-l]");

    private static readonly Key<SpecQuantity> BetweenShare =
        new("at", WholeShare, "share of the way from the first to the second", "50 %") { IsRequired = true };

    private static readonly Key<Placed<string>> FromNode = new("from", NodeName, "another node", "front-l");

    private static readonly Key<SpecVector> FromOffset =
        new("offset", Point, "from that node to this one", "[0 mm, 0 mm, 250 mm]") { IsRequired = true };

    /// <summary>Where a node is.</summary>
    public static readonly ByShapeForm<NodePositionSpec> NodePosition = new(
        "a position: [x, y, z], {on: TUBE, at: 40 %}, {between: [A, B], at: 50 %} or {from: A, offset: [x, y, z]}",
        sequence: Point.As<NodePositionSpec>(point => new PointPositionSpec(point)),
        mapping: new ChoiceForm<NodePositionSpec>(
            "a position",
            [
                ("on", new(
                    "a node on a tube",
                    [OnTube, AtShare, AtDistance],
                    map => new OnTubePositionSpec(map.Get(OnTube), map.Find(AtShare), map.Find(AtDistance)),
                    map => map.ExactlyOne(AtShare, AtDistance))),
                ("between", new(
                    "a node between two others",
                    [Between, BetweenShare],
                    map => new BetweenPositionSpec(map.Get(Between)[0], map.Get(Between)[1], map.Get(BetweenShare)))),
                ("from", new(
                    "a node at an offset",
                    [FromNode, FromOffset],
                    map => new OffsetPositionSpec(map.Get(FromNode), map.Get(FromOffset)))),
            ]));

    /// <summary>All nodes.</summary>
    public static readonly NamedForm<NodeSpec> Nodes =
        new("node", NodeName, new OwnedForm<NodePositionSpec, NodeSpec>(NodePosition, (name, position) => new NodeSpec(name, position)), least: 1);

    private static readonly Key<Placed<string>> EndNode = new("node", NodeName, "the node", "hub") { IsRequired = true };

    private static readonly Key<SpecVector> EndOffset =
        new("offset", Point, "from the node to the end of the axis", "[0 mm, 20 mm, 0 mm]") { IsRequired = true };

    private static readonly ByShapeForm<AxisEnd> EndPoint = new(
        "a node, or {node: NAME, offset: [x, y, z]}",
        scalar: NodeName.As(name => new AxisEnd(name, null)),
        mapping: new MapForm<AxisEnd>(
            "the end of an axis", [EndNode, EndOffset], map => new AxisEnd(map.Get(EndNode), map.Get(EndOffset))));

    private static readonly Key<SpecVector> CutPlane =
        new("plane", new VectorForm(QuantityKind.Number, isDirection: true), "normal of the plane it is cut on", "[1, 0, 1]")
        {
            IsRequired = true,
        };

    private static readonly Key<CutChoice> EndCut = new(
        "cut",
        new ByShapeForm<CutChoice>(
            "cope, square or {plane: [nx, ny, nz]}",
            scalar: new WordForm<CutChoice>([("cope", new(RequestedCut.Cope, null)), ("square", new(RequestedCut.Square, null))]),
            mapping: new MapForm<CutChoice>("a plane cut", [CutPlane], map => new CutChoice(RequestedCut.Plane, map.Get(CutPlane)))),
        "how it is cut; without it the end is coped to what stands before it in the joint's order",
        "square");

    private static readonly Key<SpecQuantity> Extend =
        new("extend", AnyValue(QuantityKind.Length), "moves a square or plane cut past the node (negative: short of it)", "20 mm");

    private static readonly Key<SpecQuantity> EndGap =
        new("gap", NotNegative(QuantityKind.Length), "left between this coped end and its mates", "0.2 mm");

    private static readonly Key<SpecQuantity> Vent =
        new("vent", Positive(QuantityKind.Length), "diameter of a breathing hole near this end", "4 mm");

    private static readonly Key<bool> Wrap = new("wrap", Flag, "true where the tube may be wider than its seat", "true");

    private static readonly MapForm<EndCutSpec> End = new(
        "a tube's end",
        [EndCut, Extend, EndGap, Vent, Wrap],
        map => new EndCutSpec(
            map.Find(EndCut)?.Cut ?? RequestedCut.Default, map.Find(Extend), map.Find(EndGap), map.FindValue(Wrap) ?? false, map.At)
        {
            Plane = map.Find(EndCut)?.Plane,
            Vent = map.Find(Vent),
        },
        CheckEnd);

    private static readonly Key<EndCutSpec> FromEnd = new("from", End, "the cut at the `from` end", "{cut: square}");

    private static readonly Key<EndCutSpec> ToEnd = new("to", End, "the cut at the `to` end", "{gap: 0.2 mm}");

    private static readonly Key<IReadOnlyList<Hinges>> HingeFrom = new(
        "from", HingeAxes(Hinges.StartX, Hinges.StartY, Hinges.StartZ), "moments not carried at the `from` end", "[ry, rz]");

    private static readonly Key<IReadOnlyList<Hinges>> HingeTo = new(
        "to", HingeAxes(Hinges.EndX, Hinges.EndY, Hinges.EndZ), "moments not carried at the `to` end", "[ry]");

    private static readonly Key<AxisEnd> From = new("from", EndPoint, "where its axis begins", "front-l") { IsRequired = true };

    private static readonly Key<AxisEnd> To = new("to", EndPoint, "where its axis ends", "rear-l") { IsRequired = true };

    private static readonly Key<Placed<string>> Group = new("group", GroupName, "the group whose section it has", "rails") { IsRequired = true };

    private static readonly Key<IReadOnlyList<Placed<string>>> Via =
        new("via", Names("nodes", NodeName, 1), "nodes where it bends, in their order along the tube", "[elbow]");

    private static readonly Key<SpecQuantity> BendRadius =
        new("bend_radius", Positive(QuantityKind.Length), "of the centre line, at every bend", "100 mm");

    private static readonly Key<Direction> Up = new("up", AxisDirection, "direction of the top line, clock angle 0", "x");

    private static readonly Key<Placed<Hinges>> Hinge = new(
        "hinge",
        new MapForm<Placed<Hinges>>(
            "a hinge",
            [HingeFrom, HingeTo],
            map => new Placed<Hinges>(map.Items(HingeFrom).Concat(map.Items(HingeTo)).Aggregate(Hinges.None, (all, one) => all | one), map.At),
            CheckHinge),
        "moments that its ends do not carry, about local axes",
        "{from: [ry, rz]}");

    private static readonly Key<TubeEndCuts> Ends = new(
        "ends",
        new MapForm<TubeEndCuts>("tube ends", [FromEnd, ToEnd], map => new TubeEndCuts(map.Find(FromEnd), map.Find(ToEnd))),
        "how its ends are cut",
        "{from: {cut: square}}");

    /// <summary>All tubes.</summary>
    public static readonly NamedForm<TubeSpec> Tubes = new(
        "tube",
        TubeName,
        new MapForm<TubeSpec>("a tube", [From, To, Group, Via, BendRadius, Up, Hinge, Ends], Tube, CheckTube),
        least: 1,
        most: MostTubes);

    private static TubeSpec Tube(MapReading map)
    {
        TubeEndCuts? cuts = map.Find(Ends);
        return new TubeSpec(
            map.Owner,
            End(map.Get(From), cuts?.From),
            End(map.Get(To), cuts?.To),
            map.Get(Group),
            map.Find(Up)?.Vector)
        {
            Hinges = map.Find(Hinge)?.Value ?? Hinges.None,
            Bend = map.Find(Via) is { } via ? new BendSpec(via, map.Get(BendRadius)) : null,
        };

        TubeEndSpec End(AxisEnd axis, EndCutSpec? cut) =>
            new(axis.Node, axis.Offset, cut ?? new EndCutSpec(RequestedCut.Default, null, null, Wrap: false, map.Owner.At));
    }

    private static void CheckEnd(MapReading map)
    {
        RequestedCut? cut = map.Find(EndCut)?.Cut;
        if (cut == RequestedCut.Cope && map.Has(Extend))
        {
            map.Error(map.PlaceOf(Extend), "'extend' moves a square or plane cut, and this end is coped; remove one of the two");
        }

        if (cut is RequestedCut.Square or RequestedCut.Plane && map.Has(EndGap))
        {
            string kind = cut == RequestedCut.Square ? "square" : "cut on a plane";
            map.Error(map.PlaceOf(EndGap), $"'gap' is left between a coped end and its mates, and this end is {kind}; remove one of the two");
        }
    }

    private static ListForm<Hinges> HingeAxes(Hinges x, Hinges y, Hinges z) => new(
        "moments (rx, ry, rz)",
        new WordForm<Hinges>([("rx", x), ("ry", y), ("rz", z)]),
        1,
        3,
        axis => axis == x ? "rx" : axis == y ? "ry" : "rz");

    private static void CheckHinge(MapReading map)
    {
        map.AtLeastOne(HingeFrom, HingeTo);
        if (map.Items(HingeFrom).Contains(Hinges.StartX) && map.Items(HingeTo).Contains(Hinges.EndX))
        {
            map.Error(map.PlaceOf(HingeTo), "with 'rx' at both ends the tube can spin about its own axis; leave it out at one end");
        }
    }

    private static void CheckTube(MapReading map)
    {
        if (map.Has(Via) != map.Has(BendRadius))
        {
            (Key written, Key missing) = map.Has(Via) ? ((Key)Via, (Key)BendRadius) : (BendRadius, Via);
            map.Error(map.PlaceOf(written), $"'{written.Name}' needs '{missing.Name}' beside it");
        }

        if (map.Find(From) is { Offset: null } from
            && map.Find(To) is { Offset: null } to
            && string.Equals(from.Node.Value, to.Node.Value, StringComparison.OrdinalIgnoreCase))
        {
            map.Error(to.Node.At, $"tube '{map.Owner.Value}' begins and ends at node '{to.Node.Value}'; give it two nodes");
        }
    }

    /// <summary>How an end is to be cut, and the normal of the plane for a plane cut.</summary>
    private sealed record CutChoice(RequestedCut Cut, SpecVector? Plane);

    /// <summary>A node, and how far from it the axis ends.</summary>
    private sealed record AxisEnd(Placed<string> Node, SpecVector? Offset);

    /// <summary>What is written of a tube's two ends.</summary>
    private sealed record TubeEndCuts(EndCutSpec? From, EndCutSpec? To);
}
