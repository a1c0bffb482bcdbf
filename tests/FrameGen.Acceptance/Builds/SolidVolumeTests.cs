using System.Globalization;
using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>Volumes of contour-cut tubes against booleans of a general-purpose geometry kernel: the cut face lies on the mates, so that they are one solid.</summary>
public class SolidVolumeTests
{
    private const double Beyond = 600;

    [Fact]
    public void Coped_tubes_have_the_volume_that_a_geometry_kernel_finds()
    {
        var kernel = new SolidKernel();
        var ours = new List<(string Name, double Volume)>();
        foreach (Node node in Nodes())
        {
            CutFrame cut = node.Cut();
            IReadOnlyList<Tube> tubes = cut.Sized.Model.Tubes;
            for (int i = 1; i < tubes.Count; i++)
            {
                string name = tubes.Count > 2 ? $"{node.Name}: tube {i + 1}" : node.Name;
                Section section = cut.Sized.SectionOf(i);
                IEnumerable<Prism> mates = Enumerable.Range(0, i).Select(k => Mate(cut.Sized, k, node.Past));
                kernel.AskVolume(name, new Prism(section, tubes[i].From.Point, tubes[i].Axes, tubes[i].Length), mates);
                ours.Add((name, cut.Tubes[i].Volume));
            }
        }

        Dictionary<string, double> volumes = kernel.Run();
        string[] wrong =
        [
            .. ours.Where(o => !(Math.Abs((o.Volume / volumes.GetValueOrDefault(o.Name)) - 1) <= 1e-5))
                .Select(o => string.Create(CultureInfo.InvariantCulture, $"{o.Name}: {o.Volume:R} for {volumes.GetValueOrDefault(o.Name):R} mm3")),
        ];
        Assert.True(wrong.Length == 0, string.Join('\n', wrong));
    }

    // The first tube lies along its whole length, or ends so far past the node; every other one begins at its own axis point.
    private static Prism Mate(SizedFrame sized, int index, double? past)
    {
        Tube tube = sized.Model.Tubes[index];
        Section section = sized.SectionOf(index);
        return index == 0
            ? new Prism(section, tube.From.Point, tube.Axes, tube.Length + (past ?? 0))
            : new Prism(section, tube.From.Point, tube.Axes, Beyond);
    }

    private static IEnumerable<Node> Nodes()
    {
        foreach (double angle in (double[])[90, 75, 60, 45, 35, 25])
        {
            foreach (double offset in (double[])[0, 3.5])
            {
                yield return new($"round on round at {angle} degrees, {offset} mm aside", "round 44.5 x 2 mm", 0, [new("round 38 x 1.5 mm", angle, offset)]);
            }
        }

        yield return new("equal rounds at 90 degrees", "round 38 x 1.5 mm", 0, [new("round 38 x 1.5 mm", 90)]);
        yield return new("equal rounds at 50 degrees", "round 38 x 3 mm", 0, [new("round 38 x 3 mm", 50)]);
        yield return new("rod on round", "round 30 x 2 mm", 0, [new("rod 16 mm", 55, 4)]);
        yield return new("square on square at 90 degrees", "square 50 x 3 mm", 0, [new("square 40 x 2 mm", 90)]);
        yield return new("square on square at 60 degrees", "square 50 x 3 mm", 0, [new("square 40 x 2 mm", 60, 2)]);
        yield return new("square on square, both turned", "square 60 x 3 mm", 30, [new("square 30 x 2 mm", 50, 2, Turn: 25)]);
        yield return new("square on the edge of a square", "square 60 x 4 mm corner 4 mm", 45, [new("square 25 x 2 mm", 70)]);
        yield return new("sharp square on sharp square", "square 60 x 3 mm corner 0 mm", 20, [new("square 30 x 2 mm corner 0 mm", 65, 1, Turn: 40)]);
        yield return new("rect on round at 90 degrees", "round 60.3 x 2.9 mm", 0, [new("rect 50 x 30 x 2 mm", 90)]);
        yield return new("rect on round at 40 degrees", "round 60.3 x 2.9 mm", 0, [new("rect 40 x 30 x 2 mm", 40, 3, Turn: 35)]);
        yield return new("round on square at 90 degrees", "square 50 x 3 mm", 0, [new("round 38 x 1.5 mm", 90)]);
        yield return new("round on square at 55 degrees", "square 50 x 3 mm", 30, [new("round 38 x 1.5 mm", 55, 4)]);
        yield return new("round on the side of an ellipse", "ellipse 60 x 40 x 2 mm", 70, [new("round 30 x 2 mm", 65, 2)]);
        yield return new("two rounds on a through round", "round 44.5 x 2 mm", 0, [new("round 38 x 1.5 mm", 60), new("round 32 x 1.5 mm", 110)]);
        yield return new("two rounds round a through round", "round 50 x 2 mm", 0, [new("round 40 x 2 mm", 50, 2), new("round 30 x 2 mm", 65, 0, Around: 50)]);
        yield return new("square and round on a through square", "square 60 x 3 mm", 0, [new("square 40 x 2 mm", 55), new("round 30 x 2 mm", 100)]);
        yield return new("round and rect on a through round", "round 70 x 3 mm", 0, [new("round 45 x 2 mm", 70), new("rect 40 x 25 x 2 mm", 120, 0, Around: 20, Turn: 15)]);
        yield return new("three rounds on a through round", "round 60.3 x 2.9 mm", 0, [new("round 45 x 2 mm", 90), new("round 38 x 1.5 mm", 45), new("round 30 x 1.5 mm", 130, 1, Around: 25)]);
        yield return new("round on the end of a round", "round 44.5 x 2 mm", 0, [new("round 38 x 1.5 mm", 65, 1)], Past: 30);
        yield return new("round on the end of a square", "square 50 x 3 mm", 15, [new("round 30 x 2 mm", 75, 3)], Past: 35);
    }

