using FrameGen.Geometry;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Spec;

namespace FrameGen.Tests.Joints;

/// <summary>Several tubes that leave one node, largest first, the first running out: an invented scatter from a seed.</summary>
internal sealed class Cluster
{
    private Cluster(FrameBuilder frame, IReadOnlyList<Vector3> directions, IReadOnlyList<Section> sections, IReadOnlyList<Vector3> offsets) =>
        (Frame, Directions, Sections, Offsets) = (frame, directions, sections, offsets);

    public FrameBuilder Frame { get; }

    public IReadOnlyList<Vector3> Directions { get; }

    public IReadOnlyList<Section> Sections { get; }

    public IReadOnlyList<Vector3> Offsets { get; }

    public static Cluster Scatter(
        int seed,
        CutMode mode,
        bool through,
        int count = 4,
        double offset = 0,
        Func<Vector3, Vector3>? move = null,
        double tolerance = 0.02)
    {
        Random random = new(seed);
        List<Vector3> directions = Spread(random, count);
        List<Section> sections = [];
        List<Vector3> offsets = [];
        double size = 50;
        for (int i = 0; i < count; i++)
        {
            sections.Add(i == count - 1 && random.Next(3) == 0 ? new Rod(size / 2) : new RoundTube(size, 1 + (3 * random.NextDouble())));
            size *= 0.75 + (0.25 * random.NextDouble());
            offsets.Add(i == 0 ? Vector3.Zero : offset * new Vector3(random.NextDouble() - 0.5, random.NextDouble() - 0.5, random.NextDouble() - 0.5));
        }

        move ??= static v => v;
        Vector3 origin = move(Vector3.Zero);
        Vector3 Turn(Vector3 v) => move(v) - origin;
        FrameBuilder frame = new() { Mode = mode, Tolerance = tolerance };
        int node = frame.Node(origin, through ? 0 : null);
        List<TubeEndId> ends = [];
        for (int i = 0; i < count; i++)
        {
            Vector3 offsetHere = Turn(offsets[i]);
            Vector3 point = origin + offsetHere;
            if (i == 0 && through)
            {
                int back = frame.Node(origin - (500 * Turn(directions[0])));
                int on = frame.Node(origin + (500 * Turn(directions[0])));
                frame.Tube(back, on, sections[0]);
                continue;
            }

            int far = frame.Node(point + (400 * Turn(directions[i])));
            bool reversed = i % 2 == 1;
            int tube = reversed
                ? frame.Tube(far, node, sections[i], toOffset: offsetHere)
                : frame.Tube(node, far, sections[i], fromOffset: offsetHere);
            ends.Add(new TubeEndId(tube, reversed ? End.To : End.From));
        }

        frame.Joint(node, through ? 0 : null, through ? Corner.None : Corner.RunOut, [.. ends]);
        return new Cluster(frame, directions, sections, offsets);
    }

    private static List<Vector3> Spread(Random random, int count)
    {
        List<Vector3> directions = [];
        for (int tries = 0; directions.Count < count; tries++)
        {
            if (tries % 1000 == 999)
            {
                directions.Clear();
            }

            Vector3 candidate = new((2 * random.NextDouble()) - 1, (2 * random.NextDouble()) - 1, (2 * random.NextDouble()) - 1);
            if (candidate.Length is < 0.2 or > 1)
            {
                continue;
            }

            // Apart by 35 to 125 degrees, so that nothing runs out too far.
            candidate = candidate.Normalized();
            if (directions.All(d => d.AngleTo(candidate) is > 0.61 and < 2.18))
            {
                directions.Add(candidate);
            }
        }

        return directions;
    }
}
