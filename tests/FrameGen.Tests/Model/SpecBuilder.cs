using System.Globalization;
using System.Text;
using FrameGen.Diagnostics;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;
using FrameGen.Spec.Quantities;
using Xunit;

namespace FrameGen.Tests.Model;

/// <summary>Builds specs as the reader would, one call an entry; every entry has a line of its own.</summary>
internal sealed class SpecBuilder
{
    private static readonly string[] Freedoms = ["x", "y", "z", "rx", "ry", "rz"];

    private readonly List<ParameterSpec> _parameters = [];
    private readonly List<NodeSpec> _nodes = [];
    private readonly List<TubeSpec> _tubes = [];
    private readonly List<GroupSpec> _groups = [];
    private readonly List<MaterialSpec> _materials = [];
    private readonly List<StockListSpec> _stock = [];
    private readonly List<SupportSpec> _supports = [];
    private readonly List<MassSpec> _masses = [];
    private readonly List<CaseSpec> _cases = [];
    private readonly List<TargetSpec> _targets = [];
    private readonly List<JointSpec> _joints = [];
    private MirrorSpec? _mirror;
    private FabricationSpec _fabrication = new(null, null, null, null, null, null, null, null, null, null);
    private string _title = string.Empty;
    private int _line = 1;

    public DiagnosticList Diagnostics { get; } = [];

    public static SpecBuilder New() => new();

    /// <summary>One group of fixed size, for specs that are about something else.</summary>
    public static SpecBuilder WithTubes(params (string Name, string From, string To)[] tubes)
    {
        SpecBuilder spec = New().Fixed("main", "S235", new RoundTube(30, 2));
        foreach ((string name, string from, string to) in tubes)
        {
            spec.Tube(name, from, to);
        }

        return spec;
    }

    public SpecBuilder Title(string title)
    {
        _title = title;
        return this;
    }

    public SpecBuilder Mirror(char across, string ending, string twinEnding)
    {
        _mirror = new MirrorSpec("xyz".IndexOf(across, StringComparison.Ordinal), ending, twinEnding, Here());
        return this;
    }

    public SpecBuilder Parameter(string name, string value) => Add(_parameters, new ParameterSpec(Name(name), Parse(value), At));

    public SpecBuilder Node(string name, double x, double y, double z) =>
        Add(_nodes, new NodeSpec(Name(name), new PointPositionSpec(Lengths(x, y, z))));

    public SpecBuilder On(string name, string tube, string? share = null, string? distance = null) =>
        Add(_nodes, new NodeSpec(Name(name), new OnTubePositionSpec(Name(tube), Quantity(QuantityKind.Share, share), Quantity(QuantityKind.Length, distance))));

    public SpecBuilder Between(string name, string a, string b, string share) =>
        Add(_nodes, new NodeSpec(Name(name), new BetweenPositionSpec(Name(a), Name(b), Quantity(QuantityKind.Share, share)!)));

    public SpecBuilder Offset(string name, string from, double x, double y, double z) =>
        Add(_nodes, new NodeSpec(Name(name), new OffsetPositionSpec(Name(from), Lengths(x, y, z))));

    public SpecBuilder Tube(
        string name,
        string from,
        string to,
        string group = "main",
        (double X, double Y, double Z)? up = null,
        (double X, double Y, double Z)? fromOffset = null,
        (double X, double Y, double Z)? toOffset = null,
        EndCutSpec? fromCut = null,
        EndCutSpec? toCut = null) =>
        Add(_tubes, new TubeSpec(
            Name(name),
            new TubeEndSpec(Name(from), OffsetOf(fromOffset), fromCut ?? Cut(RequestedCut.Default)),
            new TubeEndSpec(Name(to), OffsetOf(toOffset), toCut ?? Cut(RequestedCut.Default)),
            Name(group),
            up is { } u ? Numbers(u.X, u.Y, u.Z) : null));

    public EndCutSpec Cut(RequestedCut cut, string? extend = null, string? gap = null) =>
        new(cut, Quantity(QuantityKind.Length, extend), Quantity(QuantityKind.Length, gap), Wrap: false, At);

