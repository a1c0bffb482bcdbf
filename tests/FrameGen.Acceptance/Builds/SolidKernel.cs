using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;

namespace FrameGen.Acceptance.Builds;

/// <summary>
/// A script for the command program of OpenCASCADE, a general-purpose geometry kernel: solids of tubes, cut off each other by its
/// booleans and measured by its own integration.
/// </summary>
internal sealed partial class SolidKernel
{
    private readonly StringBuilder _script = new("pload MODELING\n");
    private int _solids;

    /// <summary>
    /// Asks for the volume of a tube after solid mates are taken off it. Where a boolean leaves several pieces, it is the largest one:
    /// what stands on the far side of a mate falls off.
    /// </summary>
    /// <param name="name">Of the answer.</param>
    /// <param name="tube">The tube, both ends square.</param>
    /// <param name="mates">What it is cut to, filled: a mate's bore is no room for the tube.</param>
    public void AskVolume(string name, Prism tube, IEnumerable<Prism> mates)
    {
        int part = Solid(tube, tube.Section.Outline);
        if (!tube.Section.Bore.IsPoint)
        {
            part = Cut(part, Solid(tube, tube.Section.Bore));
        }

        foreach (Prism mate in mates)
        {
            part = Cut(part, Solid(mate, mate.Section.Outline));
        }

        Line($"foreach piece [explode s{part} So] {{ puts \"volume of {name} [vprops $piece 1e-10 -full]\" }}");
    }

    /// <summary>Runs the script; the volumes by name, mm³.</summary>
    public Dictionary<string, double> Run()
    {
        ForeignProgram.Find("occt-draw");
        using var folder = new ScratchFolder();

        // The program loads its commands from libraries without a version in their names, which only packages for compiling hold.
        string[] homes = [.. Directory.GetDirectories("/usr/lib").Append("/usr/lib").Where(h => Libraries(h).Any())];
        foreach (string library in homes.SelectMany(Libraries))
        {
            string bare = folder[Path.GetFileNameWithoutExtension(library)];
            if (!File.Exists(bare))
            {
                File.CreateSymbolicLink(bare, library);
            }
        }

        string script = folder.Write("solids.tcl", _script + "exit\n");
        string home = Path.GetDirectoryName(folder["x"])!;
        string output = ForeignProgram.Find("env").Run($"LD_LIBRARY_PATH={home}", "occt-draw", "-b", "-f", script);
        var volumes = new Dictionary<string, double>(StringComparer.Ordinal);
        foreach (Match match in Answer().Matches(output))
        {
            string name = match.Groups["name"].Value;
            double volume = double.Parse(match.Groups["volume"].Value, CultureInfo.InvariantCulture);
            volumes[name] = Math.Max(volume, volumes.GetValueOrDefault(name));
        }

        return volumes;
    }

    // One version number: libTKTopTest.so.7, not libTKTopTest.so.7.6.3.
    private static IEnumerable<string> Libraries(string home) =>
        Directory.EnumerateFiles(home, "libTK*.so.*").Where(f => OneNumber().IsMatch(f));

    private int Cut(int body, int tool)
    {
        Line($"bcut s{++_solids} s{body} s{tool}");
        return _solids;
    }

    private int Solid(Prism prism, Outline outline)
    {
        int name = ++_solids;
        string start = Words(prism.Start);
        string plane = $"{Words(prism.Axes.X)} {Words(prism.Axes.Z)}";
        switch (outline)
        {
            case RoundOutline round:
                Line($"plane p{name} {start} {plane}");
                Line($"pcylinder s{name} p{name} {Words(round.Radius)} {Words(prism.Length)}");
                return name;
            case FlatSidedOutline flat:
                // In the plane's own coordinates, the top line first; its second axis is x cross z of the tube.
                (double high, double wide, double corner) = (flat.HalfHeight, flat.HalfWidth, flat.Corner);
                string turn = corner > 0 ? $"c {Words(corner)} 90" : "r 90";
                string up = $"l {Words(2 * (high - corner))} {turn}";
                string aside = $"l {Words(2 * (wide - corner))} {turn}";
                Line($"profile p{name} o {start} p {plane} f {Words(corner - high)} {Words(-wide)} d 1 0 {up} {aside} {up} {aside}");
                break;
            case EllipseOutline ellipse:
                // The kernel wants the larger radius first.
                bool tall = ellipse.HalfHeight >= ellipse.HalfWidth;
                string large = $"{Words(prism.Axes.X)} {Words(tall ? prism.Axes.Z : prism.Axes.Y)}";
                double most = Math.Max(ellipse.HalfHeight, ellipse.HalfWidth);
                double least = Math.Min(ellipse.HalfHeight, ellipse.HalfWidth);
                Line($"ellipse e{name} {start} {large} {Words(most)} {Words(least)}");
                Line($"mkedge d{name} e{name}");
                Line($"wire w{name} d{name}");
                Line($"mkplane p{name} w{name}");
                break;
            default:
                throw new ArgumentOutOfRangeException(nameof(outline), outline, "The script knows no such outline.");
        }

        Line($"prism s{name} p{name} {Words(prism.Length * prism.Axes.X)}");
        return name;
    }

    private void Line(string line) => _script.Append(line).Append('\n');

    private static string Words(Vector3 v) => $"{Words(v.X)} {Words(v.Y)} {Words(v.Z)}";

    private static string Words(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    [GeneratedRegex(@"volume of (?<name>.*?)\s+Mass :\s+(?<volume>[0-9.e+-]+)", RegexOptions.ExplicitCapture, 10_000)]
    private static partial Regex Answer();

    [GeneratedRegex(@"\.so\.\d+$", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex OneNumber();
}

/// <summary>A straight piece of tube with square ends.</summary>
/// <param name="Section">Its section.</param>
/// <param name="Start">Where its axis begins, mm, global.</param>
/// <param name="Axes">Its axes: x along it, z the top line.</param>
/// <param name="Length">mm.</param>
internal sealed record Prism(Section Section, Vector3 Start, TubeAxes Axes, double Length);
