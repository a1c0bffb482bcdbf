using FrameGen.Diagnostics;
using FrameGen.Mechanics.Materials;
using FrameGen.Spec;
using FrameGen.Stock;

namespace FrameGen.Model.Resolving;

/// <summary>The materials a spec can name: its own, which win, and the built-in ones.</summary>
internal sealed class MaterialTable
{
    private readonly Dictionary<string, Material?> _written = new(StringComparer.OrdinalIgnoreCase);
    private readonly List<string> _names = [];
    private readonly DiagnosticList _diagnostics;

    /// <summary>Evaluates the spec's materials.</summary>
    public MaterialTable(IReadOnlyList<MaterialSpec> specs, SpecValues values)
    {
        _diagnostics = values.Diagnostics;
        foreach (MaterialSpec spec in specs)
        {
            string name = spec.Name.Value;
            if (!_written.TryAdd(name, Evaluate(spec, values)))
            {
                _diagnostics.Error(spec.Name.At, $"material {name} is written twice; keep one of them");
                continue;
            }

            _names.Add(name);
            if (BuiltInMaterials.Find(name) is { } builtIn)
            {
                _diagnostics.Note(spec.Name.At, $"material {builtIn.Name} of this spec is used in place of the built-in one");
            }
        }

        _names.AddRange(BuiltInMaterials.All.Select(m => m.Name).Where(name => !_written.ContainsKey(name)));
    }

    /// <summary>True where a name stands for a material, be it one with errors.</summary>
    public bool Knows(string name) => _written.ContainsKey(name) || BuiltInMaterials.Find(name) is not null;

    /// <summary>The material of a name; null after an error.</summary>
    /// <param name="name">As written.</param>
    /// <param name="whose">What names it, to begin the message with.</param>
    public Material? Find(Placed<string> name, string whose)
    {
        if (_written.TryGetValue(name.Value, out Material? material))
        {
            return material;
        }

        if (BuiltInMaterials.Find(name.Value) is { } builtIn)
        {
            return builtIn;
        }

        SayUnknown(name, whose);
        return null;
    }

    /// <summary>Reports a name that stands for no material.</summary>
    public void SayUnknown(Placed<string> name, string whose) =>
        _diagnostics.Error(
            name.At,
            $"{whose}: there is no material {name.Value}{NameIndex.Suggestion(name.Value, _names, "a material of your own goes under materials")}");

    private static Material? Evaluate(MaterialSpec spec, SpecValues values)
    {
        string whose = $"material {spec.Name.Value}";
        double? e = values.Positive(spec.E, $"{whose}: E");
        double? density = values.Positive(spec.Density, $"{whose}: density");
        double? yield = Optional(spec.Yield, $"{whose}: yield", values, out bool yieldIsSound);
        double? ultimate = Optional(spec.Ultimate, $"{whose}: ultimate", values, out bool ultimateIsSound);
        double? welded = Optional(spec.YieldWelded, $"{whose}: yield_welded", values, out bool weldedIsSound);
        double? g = ShearModulus(spec, e, whose, values);
        if (welded > yield)
        {
            values.Diagnostics.Warning(
                spec.YieldWelded!.At,
                $"{whose}: yield_welded ({welded:0.#} MPa) is higher than yield ({yield:0.#} MPa); welding softens or leaves a metal as it is");
        }

        return e is { } young && density is { } rho && g is { } shear && yieldIsSound && ultimateIsSound && weldedIsSound
            ? new Material(spec.Name.Value, young, shear, rho, yield, ultimate, welded, "the spec")
            : null;
    }

    // G as written, else E/2(1 + ν); where both are written G is used.
    private static double? ShearModulus(MaterialSpec spec, double? e, string whose, SpecValues values)
    {
        double? g = spec.G is null ? null : values.Positive(spec.G, $"{whose}: G");
        double? poisson = spec.Poisson is null ? null : values.Of(spec.Poisson);
        if (spec.G is null && spec.Poisson is null)
        {
            values.Diagnostics.Error(
                spec.Name.At, $"{whose} needs G or poisson beside E; write for example poisson: 0.3 for steel, 0.33 for aluminium");
            return null;
        }

        if (poisson is { } nu && !(nu > -1 && nu < 0.5))
        {
            values.Diagnostics.Error(spec.Poisson!.At, $"{whose}: poisson must be between -1 and 0.5, and is {nu:G9}; metals have about 0.3");
            return null;
        }

        return spec.G is null ? e / (2 * (1 + poisson)) : g;
    }

    private static double? Optional(SpecQuantity? quantity, string what, SpecValues values, out bool isSound)
    {
        double? value = quantity is null ? null : values.Positive(quantity, what);
        isSound = quantity is null || value is not null;
        return value;
    }
}
