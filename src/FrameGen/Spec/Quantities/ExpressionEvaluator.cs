namespace FrameGen.Spec.Quantities;

/// <summary>Computes an expression, checking dimensions at every step.</summary>
internal static class ExpressionEvaluator
{
    /// <summary>Computes an expression.</summary>
    /// <param name="expression">What to compute.</param>
    /// <param name="parameter">Gives a parameter's value; throws where there is none.</param>
    /// <exception cref="ValueException">Dimensions that do not fit, a division by zero, a value that is not finite.</exception>
    public static Measure Evaluate(Expression expression, Func<NameExpression, Measure> parameter)
    {
        Measure value = expression switch
        {
            LiteralExpression literal => OfLiteral(literal),
            NameExpression name => Functions.Constant(name.Text) ?? parameter(name),
            NegativeExpression negative => Negate(Evaluate(negative.Operand, parameter)),
            CallExpression call => Functions.Apply(call, [.. call.Arguments.Select(argument => Evaluate(argument, parameter))]),
            BinaryExpression binary => OfChain(binary, parameter),
            _ => throw new ArgumentOutOfRangeException(nameof(expression), expression, "Not an expression."),
        };

        return Finite(expression, value);
    }

    /// <summary>A literal in base units.</summary>
    public static Measure OfLiteral(LiteralExpression literal)
    {
        if (literal.Unit is not { } unit)
        {
            return new Measure(literal.Value, Dimension.None);
        }

        return new Measure(literal.Value / KindInfo.Of(unit.Kind).WorkingPerBase, unit.Dimension);
    }

    private static Measure Finite(Expression expression, Measure value) =>
        double.IsFinite(value.Value)
            ? value
            : throw new ValueException(expression.Start, $"`{expression.Text}` is too large or no number at all");

    private static Measure Negate(Measure value) => value with { Value = -value.Value };

    /// <summary>A sum or product parses into a tree as deep on its left side as it is long: walked in a loop, not by recursion.</summary>
    private static Measure OfChain(BinaryExpression last, Func<NameExpression, Measure> parameter)
    {
        var chain = new Stack<BinaryExpression>();
        Expression first = last;
        while (first is BinaryExpression binary)
        {
            chain.Push(binary);
            first = binary.Left;
        }

        Measure value = Evaluate(first, parameter);
        while (chain.TryPop(out BinaryExpression? binary))
        {
            value = Finite(binary, Combine(binary, value, Evaluate(binary.Right, parameter)));
        }

        return value;
    }

    private static Measure Combine(BinaryExpression binary, Measure left, Measure right) => binary.Symbol switch
    {
        '+' => new Measure(left.Value + right.Value, CommonDimension(binary, left, right)),
        '-' => new Measure(left.Value - right.Value, CommonDimension(binary, left, right)),
        '*' => new Measure(left.Value * right.Value, InRange(binary, left.Dimension.Times(right.Dimension))),
        '/' => right.Value == 0
            ? throw new ValueException(binary.Right.Start, $"`{binary.Right.Text}` is 0, and nothing can be divided by it")
            : new Measure(left.Value / right.Value, InRange(binary, left.Dimension.Over(right.Dimension))),
        _ => Power(binary, left, right),
    };

    private static Dimension CommonDimension(BinaryExpression binary, Measure left, Measure right)
    {
        if (!left.Dimension.Agrees(right.Dimension))
        {
            string act = binary.Symbol == '+' ? "added" : "subtracted";
            throw new ValueException(
                binary.SymbolAt,
                $"`{binary.Left.Text}` is {KindInfo.WordsFor(left.Dimension)} and `{binary.Right.Text}` is {KindInfo.WordsFor(right.Dimension)}: they can't be {act}");
        }

        return left.Dimension with { Angle = Math.Min(left.Dimension.Angle, right.Dimension.Angle) };
    }

    private static Dimension InRange(BinaryExpression binary, Dimension dimension) =>
        dimension.Power(1) ?? throw new ValueException(binary.SymbolAt, $"`{binary.Text}` has a power of a unit over 100");

    private static Measure Power(BinaryExpression binary, Measure left, Measure right)
    {
        if (right.Dimension != Dimension.None)
        {
            throw new ValueException(
                binary.Right.Start, $"a power must be a plain number, and `{binary.Right.Text}` is {KindInfo.WordsFor(right.Dimension)}");
        }

        if (left.Value == 0 && right.Value < 0)
        {
            throw new ValueException(binary.Left.Start, $"`{binary.Left.Text}` is 0 and has no negative power");
        }

        return left.Dimension.Power(right.Value) is { } dimension
            ? new Measure(Math.Pow(left.Value, right.Value), dimension)
            : throw new ValueException(
                binary.SymbolAt,
                $"`{binary.Left.Text}` is {KindInfo.WordsFor(left.Dimension)}: its power {SpecNumber.Text(right.Value)} has no unit");
    }
}
