using System.Globalization;
using System.Text;
using FrameGen.Fabrication;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output;

/// <summary>The file that pins a frame's sizes, for people to read and for the spec's reader.</summary>
internal static class FrozenText
{
    /// <summary>Writes the file.</summary>
    /// <param name="sized">The frame whose sizes are pinned.</param>
    /// <param name="package">Its parts; null where its ends can't be cut.</param>
    /// <returns>UTF-8 text with <c>\n</c> at the ends of lines, the same for the same frame and version.</returns>
    public static byte[] Write(SizedFrame sized, ShopPackage? package)
    {
        SpecIdentity spec = sized.Model.Spec;
        var text = new StringBuilder();
        Line(text, $"# The sizes of the frame in {spec.FileName}, pinned by `framegen freeze`: {Mass(sized.MassKg)} kg on axis lengths, {Words(sized)}.");
        Line(text, $"# While this file lies beside the spec, it is built with these sizes; every target is checked with them.");
        Line(text, $"# Keep it with the spec. Without it sizes are chosen again.");
        Line(text, $"framegen: 1");
        Line(text, $"freezes:");
        Line(text, $"  spec: {Quoted(spec.FileName)}");
        Line(text, $"  sha256: {Quoted(spec.Sha256)}");
        Line(text, $"  tool: {ToolIdentity.Name} {ToolIdentity.Version}");
        WriteStock(text, sized);
        WriteGroups(text, sized);
        if (package is not null)
        {
            WriteMarks(text, package);
        }

        return Encoding.UTF8.GetBytes(text.ToString());
    }

    private static void WriteStock(StringBuilder text, SizedFrame sized)
    {
        string[] used = [.. sized.Chosen.Select(c => c.StockList).Where(l => l.Length > 0).Distinct(StringComparer.Ordinal)];
        if (used.Length == 0)
        {
            return;
        }

        Line(text, $"stock:                  # the lists the sizes came from, by what they held");
        foreach (StockVersion list in sized.Model.Stock.Where(s => used.Contains(s.List, StringComparer.Ordinal)))
        {
            Line(text, $"  {list.List}: {Quoted(list.Version)}");
        }
    }

    private static void WriteGroups(StringBuilder text, SizedFrame sized)
    {
        Line(text, $"groups:");
        int name = sized.Model.Groups.Max(g => g.Name.Length) + 1;
        int material = sized.Model.Groups.Max(g => Quoted(g.Material.Name).Length) + 1;
        int section = sized.Chosen.Max(c => c.Nominal.Name.Length);
        for (int g = 0; g < sized.Model.Groups.Count; g++)
        {
            TubeGroup group = sized.Model.Groups[g];
            Candidate chosen = sized.Chosen[g];
            string size = chosen.StockList.Length == 0
                ? $"section: {chosen.Nominal.Name}}}"
                : $"section: {(chosen.Nominal.Name + ",").PadRight(section + 1)} stock: {chosen.StockList}}}";
            Line(text, $"  {(group.Name + ":").PadRight(name)} {{material: {(Quoted(group.Material.Name) + ",").PadRight(material)} {size}");
        }
    }

    private static void WriteMarks(StringBuilder text, ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        Line(text, $"marks:                  # the part that each tube was");
        int name = model.Tubes.Max(t => t.Name.Length) + 1;
        foreach ((int tube, string mark) in package.Parts.SelectMany(p => p.Tubes.Select(t => (t, p.Name))).OrderBy(p => p.t))
        {
            Line(text, $"  {(model.Tubes[tube].Name + ":").PadRight(name)} {mark}");
        }
    }

    private static string Words(SizedFrame sized) => sized.Status switch
    {
        not SizingStatus.Unmet when sized.Model.Frozen is not null => "chosen beside sizes that were pinned before",
        SizingStatus.Fixed => "given by the spec",
        SizingStatus.ProvenLightest => "proven lightest",
        SizingStatus.BestFound => "the best found",
        _ => "NOT MEETING TARGETS",
    };

    private static string Mass(double kg) => kg.ToString("0.000", CultureInfo.InvariantCulture);

    // A name such as 1.4301, or a hash of digits alone, would be a number to other readers.
    private static string Quoted(string word) => char.IsAsciiLetter(word[0]) && word.All(c => char.IsAsciiLetterOrDigit(c) || c is '-' or '_' or '.' or '+') ? word : $"'{word.Replace("'", "''", StringComparison.Ordinal)}'";

    private static void Line(StringBuilder text, string line) => text.Append(line).Append('\n');
}
