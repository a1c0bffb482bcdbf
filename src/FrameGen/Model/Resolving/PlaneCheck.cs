using FrameGen.Diagnostics;
using FrameGen.Geometry;

namespace FrameGen.Model.Resolving;

/// <summary>Single nodes belong on the mirror plane, and nodes with a twin off it.</summary>
internal static class PlaneCheck
{
    /// <summary>Reports every node on the wrong side of that rule.</summary>
    public static void Run(FrameDraft frame, NodePlacement nodes, Reflection mirror, DiagnosticList diagnostics)
    {
        for (int node = 0; node < frame.Nodes.Count; node++)
        {
            NodeDraft draft = frame.Nodes[node];
            if (draft.Original is null && nodes.PositionOf(node) is { } position)
            {
                Check(draft, position, frame, mirror, diagnostics);
            }
        }
    }

    private static void Check(NodeDraft node, Vector3 position, FrameDraft frame, Reflection mirror, DiagnosticList diagnostics)
    {
        double distance = mirror.Distance(position);
        if (mirror.HasTwin(node.Name))
        {
            if (Math.Abs(distance) <= NodePlacement.Near / 2)
            {
                diagnostics.Error(
                    node.At,
                    $"node {node.Name} lies on the mirror plane ({mirror.Axis} = 0), where its twin {mirror.TwinOf(node.Name)} would be too; "
                    + $"name it without the ending {mirror.Ending}");
            }

            return;
        }

        bool isWrittenTwin = mirror.OriginalOf(node.Name) is { } original && frame.NodeNames.Find(original) is not null;
        if (!isWrittenTwin && Math.Abs(distance) > Lengths.Same)
        {
            diagnostics.Error(
                node.At,
                $"node {node.Name} stays single, since its name does not end with {mirror.Ending}, and must lie on the mirror plane; "
                + $"it is at {mirror.Axis} = {distance:G9} mm; move it to {mirror.Axis} = 0 or give its name the ending {mirror.Ending}");
        }
    }
}
