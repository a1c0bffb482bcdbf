using FrameGen.Diagnostics;
using FrameGen.Mechanics.Sections;
using FrameGen.Spec;

namespace FrameGen.Model.Resolving;

/// <summary>Gives groups the sizes that were measured on their tubes, in place of the nominal ones.</summary>
/// <remarks>
/// Mills keep outer sizes within about 1 % (at least 0.5 mm on small ones) and walls within about 10 % (EN 10219-2, EN 10305-1). What is a
/// little farther off is warned of; what is far off was measured on another tube, or misread.
/// </remarks>
internal static class MeasuredSizes
{
    private const double OddOuter = 0.02;
    private const double WrongOuter = 0.10;
    private const double OddWall = 0.12;
    private const double WrongWall = 0.25;
    private const double LeastOdd = 0.5;

    /// <summary>Puts every measured size in place; what can't be is an error.</summary>
    /// <param name="specs">As written.</param>
    /// <param name="names">Of the groups.</param>
    /// <param name="groups">By number; null for one with an error, of which nothing more is said.</param>
    /// <param name="values">Evaluates, and takes errors and warnings.</param>
    public static void Apply(IReadOnlyList<MeasuredSpec> specs, NameIndex names, TubeGroup?[] groups, SpecValues values)
    {
        foreach (MeasuredSpec spec in specs)
        {
            if (names.Find(spec.Group, "measured", values.Diagnostics) is not { } number || groups[number] is not { } group)
            {
                continue;
            }

            if (!group.IsFixed)
            {
                values.Diagnostics.Error(
                    spec.Group.At,
                    $"measured: group {group.Name} still chooses its size, so that there is no tube of it to measure; freeze the sizes, or give the "
                    + "group the section that you hold (section: ...) in place of choose");
            }
            else if (Measure(spec, group.Candidates[0].Nominal, values) is { } measured)
            {
                groups[number] = group with { Candidates = [group.Candidates[0].MeasuredAs(measured)] };
            }
        }
    }

    private static Section? Measure(MeasuredSpec spec, Section nominal, SpecValues values)
    {
        var measure = new Measuring(spec, nominal, values);
        double? od = measure.Outer("od", spec.Od, nominal.Height, IsRound(nominal));
        double? height = measure.Outer("height", spec.Height, nominal.Height, !IsRound(nominal));
        double? width = measure.Outer("width", spec.Width, nominal.Width, !IsRound(nominal));
        double wall = measure.Wall(spec.Wall) ?? nominal.Wall;
        if (!measure.IsSound)
        {
            return null;
        }

        // One side of a square stands for both.
        bool square = nominal is FlatSidedTube && nominal.Height == nominal.Width;
        double h = od ?? height ?? (square ? width : null) ?? nominal.Height;
        double w = od ?? width ?? (square ? height : null) ?? nominal.Width;
        try
        {
            return nominal switch
            {
                RoundTube => new RoundTube(h, wall),
                Rod => new Rod(h),
                FlatSidedTube { HasOwnInnerCorner: true } tube => new FlatSidedTube(h, w, wall, tube.OuterCorner, tube.InnerCorner),
                FlatSidedTube tube => new FlatSidedTube(h, w, wall, tube.OuterCorner),
                EllipseTube => new EllipseTube(h, w, wall),
                _ => throw new InvalidOperationException($"How a {nominal.Shape} is measured is not written yet."),
            };
        }
        catch (ArgumentOutOfRangeException)
        {
            string size = IsRound(nominal) ? $"{h:0.###} mm" : $"{h:0.###} x {w:0.###} mm";
            measure.Error(spec.Wall?.At ?? spec.Group.At, $"a wall of {wall:0.###} mm leaves no bore in a tube of {size}; measure again");
            return null;
        }
    }

    private static bool IsRound(Section section) => section is RoundTube or Rod;

    /// <summary>Takes the measures of one group, and says what is odd about them.</summary>
    private sealed class Measuring(MeasuredSpec spec, Section nominal, SpecValues values)
    {
        private readonly string _whose = $"measured: group {spec.Group.Value}";

        public bool IsSound { get; private set; } = true;

        public void Error(SourcePlace at, string what)
        {
            IsSound = false;
            values.Diagnostics.Error(at, $"{_whose}: {what}");
        }

        public double? Outer(string key, SpecQuantity? written, double expected, bool belongs)
        {
            if (written is null)
            {
                return null;
            }

            if (!belongs)
            {
                string has = IsRound(nominal) ? "od" : "height and width";
                Error(written.At, $"{nominal.Name} has no {key}: it is measured by {has}; write that instead");
                return null;
            }

            return Near(key, written, expected, Math.Max(OddOuter * expected, LeastOdd), WrongOuter * expected);
        }

        public double? Wall(SpecQuantity? written)
        {
            if (written is null)
            {
                return null;
            }

            if (nominal is Rod)
            {
                Error(written.At, $"{nominal.Name} has no wall: it is measured by od alone; leave the wall out");
                return null;
            }

            return Near("wall", written, nominal.Wall, OddWall * nominal.Wall, WrongWall * nominal.Wall);
        }

        private double? Near(string key, SpecQuantity written, double expected, double odd, double wrong)
        {
            if (values.Positive(written, $"{_whose}: {key}") is not { } size)
            {
                IsSound = false;
                return null;
            }

            double off = Math.Abs(size - expected);
            string says = $"{key} {size:0.###} mm is {100 * off / expected:0.#} % off {nominal.Name}";
            if (off > wrong + Lengths.Same)
            {
                Error(written.At, $"{says}: that is another tube; measure again, or give the group the section that you hold");
                return null;
            }

            if (off > odd + Lengths.Same)
            {
                values.Diagnostics.Warning(written.At, $"{_whose}: {says}, more than mills usually leave; measure again to be sure");
            }

            return size;
        }
    }
}
