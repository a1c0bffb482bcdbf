using System.Globalization;
using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Model;

namespace FrameGen.Benchmarks.Sizing;

/// <summary>Square towers of invented sizes: 12 tubes a storey, three groups a section of storeys, each with as many candidates.</summary>
internal static class InventedTower
{
    /// <summary>The frame.</summary>
    /// <param name="storeys">Twelve tubes each.</param>
    /// <param name="groups">A multiple of three.</param>
    /// <param name="candidates">A group.</param>
    /// <param name="targets">Lines of the spec's targets.</param>
    public static FrameModel Make(int storeys, int groups, int candidates, params string[] targets)
    {
        var text = new StringBuilder("framegen: 1\nnodes:\n");
        for (int level = 0; level <= storeys; level++)
        {
            double half = 400 - (200.0 * level / storeys);
            foreach ((string corner, int x, int y) in (ReadOnlySpan<(string, int, int)>)[("a", 1, 1), ("b", -1, 1), ("c", -1, -1), ("d", 1, -1)])
            {
                text.Append(CultureInfo.InvariantCulture, $"  {corner}{level}: [{x * half:0.###} mm, {y * half:0.###} mm, {600 * level} mm]\n");
            }
        }

        text.Append("tubes:\n");
        for (int level = 0; level < storeys; level++)
        {
            int section = level * (groups / 3) / storeys;
            string[] corners = ["a", "b", "c", "d"];
            for (int i = 0; i < 4; i++)
            {
                string next = corners[(i + 1) % 4];
                Tube($"leg-{corners[i]}{level}", $"{corners[i]}{level}", $"{corners[i]}{level + 1}", $"legs{section}");
                Tube($"ring-{corners[i]}{level}", $"{corners[i]}{level + 1}", $"{next}{level + 1}", $"rings{section}");
                Tube($"brace-{corners[i]}{level}", $"{corners[i]}{level}", $"{next}{level + 1}", $"braces{section}");
            }
        }

        text.Append(CultureInfo.InvariantCulture, $"stock:\n  invented:\n    material: [S235]\n    sizes: [{string.Join(", ", Sizes(candidates))}]\ngroups:\n");
        foreach (string kind in (ReadOnlySpan<string>)["legs", "rings", "braces"])
        {
            for (int section = 0; section < groups / 3; section++)
            {
                text.Append(CultureInfo.InvariantCulture, $"  {kind}{section}: {{material: S235, choose: {{stock: invented}}}}\n");
            }
        }

        // The legs stand first at every node, in line.
        text.Append("joints:\n");
        for (int level = 1; level < storeys; level++)
        {
            foreach (string corner in (ReadOnlySpan<string>)["a", "b", "c", "d"])
            {
                text.Append(CultureInfo.InvariantCulture, $"  {corner}{level}: {{order: [leg-{corner}{level - 1}, leg-{corner}{level}]}}\n");
            }
        }

        text.Append("supports: {a0: {hold: [x, y, z]}, b0: {hold: [x, y, z]}, c0: {hold: [x, y, z]}, d0: {hold: [x, y, z]}}\n");
        text.Append(CultureInfo.InvariantCulture, $"cases:\n  wind: {{self_weight: [0, 0, -1], loads: [{{node: a{storeys}, force: [400 N, 100 N, -800 N]}}, {{node: c{storeys}, force: [400 N, 0 N, -800 N]}}]}}\n");
        text.Append("targets:\n");
        foreach (string target in targets)
        {
            text.Append(CultureInfo.InvariantCulture, $"  - {target.Replace("TOP", storeys.ToString(CultureInfo.InvariantCulture), StringComparison.Ordinal)}\n");
        }

        DiagnosticList diagnostics = [];
        byte[] bytes = Encoding.UTF8.GetBytes(text.ToString());
        var pipeline = new FramePipeline(diagnostics);
        return pipeline.Resolve(pipeline.Read("tower.yaml", path => string.Equals(Path.GetFileName(path), "tower.yaml", StringComparison.Ordinal) ? bytes : null))
            ?? throw new InvalidOperationException(string.Join('\n', diagnostics));

        void Tube(string name, string from, string to, string group) =>
            text.Append(CultureInfo.InvariantCulture, $"  {name}: {{from: {from}, to: {to}, group: {group}, ends: {{from: {{wrap: true}}, to: {{wrap: true}}}}}}\n");
    }

    // The range is the same for any count, so that targets are within reach of few sizes as of many.
    private static IEnumerable<string> Sizes(int count)
    {
        const double Smallest = 16;
        const double Range = 27;
        double[] walls = [1, 1.5, 2, 2.5];
        int diameters = (count + walls.Length - 1) / walls.Length;
        for (int i = 0; i < count; i++)
        {
            double od = Math.Round(Smallest + (Range * (i / walls.Length) / Math.Max(1, diameters - 1)), 1);
            yield return string.Create(CultureInfo.InvariantCulture, $"round {od} x {walls[i % walls.Length]} mm");
        }
    }
}