    /// <summary>Tubes that meet in one place.</summary>
    /// <param name="Name">For the report.</param>
    /// <param name="First">Section of the first one, which runs along x.</param>
    /// <param name="Roll">Of its top line about x, degrees.</param>
    /// <param name="Branches">The others in their order; each is cut to all before it.</param>
    /// <param name="Past">How far past the node the first one ends, mm; null where it runs through.</param>
    private sealed record Node(string Name, string First, double Roll, Branch[] Branches, double? Past = null)
    {
        private const string SpecPath = "node.yaml";

        public CutFrame Cut()
        {
            var text = new StringBuilder("framegen: 1\ntitle: Node\nfabrication: {cut: contour}\n");
            text.Append("nodes:\n  a: [-600 mm, 0 mm, 0 mm]\n  b: [600 mm, 0 mm, 0 mm]\n");
            text.Append(Past is null ? "  n: {on: first, distance: 600 mm}\n" : "  n: [0 mm, 0 mm, 0 mm]\n");
            foreach ((Branch branch, int i) in Branches.Select((b, i) => (b, i)))
            {
                text.Append(CultureInfo.InvariantCulture, $"  far-{i}: {{from: n, offset: {Words(400 * branch.Along)}}}\n");
            }

            double roll = Roll * Math.PI / 180;
            string up = Plain(new Vector3(0, Math.Sin(roll), Math.Cos(roll)));
            string end = Past is { } past ? Spec($"n, ends: {{to: {{extend: {past} mm}}}}") : "b";
            text.Append(CultureInfo.InvariantCulture, $"tubes:\n  first: {{from: a, to: {end}, group: first, up: {up}}}\n");
            foreach ((Branch branch, int i) in Branches.Select((b, i) => (b, i)))
            {
                string aside = Words(branch.Aside);
                text.Append(CultureInfo.InvariantCulture, $"  branch-{i}: {{from: {{node: n, offset: {aside}}}, to: {{node: far-{i}, offset: {aside}}}, group: branch-{i}, up: {Plain(branch.Up)}}}\n");
            }

            text.Append(CultureInfo.InvariantCulture, $"groups:\n  first: {{material: S235, section: {First}}}\n");
            foreach ((Branch branch, int i) in Branches.Select((b, i) => (b, i)))
            {
                text.Append(CultureInfo.InvariantCulture, $"  branch-{i}: {{material: S235, section: {branch.Section}}}\n");
            }

            string order = string.Join(", ", Branches.Select((_, i) => $"branch-{i}").Prepend("first"));
            text.Append(CultureInfo.InvariantCulture, $"joints:\n  n: {{order: [{order}]}}\n");

            var diagnostics = new DiagnosticList();
            FrameSpec? spec = SpecReader.Read(SpecPath, file => file == SpecPath ? Encoding.UTF8.GetBytes(text.ToString()) : null, diagnostics);
            FrameModel? model = spec is null ? null : ModelResolver.Resolve(spec, diagnostics);
            SizedFrame? sized = model is null ? null : FrozenSizing.Size(model, diagnostics);
            CutFrame? cut = sized is null ? null : EndCoper.Cope(sized, diagnostics);
            return cut ?? throw new InvalidOperationException($"{Name}\n{string.Join('\n', diagnostics)}\n{text}");
        }

        private static string Words(Vector3 v) => Spec($"[{v.X:R} mm, {v.Y:R} mm, {v.Z:R} mm]");

        private static string Plain(Vector3 v) => Spec($"[{v.X:R}, {v.Y:R}, {v.Z:R}]");

        private static string Spec(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
    }

    /// <summary>A tube that leaves the node.</summary>
    /// <param name="Section">In the words of the spec.</param>
    /// <param name="Degrees">From the first tube's direction.</param>
    /// <param name="Offset">Of its axis, along the common normal, mm.</param>
    /// <param name="Around">Of its axis about the first tube, degrees.</param>
    /// <param name="Turn">About its own axis, degrees.</param>
    private sealed record Branch(string Section, double Degrees, double Offset = 0, double Around = 0, double Turn = 0)
    {
        private Vector3 Out => new(0, Math.Sin(Around * Math.PI / 180), Math.Cos(Around * Math.PI / 180));

        public Vector3 Along => (Math.Cos(Degrees * Math.PI / 180) * Vector3.UnitX) + (Math.Sin(Degrees * Math.PI / 180) * Out);

        public Vector3 Aside => Offset * Vector3.UnitX.Cross(Out);

        public Vector3 Up
        {
            get
            {
                Vector3 side = Vector3.UnitX.Cross(Out);
                return (Math.Cos(Turn * Math.PI / 180) * Along.Cross(side)) + (Math.Sin(Turn * Math.PI / 180) * side);
            }
        }
    }
}
