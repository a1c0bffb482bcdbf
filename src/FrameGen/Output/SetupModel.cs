using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Fabrication.Setup;
using FrameGen.Joints;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>What the set-up page's template can print; names in the template are these in snake case.</summary>
/// <param name="Head">What stands on top of every paper.</param>
/// <param name="TableZ">z of the table, with its unit.</param>
/// <param name="Nodes">In the order of the spec.</param>
/// <param name="Tubes">In the order of the spec.</param>
/// <param name="Measures">Distances to measure, centre to centre.</param>
/// <param name="Joints">Joints of two tubes and more.</param>
/// <param name="Cautions">Sentences.</param>
public sealed record SetupModel(
    PaperHead Head,
    string TableZ,
    IReadOnlyList<SetupNode> Nodes,
    IReadOnlyList<SetupTube> Tubes,
    IReadOnlyList<SetupMeasure> Measures,
    IReadOnlyList<SetupJoint> Joints,
    IReadOnlyList<string> Cautions)
{
    /// <summary>Takes it from the shop's package.</summary>
    public static SetupModel From(ShopPackage package)
    {
        SizedFrame sized = package.Cut.Sized;
        FrameModel model = sized.Model;
        var display = new DisplayFormat(model.Display);
        SetupPlan plan = SetupPlanner.Plan(sized);
        string[] marks = PartMarks.ByTube(package);
        return new SetupModel(
            PaperHead.Of(sized),
            display.MeasuredLength(plan.TableZ),
            [.. plan.Nodes.Select(n => SetupNode.From(sized, n, display))],
            [.. plan.Tubes.Select(t => SetupTube.From(model, t, marks[t.Tube], display))],
            SetupMeasure.Of(model, plan.Measures, display),
            [.. plan.Joints.Select(j => SetupJoint.From(package.Cut, j))],
            Output.Cautions.All);
    }
}

/// <summary>A node in the jig.</summary>
/// <param name="Name">Of the node.</param>
/// <param name="X">From the datum.</param>
/// <param name="Y">From the datum.</param>
/// <param name="Z">From the datum.</param>
/// <param name="Height">Of its centre above the table.</param>
/// <param name="Block">Of a flat block under the tube that stands first there; empty where that is not level.</param>
/// <param name="Under">Which tube that is; empty where there is no block.</param>
/// <param name="On">Where on a tube it lies, <c>rail-l, 396.0 from front-l</c>; empty for a node at tubes' ends.</param>
public sealed record SetupNode(string Name, string X, string Y, string Z, string Height, string Block, string Under, string On)
{
    internal static SetupNode From(SizedFrame sized, JigNode node, DisplayFormat display)
    {
        Node at = sized.Model.Nodes[node.Node];
        return new SetupNode(
            at.Name,
            display.MeasuredNumber(at.Position.X),
            display.MeasuredNumber(at.Position.Y),
            display.MeasuredNumber(at.Position.Z),
            display.MeasuredNumber(node.Height),
            node.Block is { } block ? display.MeasuredNumber(block) : string.Empty,
            node.Block is null ? string.Empty : sized.Model.Tubes[sized.Joints[node.Node].Tubes.First()].Name,
            at.Through is { } through ? Place(sized.Model, through, at.ThroughDistance, display) : string.Empty);
    }

    private static string Place(FrameModel model, int tube, double distance, DisplayFormat display) =>
        $"{model.Tubes[tube].Name}, {display.MeasuredNumber(distance)} from {model.Nodes[model.Tubes[tube].From.Node].Name}";
}

