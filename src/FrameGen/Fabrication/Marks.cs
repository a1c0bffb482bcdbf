using System.Globalization;
using FrameGen.Model;

namespace FrameGen.Fabrication;

/// <summary>Short names of parts, which are file names too: <c>braces-438kt</c>.</summary>
/// <remarks>
/// The group of the first tube, the cut length in whole millimetres, and two letters that stand for the shape of both ends. Nothing of
/// it counts the parts of the frame, so a tube more or less leaves the other marks as they are, and a part whose ends change gets
/// another mark than the pieces already on the bench. Two shapes that fall on the same letters are told apart by the next ones, in
/// the order of the spec. A mark ends in letters after a digit, which no other group's name followed by a mark can spell.
/// </remarks>
internal static class Marks
{
    /// <summary>No vowels, so that no words come out, and no letter that looks like a digit.</summary>
    private const string Letters = "bcdfghjkmnpqrstvwxyz";

    /// <summary>The marks of parts, in their order; none twice, whatever the case of its letters.</summary>
    public static IReadOnlyList<string> Of(FrameModel model, IReadOnlyList<PartGroup> groups)
    {
        var used = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        var marks = new List<string>(groups.Count);
        foreach (PartGroup group in groups)
        {
            string stem = Stem(model, group.Shape);
            int code = Code(group.Shape);
            int square = Letters.Length * Letters.Length;
            string mark;
            int attempt = 0;
            do
            {
                mark = stem + Spell(code + attempt, attempt < square ? 2 : 4);
                attempt++;
            }
            while (!used.Add(mark));

            marks.Add(mark);
        }

        return marks;
    }

    private static string Stem(FrameModel model, PartShape shape)
    {
        // Sizes lie on halves often and just above or below one never: those are rounding.
        long length = (long)Math.Floor(shape.Cut.CutLength + 0.5 + Lengths.Same);
        return string.Create(CultureInfo.InvariantCulture, $"{model.Groups[model.Tubes[shape.Cut.Tube].Group].Name}-{length}");
    }

    /// <summary>A number below 400 from the section and the shape: FNV-1a, folded.</summary>
    private static int Code(PartShape shape)
    {
        ulong hash = 14695981039346656037;
        void Add(ulong value) => hash = unchecked((hash ^ value) * 1099511628211);
        foreach (char c in shape.Section.Name)
        {
            Add(c);
        }

        foreach (long number in shape.Fingerprint())
        {
            Add(unchecked((ulong)number));
        }

        return (int)((hash ^ (hash >> 32)) % (ulong)(Letters.Length * Letters.Length));
    }

    private static string Spell(int number, int count)
    {
        Span<char> spelled = stackalloc char[count];
        for (int i = count - 1; i >= 0; i--)
        {
            spelled[i] = Letters[number % Letters.Length];
            number /= Letters.Length;
        }

        return new string(spelled);
    }
}
