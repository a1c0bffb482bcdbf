using FrameGen.Mechanics.Sections;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>The ranges a group's sections must lie in, mm; a range that is not written lets everything through.</summary>
internal sealed class SizeLimits
{
    private readonly List<Limit> _limits = [];

    private SizeLimits()
    {
    }

    /// <summary>The limits as a spec writes them, for messages: <c>od 25 mm .. 40 mm and wall 1.5 mm ..</c>; empty for none.</summary>
    public string Text => string.Join(" and ", _limits.Select(l => $"{l.Key} {l.Text}"));

    /// <summary>Evaluates a group's ranges; null after an error.</summary>
    public static SizeLimits? Of(ChooseSpec choose, string whose, SpecValues values)
    {
        var limits = new SizeLimits();
        bool isSound = limits.Take("od", choose.Od, s => s.OuterSize, whose, values);
        isSound &= limits.Take("height", choose.Height, s => s.Height, whose, values);
        isSound &= limits.Take("width", choose.Width, s => s.Width, whose, values);
        isSound &= limits.Take("wall", choose.Wall, s => s.Wall, whose, values);
        return isSound ? limits : null;
    }

    /// <summary>By how much a section misses the ranges, mm, all together; 0 for one that lies in them all.</summary>
    public double Miss(Section section)
    {
        double miss = 0;
        foreach (Limit limit in _limits)
        {
            double size = limit.Of(section);
            double beside = Math.Max(limit.Min - size, size - limit.Max);

            // 1.5 in and 38.1 mm differ in the last bit.
            miss += beside > Lengths.Same ? beside : 0;
        }

        return miss;
    }

    /// <summary>The one range that a section misses; null where it misses none, or several.</summary>
    public (string Key, double Size, double By)? OnlyMiss(Section section)
    {
        (string Key, double Size, double By)? only = null;
        foreach (Limit limit in _limits)
        {
            double size = limit.Of(section);
            double by = size > limit.Max + Lengths.Same ? size - limit.Max : size < limit.Min - Lengths.Same ? size - limit.Min : 0;
            if (by != 0 && only is not null)
            {
                return null;
            }

            only = by != 0 ? (limit.Key, size, by) : only;
        }

        return only;
    }

    private bool Take(string key, RangeSpec? range, Func<Section, double> size, string whose, SpecValues values)
    {
        if (range is null)
        {
            return true;
        }

        double? min = range.Min is null ? double.NegativeInfinity : values.NotNegative(range.Min, $"{whose}: the lower end of {key}");
        double? max = range.Max is null ? double.PositiveInfinity : values.Positive(range.Max, $"{whose}: the upper end of {key}");
        if (min is not { } low || max is not { } high)
        {
            return false;
        }

        if (low > high + Lengths.Same)
        {
            values.Diagnostics.Error(range.At, $"{whose}: the range {key} {range.Text} ends below its beginning; write the smaller size first");
            return false;
        }

        _limits.Add(new Limit(key, range.Text, low, high, size));
        return true;
    }

    private sealed record Limit(string Key, string Text, double Min, double Max, Func<Section, double> Of);
}
