using System.Numerics;

namespace FrameGen.Sizing.Program;

/// <summary>The options still open at a place of the search: a bit a variable.</summary>
internal sealed class OptionSet
{
    private readonly ulong[] _bits;

    private OptionSet(ulong[] bits) => _bits = bits;

    public bool this[int variable] => (_bits[variable >> 6] >> (variable & 63) & 1) != 0;

    /// <summary>All of so many.</summary>
    public static OptionSet All(int variables)
    {
        var bits = new ulong[(variables + 63) / 64];
        for (int v = 0; v < variables; v++)
        {
            bits[v >> 6] |= 1UL << (v & 63);
        }

        return new OptionSet(bits);
    }

    public OptionSet Copy() => new([.. _bits]);

    public void Remove(int variable) => _bits[variable >> 6] &= ~(1UL << (variable & 63));

    /// <summary>How many of a range are left.</summary>
    public int CountIn(int first, int stop)
    {
        int count = 0;
        for (int v = first; v < stop;)
        {
            if ((v & 63) == 0 && v + 64 <= stop)
            {
                count += BitOperations.PopCount(_bits[v >> 6]);
                v += 64;
            }
            else
            {
                count += this[v] ? 1 : 0;
                v++;
            }
        }

        return count;
    }
}
