namespace FrameGen.Spec.Quantities;

/// <summary>A number in coherent base units (mm, kg, N, rad) and what it measures.</summary>
internal readonly record struct Measure(double Value, Dimension Dimension);

/// <summary>The functions and constants of expressions.</summary>
internal static class Functions
{
    private static readonly string[] OneArgument = ["sin", "cos", "tan", "asin", "acos", "atan", "sqrt", "abs", "round", "floor", "ceil"];

    private static readonly string[] AtLeastOneArgument = ["min", "max", "hypot"];

    /// <summary>All function names.</summary>
    public static readonly IReadOnlyList<string> Names = [.. OneArgument, "atan2", .. AtLeastOneArgument];

    /// <summary>Names that are always these numbers, so that no parameter may bear them.</summary>
    public static Measure? Constant(string name) => name switch
    {
        "pi" => new Measure(Math.PI, Dimension.None),

        // m/s² is the coherent unit of acceleration beside mm, kg and N; see Dimension.
        "g" => new Measure((double)UnitTable.StandardGravity, new Dimension(1, 0, -2)),
        _ => null,
    };

    /// <summary>What is wrong with the number of arguments; null where it is right.</summary>
    public static string? WrongCount(string name, int count)
    {
        if (Array.IndexOf(OneArgument, name) >= 0)
        {
            return count == 1 ? null : $"{name} takes one value, not {count}";
        }

        return string.Equals(name, "atan2", StringComparison.Ordinal) && count != 2 ? $"atan2 takes two values, the opposite and the adjacent side, not {count}" : null;
    }

    /// <summary>Applies a function to values whose count is right.</summary>
    /// <param name="call">The call; its arguments' texts are told in messages.</param>
    /// <param name="values">The arguments' values.</param>
    /// <exception cref="ValueException">A dimension that does not fit, or a value outside the function's range.</exception>
    public static Measure Apply(CallExpression call, IReadOnlyList<Measure> values)
    {
        Measure first = values[0];
        return call.Function switch
        {
            "sin" => new(Math.Sin(Angle(call, first)), Dimension.None),
            "cos" => new(Math.Cos(Angle(call, first)), Dimension.None),
            "tan" => new(Math.Tan(Angle(call, first)), Dimension.None),
            "asin" => new(Math.Asin(UnitRange(call, first)), Dimension.OfAngle),
            "acos" => new(Math.Acos(UnitRange(call, first)), Dimension.OfAngle),
            "atan" => new(Math.Atan(Plain(call, first)), Dimension.OfAngle),
            "atan2" => Same(call, values) with { Value = Math.Atan2(first.Value, values[1].Value), Dimension = Dimension.OfAngle },
            "sqrt" => SquareRoot(call, first),
            "abs" => first with { Value = Math.Abs(first.Value) },
            "min" => Same(call, values) with { Value = values.Min(value => value.Value) },
            "max" => Same(call, values) with { Value = values.Max(value => value.Value) },
            "hypot" => Same(call, values) with { Value = Hypotenuse(values) },
            "round" => new(Math.Round(Plain(call, first), MidpointRounding.AwayFromZero), Dimension.None),
            "floor" => new(Math.Floor(Plain(call, first)), Dimension.None),
            "ceil" => new(Math.Ceiling(Plain(call, first)), Dimension.None),
            _ => throw new ArgumentOutOfRangeException(nameof(call), call.Function, "Not a function."),
        };
    }

    private static double Angle(CallExpression call, Measure value)
    {
        if (value.Dimension != Dimension.OfAngle)
        {
            string advice = value.Dimension == Dimension.None
                ? "write `30 deg`, or multiply a number of radians by `1 rad`"
                : "give it an angle";
            throw Wrong(call, 0, $"{call.Function} takes an angle, and `{call.Arguments[0].Text}` is {KindInfo.WordsFor(value.Dimension)}; {advice}");
        }

        return value.Value;
    }

    private static double Plain(CallExpression call, Measure value)
    {
        if (value.Dimension != Dimension.None)
        {
            throw Wrong(
                call,
                0,
                $"{call.Function} takes a plain number, and `{call.Arguments[0].Text}` is {KindInfo.WordsFor(value.Dimension)}; divide by a unit first, as in {call.Function}(x / 1 mm) * 1 mm");
        }

        return value.Value;
    }

    private static double UnitRange(CallExpression call, Measure value)
    {
        double plain = Plain(call, value);
        return Math.Abs(plain) <= 1
            ? plain
            : throw Wrong(call, 0, $"{call.Function} takes a number from -1 to 1, and `{call.Arguments[0].Text}` is {SpecNumber.Text(plain)}");
    }

    private static Measure SquareRoot(CallExpression call, Measure value)
    {
        if (value.Value < 0)
        {
            throw Wrong(call, 0, $"sqrt takes no negative value, and `{call.Arguments[0].Text}` is {SpecNumber.Text(value)}");
        }

        return value.Dimension.Power(0.5) is { } half
            ? new Measure(Math.Sqrt(value.Value), half)
            : throw Wrong(call, 0, $"the square root of `{call.Arguments[0].Text}`, {KindInfo.WordsFor(value.Dimension)}, has no unit");
    }

    private static Measure Same(CallExpression call, IReadOnlyList<Measure> values)
    {
        for (int i = 1; i < values.Count; i++)
        {
            if (!values[0].Dimension.Agrees(values[i].Dimension))
            {
                throw Wrong(
                    call,
                    i,
                    $"{call.Function} compares like with like: `{call.Arguments[0].Text}` is {KindInfo.WordsFor(values[0].Dimension)}, `{call.Arguments[i].Text}` {KindInfo.WordsFor(values[i].Dimension)}");
            }
        }

        return values[0];
    }

    /// <summary>√Σv², scaled by the largest so that nothing overflows on the way.</summary>
    private static double Hypotenuse(IReadOnlyList<Measure> values)
    {
        double largest = values.Max(value => Math.Abs(value.Value));
        return largest is 0 or double.PositiveInfinity
            ? largest
            : largest * Math.Sqrt(values.Sum(value => value.Value / largest * (value.Value / largest)));
    }

    private static ValueException Wrong(CallExpression call, int argument, string message) =>
        new(call.Arguments[argument].Start, message);
}
