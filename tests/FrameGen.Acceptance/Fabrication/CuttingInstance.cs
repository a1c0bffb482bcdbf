using System.Globalization;
using System.Text.Json;
using FrameGen.Acceptance.Builds;
using FrameGen.Fabrication.Cutting;

namespace FrameGen.Acceptance.Fabrication;

/// <summary>Reads the instances kept beside this file; their sources are in the README there.</summary>
internal static class CuttingInstance
{
    public static CuttingProblem Published(string file)
    {
        string[] lines = File.ReadAllLines(PathOf(file));
        if (file.EndsWith(".csp.txt", StringComparison.Ordinal))
        {
            return new CuttingProblem(Number(lines[1]), lines.Skip(2).Where(l => l.Length > 0).Select(Row), []);
        }

        string[] head = lines[1].Split(' ', StringSplitOptions.RemoveEmptyEntries);
        return new CuttingProblem(
            Number(head[0]), lines.Skip(2).Where(l => l.Trim().Length > 0).Select(l => new PieceSize(Number(l), 1)), []);
    }

    /// <summary>A shop's list in micrometres, the kerf added to pieces and bar.</summary>
    public static CuttingProblem ShopList(string name)
    {
        using JsonDocument document = JsonDocument.Parse(File.ReadAllBytes(PathOf("shop-lists.json")));
        JsonElement list = document.RootElement.GetProperty("instances").EnumerateArray().Single(i => i.GetProperty("name").ValueEquals(name));
        long kerf = list.GetProperty("kerf").GetInt64();
        return new CuttingProblem(
            (list.GetProperty("stock").GetInt64() + kerf) * 1000,
            list.GetProperty("pieces").EnumerateArray().Select(
                p => new PieceSize((p.GetProperty("length").GetInt64() + kerf) * 1000, p.GetProperty("qty").GetInt32())),
            []);
    }

    private static string PathOf(string file) => Repository.PathOf("tests", "FrameGen.Acceptance", "Fabrication", "Instances", file);

    private static PieceSize Row(string line)
    {
        string[] cells = line.Split('\t');
        return new PieceSize(Number(cells[0]), (int)Number(cells[1]));
    }

    private static long Number(string text) => long.Parse(text, CultureInfo.InvariantCulture);
}
