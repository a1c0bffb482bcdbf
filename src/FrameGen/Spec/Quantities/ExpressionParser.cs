namespace FrameGen.Spec.Quantities;

/// <summary>Parses what follows the <c>=</c> of a value.</summary>
/// <remarks>
/// sum := product (('+'|'-') product)*; product := unary (('*'|'/') unary)*; unary := '-' unary | atom ('^' unary)?;
/// atom := number unit? | name | name '(' sum (',' sum)* ')' | '(' sum ')'. A unit straight after a number binds first.
/// </remarks>
internal sealed class ExpressionParser
{
    /// <summary>Longest value, characters.</summary>
    public const int LongestText = 4096;

    /// <summary>Deepest nesting of brackets, calls, powers and signs.</summary>
    public const int DeepestNesting = 100;

    private readonly ExpressionSource _source;
    private readonly string _text;
    private int _at;
    private int _depth;

    private ExpressionParser(ExpressionSource source)
    {
        (_source, _text, _at) = (source, source.Text, 1);
    }

    /// <summary>Parses a value whose text begins with <c>=</c>.</summary>
    /// <exception cref="ValueException">It is no expression, too long or nested too deeply.</exception>
    public static Expression Parse(ExpressionSource source)
    {
        if (source.Text.Length > LongestText)
        {
            throw new ValueException(
                0, $"an expression of {source.Text.Length} characters is too long (at most {LongestText}); split it into parameters");
        }

        var parser = new ExpressionParser(source);
        Expression sum = parser.Sum();
        if (parser.Peek() is { } rest)
        {
            throw new ValueException(
                parser._at,
                rest == ')'
                    ? "')' closes nothing"
                    : $"expected an operator (+ - * / ^) before '{parser._text[parser._at..]}'");
        }

        return sum;
    }

    private Expression Sum()
    {
        Expression left = Product();
        while (Peek() is '+' or '-')
        {
            int symbolAt = _at++;
            left = new BinaryExpression(left, _text[symbolAt], symbolAt, Product());
        }

        return left;
    }

    private Expression Product()
    {
        Expression left = Unary();
        while (Peek() is '*' or '·' or '/')
        {
            int symbolAt = _at++;
            left = new BinaryExpression(left, _text[symbolAt] == '/' ? '/' : '*', symbolAt, Unary());
        }

        return left;
    }

    private Expression Unary()
    {
        if (++_depth > DeepestNesting)
        {
            throw new ValueException(_at, $"nested deeper than {DeepestNesting} levels; split it into parameters");
        }

        Expression unary;
        if (Peek() == '-')
        {
            int start = _at++;
            unary = new NegativeExpression(_source, start, Unary());
        }
        else
        {
            unary = Atom();
            if (Peek() == '^')
            {
                int symbolAt = _at++;
                unary = new BinaryExpression(unary, '^', symbolAt, Unary());
            }
        }

        _depth--;
        return unary;
    }

    private Expression Atom()
    {
        char? next = Peek();
        if (NumberScanner.IsAt(_text, _at))
        {
            return Number();
        }

        if (next == '(')
        {
            int open = _at++;
            Expression inner = Sum();
            Close(open);
            return inner with { Start = open, End = _at };
        }

        if (next is { } letter && char.IsAsciiLetter(letter))
        {
            return NameOrCall();
        }

        throw new ValueException(
            Math.Min(_at, _text.Length), next is null ? "the expression ends where a value is missing" : $"expected a number, a parameter or '(' at '{_text[_at..]}'");
    }

    private LiteralExpression Number()
    {
        int start = _at;
        NumberScanner.Scanned number = NumberScanner.Decimal(_text, ref _at);
        int end = _at;
        Peek();
        if (UnitTable.LongestAt(_text, _at) is { } found)
        {
            _at += found.Length;
            return new LiteralExpression(_source, start, _at, found.Unit.ToWorking(number.Value, number.Exact), found.Unit);
        }

        if (_at < _text.Length && (char.IsLetter(_text[_at]) || _text[_at] is '%' or '°'))
        {
            int unitAt = _at;
            string word = Word();
            throw new ValueException(unitAt, $"{UnitTable.Unknown(word, [])}{(IsName(word) ? $" For a parameter write {_text[start..end]} * {word}" : string.Empty)}");
        }

        return new LiteralExpression(_source, start, end, number.Value, null);
    }

    private Expression NameOrCall()
    {
        int start = _at;
        string word = Word();
        int end = _at;
        if (Peek() != '(')
        {
            var name = new NameExpression(_source, start, end);
            _source.AddName(name);
            return name;
        }

        if (!Functions.Names.Contains(word, StringComparer.Ordinal))
        {
            throw new ValueException(start, $"unknown function '{word}'{NearestName.Suggest(word, Functions.Names)}");
        }

        int open = _at++;
        var arguments = new List<Expression> { Sum() };
        while (Peek() == ',')
        {
            _at++;
            arguments.Add(Sum());
        }

        Close(open);
        return Functions.WrongCount(word, arguments.Count) is { } wrong
            ? throw new ValueException(start, wrong)
            : new CallExpression(_source, start, _at, word, arguments);
    }

    private void Close(int open)
    {
        char? next = Peek();
        if (next == ')')
        {
            _at++;
            return;
        }

        throw next is null
            ? new ValueException(open, "this '(' is never closed; in a list [..] a value that holds a comma needs quotes round it")
            : new ValueException(_at, $"expected ')' or an operator before '{_text[_at..]}'");
    }

    private string Word()
    {
        int start = _at;
        while (_at < _text.Length && (char.IsLetterOrDigit(_text[_at]) || _text[_at] is '_' or '-' or '%' or '°'))
        {
            _at++;
        }

        return _text[start.._at];
    }

    private static bool IsName(string word) => SpecName.IsName(word);

    /// <summary>Skips blanks and looks at the next character.</summary>
    private char? Peek()
    {
        while (_at < _text.Length && _text[_at] is ' ' or '\t' or '\n' or '\u00a0')
        {
            _at++;
        }

        return _at < _text.Length ? _text[_at] : null;
    }
}
