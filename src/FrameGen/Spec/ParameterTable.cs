using FrameGen.Diagnostics;
using FrameGen.Spec.Quantities;

namespace FrameGen.Spec;

/// <summary>The values of a spec's parameters; evaluates every other value of the spec.</summary>
public sealed class ParameterTable
{
    private readonly Dictionary<string, int> _indices = new(StringComparer.OrdinalIgnoreCase);
    private readonly IReadOnlyList<ParameterSpec> _parameters;
    private readonly Measure?[] _values;
    private int _told;

    private ParameterTable(IReadOnlyList<ParameterSpec> parameters)
    {
        _parameters = parameters;
        _values = new Measure?[parameters.Count];
        for (int i = 0; i < parameters.Count; i++)
        {
            _indices.TryAdd(parameters[i].Name.Value, i);
        }
    }

    /// <summary>Evaluates all parameters, in any order; a cycle is an error that shows it.</summary>
    public static ParameterTable Evaluate(IReadOnlyList<ParameterSpec> parameters, DiagnosticList diagnostics)
    {
        ArgumentNullException.ThrowIfNull(parameters);
        ArgumentNullException.ThrowIfNull(diagnostics);
        var table = new ParameterTable(parameters);
        var inCircle = new bool[parameters.Count];
        DependencyOrder.Visit(
            [.. parameters.Select(parameter => table.UsesOf(parameter.Value))],
            parameter => table._values[parameter] = inCircle[parameter] ? null : table.Checked(parameter, diagnostics),
            (way, use) =>
            {
                inCircle[way[^2]] = true;
                table.ReportCircle(way, parameters[way[^2]].Value.Source.Names[use], diagnostics);
            });
        return table;
    }

    /// <summary>
    /// The value in working units (mm, N, MPa, kg, rad, Hz, N/mm, N·mm, kg/mm³, N·mm²; shares as fractions), or null after
    /// an error has been reported: wrong dimension, unknown name, not finite, too large, outside the range of its place.
    /// </summary>
    public double? Value(SpecQuantity quantity, DiagnosticList diagnostics)
    {
        ArgumentNullException.ThrowIfNull(quantity);
        ArgumentNullException.ThrowIfNull(diagnostics);
        if (quantity.Value is LiteralExpression literal && literal.Source.Text is not ['=', ..])
        {
            string? wrong = QuantityCheck.WrongKind(literal, [quantity.Kind])
                ?? QuantityCheck.WrongSize(quantity.Kind, literal.Value, quantity.Range, literal.Text);
            if (wrong is null)
            {
                return literal.Value;
            }

            diagnostics.Error(literal.At, wrong);
            return null;
        }

        return Measured(quantity.Value, diagnostics) is { } measure ? QuantityCheck.Convert(measure, quantity, diagnostics) : null;
    }

    private List<int?> UsesOf(Expression value) =>
        [.. value.Source.Names.Select(name => _indices.TryGetValue(name.Text, out int used) ? used : (int?)null)];

    private void ReportCircle(IReadOnlyList<int> way, NameExpression use, DiagnosticList diagnostics)
    {
        IEnumerable<string> names = way.Select(step => _parameters[step].Name.Value);
        Tell(diagnostics, use.At, () => $"parameters use each other in a circle: {string.Join(" -> ", names)}; give one of them a value of its own");
    }

    private Measure? Checked(int parameter, DiagnosticList diagnostics)
    {
        ParameterSpec spec = _parameters[parameter];
        if (Measured(spec.Value, diagnostics) is not { } measure)
        {
            return null;
        }

        double largest = KindInfo.Largest(measure.Dimension);
        if (Math.Abs(measure.Value) > largest)
        {
            string largestText = SpecNumber.Text(measure with { Value = largest });
            Tell(
                diagnostics, spec.At, () => $"parameter '{spec.Name.Value}' is {SpecNumber.Text(measure)}, larger than any frame needs (at most {largestText})");
            return null;
        }

        return measure;
    }

    private Measure? Measured(Expression expression, DiagnosticList diagnostics)
    {
        // What fails by way of a parameter that has failed before is not reported again.
        bool isKnown = true;
        foreach (NameExpression name in expression.Source.Names)
        {
            if (Functions.Constant(name.Text) is not null)
            {
                continue;
            }

            if (!_indices.TryGetValue(name.Text, out int index))
            {
                Tell(diagnostics, name.At, () => Unknown(name.Text));
                isKnown = false;
            }
            else if (_values[index] is null)
            {
                isKnown = false;
            }
        }

        if (!isKnown)
        {
            return null;
        }

        try
        {
            return ExpressionEvaluator.Evaluate(expression, name => _values[_indices[name.Text]]!.Value);
        }
        catch (ValueException wrong)
        {
            Tell(diagnostics, expression.Source.PlaceOf(wrong.Offset), () => wrong.Message);
            return null;
        }
    }

    /// <summary>Beyond so many errors nobody reads on, and looking for the nearest name of each would take minutes.</summary>
    private void Tell(DiagnosticList diagnostics, SourcePlace at, Func<string> message)
    {
        _told++;
        if (_told <= ProblemList.MostTold)
        {
            diagnostics.Error(at, message());
        }
        else if (_told == ProblemList.MostTold + 1)
        {
            diagnostics.Error(null, "and more errors in expressions; mend these first");
        }
    }

    private string Unknown(string name)
    {
        string advice = NearestName.Suggest(name, _parameters.Select(parameter => parameter.Name.Value));
        if (advice.Length > 0)
        {
            return $"unknown parameter '{name}'{advice}";
        }

        if (name.Contains('-', StringComparison.Ordinal))
        {
            return $"unknown parameter '{name}'; a name may hold '-', so put spaces round a minus";
        }

        return UnitTable.Find(name) is not null
            ? $"unknown parameter '{name}'; a unit stands straight behind a number, as in 1 {name}"
            : $"unknown parameter '{name}'; it is not among `parameters`";
    }
}
