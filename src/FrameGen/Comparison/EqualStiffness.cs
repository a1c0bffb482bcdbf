using FrameGen.Mechanics.Materials;

namespace FrameGen.Comparison;

/// <summary>Finds the size of a shape that is just stiff enough.</summary>
public static class EqualStiffness
{
    private const double LargestSize = 1e7;
    private const double SmallestSize = 1e-7;
    private const double Converged = 1e-14;

    /// <summary>The profile of a shape and metal that has just the stiffness needed, with the thinnest wall that a rule allows.</summary>
    /// <param name="shape">The shape.</param>
    /// <param name="material">The metal.</param>
    /// <param name="need">The stiffness.</param>
    /// <param name="walls">The wall's limits; they mean nothing for a solid bar.</param>
    /// <returns>Null where no tube of the shape has so little: the least wall makes it a solid bar, or the rule asks for more wall than the shape has room for.</returns>
    public static Profile? Find(ComparedShape shape, Material material, StiffnessNeed need, WallRule walls)
    {
        double smallest = SmallestSize;
        if (shape.LargestWall is { } share)
        {
            if (1 / (walls.Slenderness ?? double.PositiveInfinity) >= share)
            {
                return null;
            }

            // Just large enough for a bore.
            smallest = Math.Max(smallest, (walls.Least ?? 0) / share * (1 + 1e-9));
        }

        Profile At(double logSize)
        {
            double size = Math.Exp(logSize);
            return shape.Make(size, walls.WallOf(size));
        }

        double low = Math.Log(smallest);
        double high = Math.Log(LargestSize);
        double Excess(double logSize) => Math.Log(need.ShareOf(At(logSize), material));
        double below = Excess(low);
        double above = Excess(high);
        return below > 0 || above < 0 ? null : At(Root(Excess, low, below, high, above));
    }

    // False position, the kept end's value halved (Illinois): stiffness is close to a power of the size, a straight line in logarithms.
    private static double Root(Func<double, double> excess, double low, double below, double high, double above)
    {
        int side = 0;
        while (high - low > Converged * Math.Max(1, Math.Abs(high)))
        {
            double middle = low + ((high - low) * below / (below - above));
            middle = middle > low && middle < high ? middle : low + ((high - low) / 2);
            if (!(middle > low && middle < high))
            {
                break;
            }

            double value = excess(middle);
            if (value == 0)
            {
                return middle;
            }

            if (value < 0)
            {
                (low, below, above) = (middle, value, side == -1 ? above / 2 : above);
                side = -1;
            }
            else
            {
                (high, above, below) = (middle, value, side == 1 ? below / 2 : below);
                side = 1;
            }
        }

        return low + ((high - low) / 2);
    }
}
