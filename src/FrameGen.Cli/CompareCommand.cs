using FrameGen.Cli.Reports;
using FrameGen.Comparison;
using FrameGen.Formats.Svg;
using FrameGen.Mechanics.Materials;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Spec;
using static FrameGen.Cli.QuantityOption;

namespace FrameGen.Cli;

/// <summary>What <c>framegen compare</c> was asked for; null where an option is not written.</summary>
internal sealed record CompareRequest(
    string? Spec,
    string? Tube,
    string? As,
    string? Load,
    string? Length,
    string? MaxDeflection,
    string? MinBendingStiffness,
    string? MinTorsionalStiffness,
    string? By,
    string? Along,
    IReadOnlyList<string> Materials,
    IReadOnlyList<string> WallRatios,
    string? Wall,
    bool ThinWall,
    string? Svg,
    bool Json);

/// <summary><c>framegen compare</c>: shapes and metals side by side at equal stiffness.</summary>
internal sealed class CompareCommand(Terminal terminal, CompareRequest request)
{
    private const string DefaultRatio = "20";

    // One of each metal that tubes are made of; a spec's own comes first.
    private static readonly string[] UsualMetals = ["S235", "1.4301", "6082-T6", "Ti-3Al-2.5V"];

    private readonly Job _job = new(terminal);

    /// <summary>Runs it.</summary>
    /// <exception cref="WrongInputException">The options make no comparison.</exception>
    public int Run()
    {
        IReadOnlyList<WallRule> walls = Walls();
        SizedFrame? sized = null;
        FrameSpec? spec = null;
        if (request.Spec is not null)
        {
            RefuseTarget();
            SpecFile.Require(request.Spec);
            spec = _job.With(p => p.Read(request.Spec));
            sized = _job.With(p => p.Size(p.Resolve(spec)));
            _job.PrintDiagnostics(string.Empty);
            if (sized is null)
            {
                return ExitCode.WrongInput;
            }
        }

        int? tube = sized is null ? null : TubeName.Find(sized.Model, request.Spec!, request.Tube);
        StiffnessNeed need = sized is null ? TargetNeed() : TubeNeed.Of(sized, tube!.Value, By(), Along());
        var supply = Supply.Of(spec);
        (Section Section, Material Material)? own = sized is null ? null : (sized.SectionOf(tube!.Value), MaterialOf(sized, tube.Value));
        var comparison = ShapeComparison.Of(need, Metals(supply, own?.Material), ComparedShape.All(request.ThinWall), walls, supply, own);
        if (request.Svg is { } svg)
        {
            WritePlot(svg, comparison);
        }

        if (request.Json)
        {
            ComparisonJson.Print(terminal, comparison);
        }
        else
        {
            new ComparisonReport(terminal, comparison).Print();
            if (request.Svg is not null)
            {
                terminal.Out.WriteLine($"Plot: {request.Svg}");
            }
        }

        return ExitCode.Done;
    }

    // A picture may be drawn anew; anything else of that name is somebody's work.
    private static void WritePlot(string path, ShapeComparison comparison)
    {
        byte[] picture = SvgWriter.Write(ComparisonPlot.Draw(comparison), "Mass against outer size at equal stiffness");
        const int Beginning = 60;
        if (File.Exists(path) && new FileInfo(path).Length > 0 && !File.ReadAllBytes(path).AsSpan().StartsWith(picture.AsSpan(0, Beginning)))
        {
            throw new WrongInputException($"{path} is there already and is no plot; name another file for --svg");
        }

        File.WriteAllBytes(path, picture);
    }

    private static Material MaterialOf(SizedFrame sized, int tube) => sized.Model.Groups[sized.Model.Tubes[tube].Group].Material;

    private void RefuseTarget()
    {
        (string Name, string? Value)[] targets =
        [
            ("--as", request.As), ("--load", request.Load), ("--length", request.Length), ("--max-deflection", request.MaxDeflection),
            ("--min-bending-stiffness", request.MinBendingStiffness), ("--min-torsional-stiffness", request.MinTorsionalStiffness),
        ];
        if (targets.FirstOrDefault(t => t.Value is not null) is { Name: { } name })
        {
            throw new WrongInputException($"{name} gives a target of its own, and a tube of a spec brings its own; leave one of them out");
        }
    }

