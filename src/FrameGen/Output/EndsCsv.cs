using FrameGen.Fabrication;
using FrameGen.Joints;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>ends.csv: one row a mate of each tube end, one row for an end that nothing cuts.</summary>
internal static class EndsCsv
{
    /// <summary>Writes the table, tubes in the order of the spec.</summary>
    public static string Write(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        string[] marks = PartMarks.ByTube(package);
        var table = new CsvTable(
            "tube", "end", "mark", "cut", "mate", "angle_deg", "offset_mm", "clock_deg", "saw_mm", "gap_mm");
        foreach (CutTube tube in package.Cut.Tubes)
        {
            foreach (End end in (ReadOnlySpan<End>)[End.From, End.To])
            {
                WriteEnd(table, package, tube, end, marks[tube.Tube], model);
            }
        }

        return table.ToString();
    }

    private static void WriteEnd(CsvTable table, ShopPackage package, CutTube tube, End end, string mark, FrameModel model)
    {
        EndCut cut = tube[end];
        string name = model.Tubes[tube.Tube].Name;
        string gap = cut.Kind == CutKind.Cope ? FixedDigits.Length(cut.Gap) : string.Empty;
        if (cut.Contacts.Count == 0)
        {
            table.Row(
                name, EndText.Name(end), mark, EndText.Kind(cut.Kind), string.Empty, string.Empty, string.Empty, string.Empty, string.Empty, gap);
        }

        for (int i = 0; i < cut.Contacts.Count; i++)
        {
            Contact mate = cut.Contacts[i];
            table.Row(
                name,
                EndText.Name(end),
                mark,
                EndText.Kind(cut.Kind),
                model.Tubes[mate.Tube].Name,
                FixedDigits.Angle(double.RadiansToDegrees(mate.Angle)),
                FixedDigits.Length(mate.Offset),
                mate.Clock is { } clock
                    ? FixedDigits.Clock(double.RadiansToDegrees(clock), mate.SquareCrossing ? 180 : 360)
                    : string.Empty,
                i == 0 && HoleSaw.Of(package.Cut.Sized, cut) is { } saw ? FixedDigits.Length(saw) : string.Empty,
                gap);
        }
    }
}