/// <summary>A tube in the jig.</summary>
/// <param name="Name">Of the tube.</param>
/// <param name="Mark">Of its part.</param>
/// <param name="FromNode">Node at its from end.</param>
/// <param name="ToNode">Node at its to end.</param>
/// <param name="Length">Of its axis, centre to centre.</param>
/// <param name="Rise">Angle to the table, degrees; positive where it rises from <c>from</c> to <c>to</c>.</param>
/// <param name="Bearing">Angle of its plan from x towards y, degrees; empty for an upright tube.</param>
public sealed record SetupTube(string Name, string Mark, string FromNode, string ToNode, string Length, string Rise, string Bearing)
{
    internal static SetupTube From(FrameModel model, JigTube jig, string mark, DisplayFormat display)
    {
        Tube tube = model.Tubes[jig.Tube];
        return new SetupTube(
            tube.Name,
            mark,
            model.Nodes[tube.From.Node].Name,
            model.Nodes[tube.To.Node].Name,
            display.MeasuredNumber(jig.Length),
            FixedDigits.Tenths(double.RadiansToDegrees(jig.Rise)),
            jig.Bearing is { } bearing ? FixedDigits.Tenths(Math.Round(double.RadiansToDegrees(bearing), 1) % 360) : string.Empty);
    }
}

/// <summary>A distance between two nodes, centre to centre.</summary>
/// <param name="Nodes">The two, <c>front-l to rear-r</c>.</param>
/// <param name="Reads">What it must read.</param>
/// <param name="Why">What it is: <c>diagonal of front-l, front-r, rear-r, rear-l</c>, <c>twins</c>, <c>across</c>.</param>
/// <param name="Note">What else to look for; may be empty.</param>
public sealed record SetupMeasure(string Nodes, string Reads, string Why, string Note)
{
    internal static IReadOnlyList<SetupMeasure> Of(FrameModel model, IReadOnlyList<SquaringMeasure> measures, DisplayFormat display)
    {
        const double Same = 0.0005;
        var rows = new List<SetupMeasure>();
        SquaringMeasure? before = null;
        foreach (SquaringMeasure measure in measures)
        {
            bool isSecond = before is not null && measure.Kind == SquaringKind.Diagonal && ReferenceEquals(measure.Bay, before.Bay);
            rows.Add(new SetupMeasure(
                $"{model.Nodes[measure.A].Name} to {model.Nodes[measure.B].Name}",
                display.MeasuredNumber(measure.Distance),
                measure.Kind switch
                {
                    SquaringKind.Diagonal => "diagonal of " + string.Join(", ", measure.Bay.Select(n => model.Nodes[n].Name)),
                    SquaringKind.Twins => "twins",
                    _ => "across",
                },
                isSecond && Math.Abs(measure.Distance - before!.Distance) <= Same ? "equal to the one above" : string.Empty));
            before = measure;
        }

        return rows;
    }
}

/// <summary>A joint in the order of fitting.</summary>
/// <param name="Node">Its name.</param>
/// <param name="Steps">One a tube.</param>
public sealed record SetupJoint(string Node, IReadOnlyList<SetupStep> Steps)
{
    internal static SetupJoint From(CutFrame cut, JointSetup joint)
    {
        FrameModel model = cut.Sized.Model;
        var before = new List<string>();
        var steps = new List<SetupStep>();
        foreach (JointStep step in joint.Steps)
        {
            string name = model.Tubes[step.Tube].Name;
            steps.Add(new SetupStep(
                (steps.Count + 1).ToString(CultureInfo.InvariantCulture),
                name,
                step.End is { } end ? $"{EndText.Name(end)} end" : "runs through",
                step.End is { } at ? EndText.Kind(cut.Tubes[step.Tube][at].Kind) : string.Empty,
                string.Join(", ", step.Angles.Zip(before, (angle, other) => $"{other} {FixedDigits.Tenths(double.RadiansToDegrees(angle))}"))));
            before.Add(name);
        }

        return new SetupJoint(model.Nodes[joint.Node].Name, steps);
    }
}

/// <summary>A tube as it comes to a joint.</summary>
/// <param name="Number">1 for the first.</param>
/// <param name="Tube">Its name.</param>
/// <param name="At">Which end, or that it runs through.</param>
/// <param name="Cut">Kind of cut; empty where it runs through.</param>
/// <param name="Angles">To each tube that stands there already, degrees.</param>
public sealed record SetupStep(string Number, string Tube, string At, string Cut, string Angles);
