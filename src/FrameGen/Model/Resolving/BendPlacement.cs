using FrameGen.Geometry;

namespace FrameGen.Model.Resolving;

/// <summary>Rounds the corners of bent tubes, and says why where that can't be done. Each tube is looked at once.</summary>
/// <param name="frame">The tubes.</param>
/// <param name="values">Evaluates; takes the errors.</param>
internal sealed class BendPlacement(FrameDraft frame, SpecValues values)
{
    // Turns below a degree are a tube that was meant to be straight; within a degree of half a turn no bender follows.
    private const double LeastTurn = Math.PI / 180;

    private readonly Dictionary<int, TubePath?> _paths = [];

    /// <summary>The axis of a bent tube; null for a straight one, after an error, and before its nodes have their places.</summary>
    /// <param name="tube">Number of the tube.</param>
    /// <param name="ends">Both ends of its axis, mm.</param>
    /// <param name="positionOf">Where nodes are, mm.</param>
    public TubePath? PathOf(int tube, (Vector3 From, Vector3 To)? ends, Func<int, Vector3?> positionOf)
    {
        TubeDraft draft = frame.Tubes[tube];
        if (draft.Via.Count == 0 || ends is not { } axis || draft.Via.Any(v => v is null || positionOf(v.Value) is null))
        {
            return null;
        }

        if (!_paths.TryGetValue(tube, out TubePath? path))
        {
            path = Round(draft, [axis.From, .. draft.Via.Select(v => positionOf(v!.Value)!.Value), axis.To]);
            _paths.Add(tube, path);
        }

        return path;
    }

    private TubePath? Round(TubeDraft draft, Vector3[] corners)
    {
        string[] names = [NameOf(draft.From), .. draft.Via.Select(NameOf), NameOf(draft.To)];
        if (values.Positive(draft.Spec.Bend!.Radius, $"tube {draft.Name}: bend_radius") is not { } radius)
        {
            return null;
        }

        for (int i = 1; i < corners.Length; i++)
        {
            if (!((corners[i] - corners[i - 1]).Length > NodePlacement.Near))
            {
                return Refuse(draft, $"{names[i - 1]} and {names[i]} are at the same place; leave one of them out of via");
            }
        }

        var tangents = new double[corners.Length];
        for (int i = 1; i + 1 < corners.Length; i++)
        {
            double turn = (corners[i] - corners[i - 1]).AngleTo(corners[i + 1] - corners[i]);
            if (turn < LeastTurn)
            {
                return Refuse(draft, $"it does not bend at {names[i]}, which lies in line between {names[i - 1]} and {names[i + 1]}; leave {names[i]} out of via");
            }

            if (turn > Math.PI - LeastTurn)
            {
                return Refuse(draft, $"it turns straight back at {names[i]}; bend it in two corners, such as a U has");
            }

            tangents[i] = TubePath.Tangent(radius, turn);
        }

        for (int i = 1; i < corners.Length; i++)
        {
            double side = (corners[i] - corners[i - 1]).Length;
            double needed = tangents[i - 1] + tangents[i];
            if (needed > side)
            {
                string which = tangents[i - 1] > 0 && tangents[i] > 0
                    ? $"the bends at {names[i - 1]} and {names[i]} overlap"
                    : $"the bend at {(tangents[i] > 0 ? names[i] : names[i - 1])} reaches beyond {(tangents[i] > 0 ? names[i - 1] : names[i])}";
                double most = radius * side / needed;
                return Refuse(
                    draft,
                    $"{which}: with a radius of {radius:0.###} mm they need {needed:0.###} mm, and it is {side:0.###} mm from {names[i - 1]} to {names[i]}; "
                    + $"a bend_radius of up to {Math.Floor(most):0} mm fits there");
            }
        }

        return TubePath.Through(corners, radius);
    }

    // What is wrong with the original need not be said of its twin again.
    private TubePath? Refuse(TubeDraft draft, string why)
    {
        if (draft.Original is null)
        {
            values.Diagnostics.Error(draft.At, $"tube {draft.Name}: {why}");
        }

        return null;
    }

    private string NameOf(int? node) => node is { } number ? frame.Nodes[number].Name : "its end";
}
