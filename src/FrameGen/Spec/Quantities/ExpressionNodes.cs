namespace FrameGen.Spec.Quantities;

/// <summary>A number with its unit, or without one.</summary>
internal sealed record LiteralExpression : Expression
{
    /// <summary>A literal.</summary>
    /// <param name="source">The value it is a part of.</param>
    /// <param name="start">Offset of its first character.</param>
    /// <param name="end">Offset behind its last.</param>
    /// <param name="value">In the working unit of its kind.</param>
    /// <param name="unit">Null for a plain number.</param>
    public LiteralExpression(ExpressionSource source, int start, int end, double value, Unit? unit)
        : base(source, start, end)
    {
        (Value, Unit) = (value, unit);
    }

    /// <summary>In the working unit of its kind.</summary>
    public double Value { get; }

    /// <summary>The unit written last; null for a plain number.</summary>
    public Unit? Unit { get; }
}

/// <summary>A parameter or a constant, by name.</summary>
internal sealed record NameExpression : Expression
{
    /// <summary>A name.</summary>
    public NameExpression(ExpressionSource source, int start, int end)
        : base(source, start, end)
    {
    }
}

/// <summary>A minus before a term.</summary>
internal sealed record NegativeExpression : Expression
{
    /// <summary>Minus the operand.</summary>
    public NegativeExpression(ExpressionSource source, int start, Expression operand)
        : base(source, start, operand.End)
    {
        Operand = operand;
    }

    /// <summary>What is negated.</summary>
    public Expression Operand { get; }
}

/// <summary>Two terms and <c>+ - * /</c> or <c>^</c> between them.</summary>
internal sealed record BinaryExpression : Expression
{
    /// <summary>Left, operator, right.</summary>
    public BinaryExpression(Expression left, char symbol, int symbolAt, Expression right)
        : base(left.Source, left.Start, right.End)
    {
        (Left, Symbol, SymbolAt, Right) = (left, symbol, symbolAt, right);
    }

    /// <summary>Before the operator.</summary>
    public Expression Left { get; }

    /// <summary>The operator.</summary>
    public char Symbol { get; }

    /// <summary>Offset of the operator in the value.</summary>
    public int SymbolAt { get; }

    /// <summary>Behind the operator.</summary>
    public Expression Right { get; }
}

/// <summary>A function of one or more terms.</summary>
internal sealed record CallExpression : Expression
{
    /// <summary>A call.</summary>
    public CallExpression(ExpressionSource source, int start, int end, string function, IReadOnlyList<Expression> arguments)
        : base(source, start, end)
    {
        (Function, Arguments) = (function, arguments);
    }

    /// <summary>One of <see cref="Functions.Names"/>.</summary>
    public string Function { get; }

    /// <summary>At least one.</summary>
    public IReadOnlyList<Expression> Arguments { get; }
}
