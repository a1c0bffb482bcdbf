using FrameGen.Geometry;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Fabrication.Setup;

/// <summary>Works out heights, angles, order and squaring measures from a sized frame.</summary>
public static class SetupPlanner
{
    private const double LevelSine = 0.0175; // 1 degree
    private const double UprightCosine = 1e-9;

    /// <summary>Plans the set-up.</summary>
    public static SetupPlan Plan(SizedFrame sized)
    {
        FrameModel model = sized.Model;
        double table = TableOf(sized);
        return new SetupPlan(
            table,
            [.. sized.Joints.Select(j => NodeOf(sized, j, table))],
            [.. model.Tubes.Select((tube, index) => TubeOf(tube, index))],
            SquaringPlan.Of(model),
            [.. sized.Joints.Where(j => j.Tubes.Skip(1).Any()).Select(j => JointOf(model, j))]);
    }

    // How far the skin reaches below the axis at the end of a tube: all of its half width when it is level, nothing when it is upright.
    private static double TableOf(SizedFrame sized)
    {
        double table = double.PositiveInfinity;
        foreach (NodeJoint joint in sized.Joints)
        {
            double z = sized.Model.Nodes[joint.Node].Position.Z;
            foreach (int tube in joint.Tubes)
            {
                table = Math.Min(table, z - Drop(sized, tube, joint.Node));
            }
        }

        return double.IsFinite(table) ? table : 0;
    }

    // Half the width of the section seen along the table: the tube's outline, in the direction that points down most.
    private static double Drop(SizedFrame sized, int tube, int node)
    {
        TubeAxes axes = sized.Model.StraightAt(tube, node).Axes;
        double up = Math.Sqrt((axes.Z.Z * axes.Z.Z) + (axes.Y.Z * axes.Y.Z));
        return up <= UprightCosine ? 0 : up * sized.SectionOf(tube).Outline.HalfWidthAlong(new Point2(axes.Z.Z / up, -axes.Y.Z / up));
    }

    private static JigNode NodeOf(SizedFrame sized, NodeJoint joint, double table)
    {
        double height = sized.Model.Nodes[joint.Node].Position.Z - table;
        int[] first = [.. joint.Tubes.Take(1)];
        bool isLevel = first is [var tube] && Math.Abs(sized.Model.StraightAt(tube, joint.Node).Axes.X.Z) <= LevelSine;
        return new JigNode(joint.Node, height, isLevel ? height - Drop(sized, first[0], joint.Node) : null);
    }

    private static JigTube TubeOf(Tube tube, int index)
    {
        Vector3 along = tube.Axes.X;
        double plan = Math.Sqrt((along.X * along.X) + (along.Y * along.Y));
        double bearing = Math.Atan2(along.Y, along.X);
        return new JigTube(
            index,
            tube.Length,
            Math.Atan2(along.Z, plan),
            plan <= UprightCosine ? null : bearing < 0 ? bearing + (2 * Math.PI) : bearing);
    }

    private static JointSetup JointOf(FrameModel model, NodeJoint joint)
    {
        var steps = new List<JointStep>();
        var before = new List<(Vector3 Direction, bool IsThrough)>();
        foreach (int tube in joint.Tubes)
        {
            bool isThrough = tube == joint.Through;
            End? end = isThrough ? null : joint.Ends.First(e => e.Tube == tube).End;
            Vector3 direction = end is { } at ? model.Tubes[tube].Into(at) : model.StraightAt(tube, joint.Node).Axes.X;
            steps.Add(new JointStep(tube, end, [.. before.Select(b => Angle(b.Direction, direction, b.IsThrough || isThrough))]));
            before.Add((direction, isThrough));
        }

        return new JointSetup(joint.Node, steps);
    }

    private static double Angle(Vector3 a, Vector3 b, bool isThrough)
    {
        double angle = a.AngleTo(b);
        return isThrough && angle > Math.PI / 2 ? Math.PI - angle : angle;
    }
}