    private StiffnessNeed TargetNeed()
    {
        double? bending = Optional("--min-bending-stiffness", request.MinBendingStiffness, QuantityKind.BendingStiffness);
        double? torsion = Optional("--min-torsional-stiffness", request.MinTorsionalStiffness, QuantityKind.BendingStiffness);
        if (request.By is not null)
        {
            throw new WrongInputException("--by says what of a tube of a spec is kept; name a SPEC and a TUBE, or leave it out");
        }

        if (request.As is null && bending is null && torsion is null)
        {
            throw new WrongInputException(
                "nothing to compare for: name a SPEC and a TUBE; or a span, --as cantilever --load \"500 N\" --length \"600 mm\" --max-deflection \"2 mm\"; or "
                + "--min-bending-stiffness \"1200 N.m2\"");
        }

        string reason = "as asked for";
        if (request.As is { } word)
        {
            SpanKind span = Word("--as", word, [("cantilever", SpanKind.Cantilever), ("simply-supported", SpanKind.SimplySupported), ("fixed-fixed", SpanKind.FixedFixed)]);
            double load = Required("--load", request.Load, QuantityKind.Force);
            double length = Required("--length", request.Length, QuantityKind.Length);
            double most = Required("--max-deflection", request.MaxDeflection, QuantityKind.Length);
            bending = Math.Max(bending ?? 0, SpanStiffness.LeastBending(span, load, length, most));
            reason = $"{word}, {request.Load} {(span == SpanKind.Cantilever ? "at its end" : "in the middle")}, {request.Length} long, {request.MaxDeflection} at most";
        }

        // Whoever names a load turns the tube's high side to it.
        return new StiffnessNeed(bending, torsion, Along() ?? BendingDirection.Top, reason);
    }

    private TubeNeed.Kept By() => request.By is null
        ? TubeNeed.Kept.Bending
        : Word("--by", request.By, [("bending", TubeNeed.Kept.Bending), ("torsion", TubeNeed.Kept.Torsion), ("both", TubeNeed.Kept.Both)]);

    private BendingDirection? Along() => request.Along is null
        ? null
        : Word("--along", request.Along, [("top", BendingDirection.Top), ("side", BendingDirection.Side), ("weaker", BendingDirection.Weaker)]);

    private WallRule[] Walls()
    {
        double? least = Optional("--wall", request.Wall, QuantityKind.Length);
        if (request.WallRatios.Count == 0 && least is not null)
        {
            return [new WallRule(null, least)];
        }

        IEnumerable<string> ratios = request.WallRatios.Count == 0 ? [DefaultRatio] : request.WallRatios.SelectMany(r => r.Split(','));
        return
        [
            .. ratios.Select(text =>
            {
                double ratio = QuantityOption.Read("--wall-ratio", text.Trim(), QuantityKind.Number);
                return ratio > 2 ? new WallRule(ratio, least) : throw new WrongInputException($"--wall-ratio is outer size over wall, more than 2, and is {text}");
            }),
        ];
    }

    private Material[] Metals(Supply supply, Material? own)
    {
        IEnumerable<string> names = request.Materials.Count > 0
            ? request.Materials.SelectMany(m => m.Split(',')).Select(m => m.Trim())
            : own is null ? UsualMetals : UsualMetals.Skip(1);
        var metals = new List<Material>();
        if (own is not null)
        {
            metals.Add(own);
        }

        foreach (string name in names.Distinct(StringComparer.OrdinalIgnoreCase))
        {
            Material metal = supply.Material(name, out string error) ?? throw new WrongInputException(error);
            if (!metals.Exists(m => string.Equals(m.Name, metal.Name, StringComparison.Ordinal)))
            {
                metals.Add(metal);
            }
        }

        return [.. metals];
    }
}
