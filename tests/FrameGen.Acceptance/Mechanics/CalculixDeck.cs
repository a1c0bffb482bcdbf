using System.Globalization;
using System.Text;
using FrameGen.Geometry;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>
/// A frame of round tubes as an input deck of calculix-ccx, and its answers. Each tube is a row of B32R elements with the pipe section, which the program
/// expands into solid bricks with 20 nodes; where tubes meet, their end faces are made one rigid body. N, mm, tonne.
/// </summary>
internal sealed class CalculixDeck
{
    private const double TonnePerKg = 1e-3;

    private readonly SizedFrame _sized;
    private readonly string _mesh;

    /// <summary>Divides the tubes.</summary>
    /// <param name="sized">Straight round tubes without offsets, hinges or nodes on them, of one metal.</param>
    /// <param name="elements">B32R elements a tube.</param>
    public CalculixDeck(SizedFrame sized, int elements)
    {
        _sized = sized;
        _mesh = Mesh(sized, elements);
    }

    /// <summary>Displacements and reactions of a case, by node of the frame, mm and N.</summary>
    public (Vector3[] Displacements, Vector3[] Reactions) Static(int loadCase)
    {
        string[] lines = Answer($"*STEP\n*STATIC\n{Loads(loadCase)}*NODE PRINT, NSET=JOINTS\nU, RF\n*END STEP\n");
        int forces = Array.FindIndex(lines, l => l.Contains("forces (fx,fy,fz)", StringComparison.Ordinal));
        return (Vectors(lines[..forces]), Vectors(lines[forces..]));
    }

    /// <summary>The lowest buckling factor of a case.</summary>
    public double Buckling(int loadCase)
    {
        // Two are asked for, to a millionth: the program's own default, a hundredth, shows.
        string[] lines = Answer($"*STEP\n*BUCKLE\n2, 1.E-6\n{Loads(loadCase)}*END STEP\n");
        int heading = Array.FindIndex(lines, l => l.Contains("B U C K L I N G   F A C T O R   O U T P U T", StringComparison.Ordinal));
        return Rows(lines[heading..]).First(r => r.Length == 2)[1];
    }

    /// <summary>The lowest natural frequencies, Hz.</summary>
    public double[] Frequencies(int count)
    {
        string[] lines = Answer(string.Create(CultureInfo.InvariantCulture, $"*STEP\n*FREQUENCY\n{count}\n*END STEP\n"));
        int heading = Array.FindIndex(lines, l => l.Contains("E I G E N V A L U E   O U T P U T", StringComparison.Ordinal));
        return [.. Rows(lines[heading..]).Where(r => r.Length == 5).Take(count).Select(r => r[3])];
    }

    private static string Mesh(SizedFrame sized, int elements)
    {
        FrameModel model = sized.Model;
        var nodes = new StringBuilder("*NODE\n");
        var tubes = new StringBuilder();
        var sections = new StringBuilder();
        for (int n = 0; n < model.Nodes.Count; n++)
        {
            AppendNode(nodes, n + 1, model.Nodes[n].Position);
        }

        int node = model.Nodes.Count;
        int element = 0;
        for (int t = 0; t < model.Tubes.Count; t++)
        {
            Tube tube = model.Tubes[t];
            var round = (RoundTube)sized.SectionOf(t);
            int last = tube.From.Node + 1;
            tubes.Append(CultureInfo.InvariantCulture, $"*ELEMENT, TYPE=B32R, ELSET=T{t}\n");
            for (int e = 0; e < elements; e++)
            {
                int middle = Next((e + 0.5) / elements);
                int end = e + 1 == elements ? tube.To.Node + 1 : Next((e + 1.0) / elements);
                tubes.Append(CultureInfo.InvariantCulture, $"{++element}, {last}, {middle}, {end}\n");
                last = end;
            }

            sections.Append(CultureInfo.InvariantCulture, $"*BEAM SECTION, ELSET=T{t}, MATERIAL=METAL, SECTION=PIPE\n{Number(round.OutsideDiameter / 2)}, {Number(round.Wall)}\n{Triple(tube.Axes.Y)}\n");

            int Next(double share)
            {
                AppendNode(nodes, ++node, tube.From.Point + (share * tube.Length * tube.Axes.X));
                return node;
            }
        }

        Material metal = model.Groups[0].Material;
        var held = new StringBuilder("*BOUNDARY\n");
        foreach (Support support in model.Supports)
        {
            for (int freedom = 0; freedom < 6; freedom++)
            {
                held.Append(support.Held[freedom] ? string.Create(CultureInfo.InvariantCulture, $"{support.Node + 1}, {freedom + 1}, {freedom + 1}\n") : string.Empty);
            }
        }

        return $"{nodes}{tubes}*NSET, NSET=JOINTS, GENERATE\n1, {model.Nodes.Count}\n*MATERIAL, NAME=METAL\n*ELASTIC\n{Number(metal.E)}, {Number(metal.PoissonRatio)}\n"
            + $"*DENSITY\n{Number(metal.Density * TonnePerKg)}\n{sections}{held}";
    }

    private static void AppendNode(StringBuilder nodes, int number, Vector3 place) =>
        nodes.Append(CultureInfo.InvariantCulture, $"{number}, {Triple(place)}\n");

    private static string Triple(Vector3 v) => $"{Number(v.X)}, {Number(v.Y)}, {Number(v.Z)}";

    // The program reads the first twenty characters of a field.
    private static string Number(double value) => value.ToString("E12", CultureInfo.InvariantCulture);

    private string Loads(int loadCase)
    {
        var loads = new StringBuilder("*CLOAD\n");
        foreach (NodeLoad load in _sized.Model.Cases[loadCase].NodeLoads)
        {
            loads.Append(CultureInfo.InvariantCulture, $"{load.Node + 1}, 1, {Number(load.Force.X)}\n{load.Node + 1}, 2, {Number(load.Force.Y)}\n{load.Node + 1}, 3, {Number(load.Force.Z)}\n");
        }

        return loads.ToString();
    }

    private string[] Answer(string step)
    {
        using var scratch = new ScratchFolder();
        scratch.Write("frame.inp", _mesh + step);
        ForeignProgram.Find("ccx").RunIn(scratch.Place, "frame");
        return File.ReadAllLines(scratch["frame.dat"]);
    }

    private Vector3[] Vectors(string[] lines)
    {
        var vectors = new Vector3[_sized.Model.Nodes.Count];
        foreach (double[] row in Rows(lines).Where(r => r.Length == 4))
        {
            vectors[(int)row[0] - 1] = new Vector3(row[1], row[2], row[3]);
        }

        return vectors;
    }

    /// <summary>The lines that hold numbers only.</summary>
    private static IEnumerable<double[]> Rows(string[] lines)
    {
        foreach (string line in lines)
        {
            string[] words = line.Split(' ', StringSplitOptions.RemoveEmptyEntries);
            double[] numbers = [.. words.Select(w => double.TryParse(w, CultureInfo.InvariantCulture, out double number) ? number : double.NaN)];
            if (numbers.Length > 0 && !numbers.Any(double.IsNaN))
            {
                yield return numbers;
            }
        }
    }
}
