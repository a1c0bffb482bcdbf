using FrameGen.Geometry;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Flattens load cases: each takes in the loads and self weight of those it adds, times their factors.</summary>
internal sealed class CaseResolver
{
    /// <summary>Loads of all flat cases together: beyond any frame, and short of what a machine can hold.</summary>
    internal const int MostLoads = 2_000_000;

    private readonly IReadOnlyList<CaseSpec> _specs;
    private readonly Frame _frame;
    private readonly NameIndex _names;
    private readonly List<(int Case, double Factor)>[] _adds;

    private CaseResolver(IReadOnlyList<CaseSpec> specs, Frame frame)
    {
        (_specs, _frame) = (specs, frame);
        _names = NameIndex.Of("case", specs.Select(c => c.Name), frame.Diagnostics);
        _adds = [.. specs.Select(AddsOf)];
    }

    /// <summary>All cases in the spec's order; null for one with an error.</summary>
    /// <param name="specs">As written.</param>
    /// <param name="frame">What they act on.</param>
    /// <param name="supports">What holds it.</param>
    /// <param name="names">Numbers of the cases.</param>
    public static LoadCase?[] Resolve(IReadOnlyList<CaseSpec> specs, Frame frame, SupportResolver supports, out NameIndex names)
    {
        var resolver = new CaseResolver(specs, frame);
        names = resolver._names;
        return resolver.Flatten(supports);
    }

    private List<(int Case, double Factor)> AddsOf(CaseSpec spec)
    {
        var adds = new List<(int, double)>();
        foreach ((Placed<string> name, SpecQuantity factor) in spec.Add)
        {
            int? added = _names.Find(name, $"case {spec.Name.Value}: add", _frame.Diagnostics);
            double? times = _frame.Values.Of(factor);
            if (added is { } number && times is { } f)
            {
                adds.Add((number, f));
            }
        }

        return adds;
    }

    private LoadCase?[] Flatten(SupportResolver supports)
    {
        int count = _specs.Count;
        var own = new LoadResolver[count];
        var weights = new Vector3?[count];
        var acting = new IReadOnlyList<int>?[count];
        for (int i = 0; i < count; i++)
        {
            own[i] = LoadResolver.Of(_specs[i], _frame);
            weights[i] = _frame.Values.OrZero(_specs[i].SelfWeight);
            acting[i] = supports.Acting(_specs[i].Supports, withTwins: true, $"case {_specs[i].Name.Value}", _specs[i].Name.At);
        }

        var cases = new LoadCase?[count];
        if (OrderOfAdding() is not { } order)
        {
            return cases;
        }

        SortedDictionary<int, double>[] factors = Factors(order);
        if (!AreFew(own, factors))
        {
            return cases;
        }

        for (int i = 0; i < count; i++)
        {
            if (acting[i] is { } held && factors[i].Keys.All(c => weights[c] is not null))
            {
                cases[i] = Sum(i, own, weights, factors[i], held);
            }
        }

        return cases;
    }

    // Every case after those it adds; null when some add each other in a ring.
    private List<int>? OrderOfAdding()
    {
        var order = new List<int>();
        bool isSound = true;
        DependencyOrder.Visit([.. _adds.Select(adds => adds.ConvertAll(a => (int?)a.Case))], order.Add, (way, _) =>
        {
            SayRing(way);
            isSound = false;
        });
        return isSound ? order : null;
    }

    private void SayRing(IReadOnlyList<int> way)
    {
        CaseSpec first = _specs[way[0]];
        string names = string.Join(" -> ", way.Select(c => _specs[c].Name.Value));
        _frame.Diagnostics.Error(first.Name.At, $"case {first.Name.Value} adds itself: {names}; leave one of them out of add");
    }

    // How often each case's own loads count in a case: cases that are reached on many ways are summed up, not repeated.
    private SortedDictionary<int, double>[] Factors(List<int> order)
    {
        var factors = new SortedDictionary<int, double>[_specs.Count];
        foreach (int current in order)
        {
            factors[current] = new SortedDictionary<int, double> { [current] = 1 };
            foreach ((int added, double times) in _adds[current])
            {
                foreach ((int source, double factor) in factors[added])
                {
                    factors[current][source] = factors[current].GetValueOrDefault(source) + (times * factor);
                }
            }
        }

        return factors;
    }

    private bool AreFew(LoadResolver[] own, SortedDictionary<int, double>[] factors)
    {
        long loads = 0;
        foreach (SortedDictionary<int, double> sum in factors)
        {
            loads += sum.Keys.Sum(c => (long)own[c].NodeLoads.Count + own[c].LineLoads.Count + own[c].PointLoads.Count);
        }

        if (loads <= MostLoads)
        {
            return true;
        }

        _frame.Diagnostics.Error(
            _specs[0].Name.At, $"the cases have {loads} loads when all that they add is taken in, and may have {MostLoads}; write fewer cases");
        return false;
    }

    private LoadCase Sum(int number, LoadResolver[] own, Vector3?[] weights, SortedDictionary<int, double> factors, IReadOnlyList<int> held)
    {
        Vector3 weight = Vector3.Zero;
        var nodeLoads = new List<NodeLoad>();
        var lineLoads = new List<LineLoad>();
        var pointLoads = new List<PointLoad>();
        foreach ((int source, double k) in factors.OrderBy(f => f.Key != number))
        {
            weight += k * weights[source]!.Value;
            nodeLoads.AddRange(own[source].NodeLoads.Select(l => new NodeLoad(l.Node, k * l.Force, k * l.Moment)));
            lineLoads.AddRange(own[source].LineLoads.Select(l => new LineLoad(l.Tube, k * l.PerLength)));
            pointLoads.AddRange(own[source].PointLoads.Select(l => new PointLoad(l.Tube, l.Distance, k * l.Force, k * l.Moment)));
        }

        CaseSpec spec = _specs[number];
        if (weight == Vector3.Zero && nodeLoads.Count + lineLoads.Count + pointLoads.Count == 0)
        {
            _frame.Diagnostics.Warning(spec.Name.At, $"case {spec.Name.Value} has no loads and no self weight; everything in it will be 0");
        }

        return new LoadCase(spec.Name.Value, weight, nodeLoads, lineLoads, pointLoads, held, spec.Name.At);
    }
}