    public SpecBuilder Fixed(string name, string material, Section section, bool welded = true) =>
        Add(_groups, new GroupSpec(Name(name), Name(material), new Placed<Section>(section, At), null, welded));

    public SpecBuilder Choose(
        string name,
        string material,
        string[] lists,
        string? shape = null,
        (string? Min, string? Max)? od = null,
        (string? Min, string? Max)? wall = null,
        (string? Min, string? Max)? height = null,
        (string? Min, string? Max)? width = null) =>
        Add(_groups, new GroupSpec(
            Name(name),
            Name(material),
            null,
            new ChooseSpec([.. lists.Select(Name)], shape is null ? null : Name(shape), Range(od), Range(height), Range(width), Range(wall), At),
            Welded: true));

    public SpecBuilder Material(
        string name, string e, string? g, string? poisson, string density, string? yield = null, string? welded = null) =>
        Add(_materials, new MaterialSpec(
            Name(name),
            Quantity(QuantityKind.Stress, e)!,
            Quantity(QuantityKind.Stress, g),
            Quantity(QuantityKind.Number, poisson),
            Quantity(QuantityKind.Density, density)!,
            Quantity(QuantityKind.Stress, yield),
            null,
            Quantity(QuantityKind.Stress, welded)));

    public SpecBuilder Stock(string name, string[] materials, string? bar, double? price, params Section[] sizes) =>
        Add(_stock, new StockListSpec(
            Name(name), [.. materials.Select(Name)], Quantity(QuantityKind.Length, bar), price, [.. sizes.Select(s => new Placed<Section>(s, At))]));

    public SpecBuilder Hold(string node, string hold = "x y z", bool mirror = true) =>
        Add(_supports, new SupportSpec(Name(node), [.. Freedoms.Select(f => hold.Split(' ').Contains(f, StringComparer.Ordinal))], mirror));

    public SpecBuilder NodeMass(string node, string mass, bool mirror = true) =>
        Add(_masses, new MassSpec(Name(node), null, Quantity(QuantityKind.Mass, mass)!, mirror, At));

    public SpecBuilder TubeMass(string tube, string mass, bool mirror = true) =>
        Add(_masses, new MassSpec(null, Name(tube), Quantity(QuantityKind.Mass, mass)!, mirror, At));

    public SpecBuilder Case(
        string name,
        (double X, double Y, double Z)? weight = null,
        LoadSpec[]? loads = null,
        (string Case, string Factor)[]? add = null,
        string[]? supports = null,
        bool mirror = true) =>
        Add(_cases, new CaseSpec(
            Name(name),
            weight is { } w ? Numbers(w.X, w.Y, w.Z) : null,
            loads ?? [],
            [.. (add ?? []).Select(a => (Name(a.Case), Quantity(QuantityKind.Number, a.Factor)!))],
            supports is null ? null : [.. supports.Select(Name)],
            mirror));

    public LoadSpec NodeLoad(string node, (double X, double Y, double Z)? force = null, (double X, double Y, double Z)? moment = null, bool mirror = true) =>
        new NodeLoadSpec(Name(node), Forces(force), Moments(moment), mirror, At);

    public LoadSpec LineLoad(string tube, (double X, double Y, double Z) perLength, bool mirror = true) =>
        new LineLoadSpec(Name(tube), Vector(QuantityKind.LineLoad, "N/mm", perLength.X, perLength.Y, perLength.Z), mirror, At);

    public LoadSpec PointLoad(
        string tube,
        string? share = null,
        string? distance = null,
        (double X, double Y, double Z)? force = null,
        (double X, double Y, double Z)? moment = null,
        bool mirror = true) =>
        new PointLoadSpec(
            Name(tube), Quantity(QuantityKind.Share, share), Quantity(QuantityKind.Length, distance), Forces(force), Moments(moment), mirror, At);

    public SpecBuilder Target(Func<SpecBuilder, TargetSpec> target) => Add(_targets, target(this));

