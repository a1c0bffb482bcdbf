namespace FrameGen.Mechanics.Frames;

/// <summary>Pairs up every front with the earlier ones that reach into it; those of a domain reach no further than its boundary, which then takes their place.</summary>
internal sealed class FrontConnector
{
    private const int Six = SymbolicFactor.Six;

    private readonly Front[] _fronts;
    private readonly int[] _frontOf;
    private readonly Domain[] _domains;

    // Sources are fronts, then the domains' boundaries. Of each: its rows below, and the first of them that is still to come.
    private readonly Front[] _sources;
    private readonly int[][] _rows;
    private readonly int[] _next;
    private readonly List<int>[] _waiting;
    private readonly List<FrontUpdate>[] _toBoundary;
    private readonly List<FrontUpdate>[] _onward;

    // The place of a column in the front at hand, in nodes; what it holds for other columns is never asked.
    private readonly int[] _place;
    private readonly List<FrontUpdate.Run> _runs = [];

    private FrontConnector(Front[] fronts, int[] frontOf, Domain[] domains)
    {
        (_fronts, _frontOf, _domains) = (fronts, frontOf, domains);
        _sources = [.. fronts, .. domains.Select(domain => domain.Boundary)];
        _rows = [.. fronts.Select(front => front.Below), .. domains.Select(domain => domain.Outside)];
        _next = new int[_sources.Length];
        _waiting = Lists<int>(fronts.Length);
        _toBoundary = Lists<FrontUpdate>(domains.Length);
        _onward = Lists<FrontUpdate>(domains.Length);
        _place = new int[frontOf.Length];
    }

    /// <summary>Connects the fronts of a factor.</summary>
    /// <param name="fronts">Fronts, children before parents.</param>
    /// <param name="frontOf">Front of each column.</param>
    /// <param name="domains">Parts whose rows beyond are not kept, in their order.</param>
    public static void Connect(Front[] fronts, int[] frontOf, Domain[] domains) => new FrontConnector(fronts, frontOf, domains).Run();

    private void Run()
    {
        int d = 0;
        for (int s = 0; s < _fronts.Length; s++)
        {
            while (d < _domains.Length && _domains[d].EndFront <= s)
            {
                d++;
            }

            Domain? domain = d < _domains.Length && _domains[d].FirstFront <= s ? _domains[d] : null;
            ConnectTo(s, domain, d);
            Wait(s, domain, d);
            if (domain is not null && domain.EndFront == s + 1)
            {
                Wait(_fronts.Length + d, null, d);
            }
        }

        for (int k = 0; k < _domains.Length; k++)
        {
            _domains[k].ToBoundary = [.. _toBoundary[k]];
            _domains[k].Onward = [.. _onward[k]];
        }
    }

    private void ConnectTo(int s, Domain? domain, int d)
    {
        Front front = _fronts[s];
        for (int k = 0; k < front.Columns; k++)
        {
            _place[front.First + k] = k;
        }

        SetPlaces(front.Below, front.Columns);
        List<int> sources = _waiting[s];
        sources.Sort();
        var updates = new List<FrontUpdate>();
        foreach (int source in sources)
        {
            FrontUpdate update = Update(source, front, front.First + front.Columns);
            (source < _fronts.Length ? updates : _onward[source - _fronts.Length]).Add(update);
        }

        foreach (int source in sources)
        {
            Wait(source, domain, d);
        }

        sources.Clear();
        front.Updates = [.. updates];
    }

    /// <summary>Puts a source down for the front that owns its next row; one of a domain that reaches beyond it, for the domain's boundary.</summary>
    private void Wait(int source, Domain? domain, int d)
    {
        if (_next[source] >= _rows[source].Length)
        {
            return;
        }

        int column = _rows[source][_next[source]];
        if (domain is not null && column >= domain.EndColumn)
        {
            SetPlaces(domain.Outside, 0);
            _toBoundary[d].Add(Update(source, domain.Boundary, _frontOf.Length));
        }
        else
        {
            _waiting[_frontOf[column]].Add(source);
        }
    }

    private FrontUpdate Update(int source, Front target, int endColumn)
    {
        int[] rows = _rows[source];
        int start = _next[source];
        int end = start;
        while (end < rows.Length && rows[end] < endColumn)
        {
            end++;
        }

        _next[source] = end;
        _runs.Clear();
        for (int a = start; a < rows.Length; a++)
        {
            int row = Six * _place[rows[a]];
            if (_runs.Count > 0 && _runs[^1] is var last && last.Row + (Six * (a - last.Start)) == row)
            {
                _runs[^1] = last with { End = a + 1 };
            }
            else
            {
                _runs.Add(new FrontUpdate.Run(a, a + 1, row));
            }
        }

        return new FrontUpdate(_sources[source], target, start, end, [.. _runs]);
    }

    private void SetPlaces(int[] columns, int from)
    {
        for (int a = 0; a < columns.Length; a++)
        {
            _place[columns[a]] = from + a;
        }
    }

    private static List<T>[] Lists<T>(int count)
    {
        var lists = new List<T>[count];
        for (int k = 0; k < count; k++)
        {
            lists[k] = [];
        }

        return lists;
    }
}