    public SpecBuilder Joint(string node, string[]? miter = null, string[]? order = null, bool mirror = true) =>
        Add(_joints, new JointSpec(
            Name(node), miter is null ? null : [.. miter.Select(Name)], order is null ? null : [.. order.Select(Name)], mirror, At));

    public SpecBuilder Gap(string gap)
    {
        _fabrication = _fabrication with { Gap = Quantity(QuantityKind.Length, gap) };
        return this;
    }

    public SpecBuilder Tolerance(string tolerance)
    {
        _fabrication = _fabrication with { Tolerance = Quantity(QuantityKind.Length, tolerance) };
        return this;
    }

    public FrameSpec Build() => new(
        [new SourceFile("specs/bench.yaml", Encoding.UTF8.GetBytes("abc"))],
        [],
        _title,
        string.Empty,
        string.Empty,
        DisplaySpec.Metric,
        _parameters,
        _mirror,
        _nodes,
        _tubes,
        _groups,
        _materials,
        _stock,
        [],
        _supports,
        _masses,
        _cases,
        _targets,
        _joints,
        _fabrication);

    /// <summary>The model, which must resolve without an error.</summary>
    public FrameModel Model()
    {
        FrameModel? model = ModelResolver.Resolve(Build(), Diagnostics);
        Assert.Empty(Errors());
        Assert.NotNull(model);
        return model;
    }

    /// <summary>The one error that the spec must give.</summary>
    public string Error()
    {
        Assert.Null(ModelResolver.Resolve(Build(), Diagnostics));
        return Assert.Single(Errors());
    }

    /// <summary>All errors that the spec must give.</summary>
    public string[] AllErrors()
    {
        Assert.Null(ModelResolver.Resolve(Build(), Diagnostics));
        return Errors();
    }

    public string[] Said(Severity severity) => [.. Diagnostics.Where(d => d.Severity == severity).Select(d => d.Message)];

    public Placed<string> Name(string name) => new(name, At);

    public SpecQuantity? Quantity(QuantityKind kind, string? text) => text is null ? null : new SpecQuantity(kind, Parse(text), At);

    public SpecVector Numbers(double x, double y, double z) => Vector(QuantityKind.Number, string.Empty, x, y, z);

    private SourcePlace At => new("specs/bench.yaml", _line, 1);

    private string[] Errors() => Said(Severity.Error);

    private SourcePlace Here()
    {
        _line++;
        return At;
    }

    private SpecBuilder Add<T>(List<T> list, T entry)
    {
        list.Add(entry);
        _line++;
        return this;
    }

    private RangeSpec? Range((string? Min, string? Max)? range) =>
        range is { } r
            ? new RangeSpec(Quantity(QuantityKind.Length, r.Min), Quantity(QuantityKind.Length, r.Max), $"{r.Min} .. {r.Max}".Trim(), At)
            : null;

    private SpecVector? OffsetOf((double X, double Y, double Z)? v) => v is { } o ? Lengths(o.X, o.Y, o.Z) : null;

    private SpecVector Lengths(double x, double y, double z) => Vector(QuantityKind.Length, "mm", x, y, z);

    private SpecVector? Forces((double X, double Y, double Z)? v) => v is { } f ? Vector(QuantityKind.Force, "N", f.X, f.Y, f.Z) : null;

    private SpecVector? Moments((double X, double Y, double Z)? v) => v is { } m ? Vector(QuantityKind.Moment, "N.mm", m.X, m.Y, m.Z) : null;

    private SpecVector Vector(QuantityKind kind, string unit, double x, double y, double z) =>
        new(Component(kind, unit, x), Component(kind, unit, y), Component(kind, unit, z), At);

    private SpecQuantity Component(QuantityKind kind, string unit, double value) =>
        Quantity(kind, string.Create(CultureInfo.InvariantCulture, $"{value:R} {unit}").Trim())!;

    private Expression Parse(string text)
    {
        var source = new ExpressionSource(text, At, 1);
        return text.StartsWith('=') ? ExpressionParser.Parse(source) : PlainValue.Read(source);
    }
}
