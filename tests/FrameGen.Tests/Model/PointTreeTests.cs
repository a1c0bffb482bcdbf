using CsCheck;
using FrameGen.Geometry;
using FrameGen.Model.Resolving;
using Xunit;

namespace FrameGen.Tests.Model;

public sealed class PointTreeTests
{
    // Whole numbers make points that coincide, lie in one plane and lie exactly at the distance asked for.
    private static readonly Gen<Vector3> Points =
        Gen.Select(Gen.Int[-6, 6], Gen.Int[-6, 6], Gen.Int[-2, 2], (x, y, z) => new Vector3(x, y, z));

    private static readonly Gen<Vector3> Places =
        Gen.Select(Gen.Double[-8, 8], Gen.Double[-8, 8], Gen.Double[-3, 3], (x, y, z) => new Vector3(x, y, z));

    [Fact]
    public void Finds_what_a_look_at_every_point_finds() =>
        Gen.Select(Points.Array[0, 200], Places, Places, Gen.Double[0, 3]).Sample((points, from, to, distance) =>
        {
            var found = new List<int>();
            new PointTree(points).FindNear(from, to, distance, found);

            // Points at the very distance may fall on either side of it by rounding.
            Assert.Equal(found.Order(), found);
            Assert.All(found, i => Assert.True(PlainDistance(points[i], from, to) <= distance + 1e-9));
            Assert.Empty(Enumerable.Range(0, points.Length).Where(i => PlainDistance(points[i], from, to) < distance - 1e-9).Except(found));
        });

    [Fact]
    public void Finds_the_points_at_one_place() =>
        Gen.Select(Points.Array[1, 100], Gen.Int[0, 99]).Sample((points, pick) =>
        {
            Vector3 place = points[pick % points.Length];
            var found = new List<int>();
            new PointTree(points).FindNear(place, place, 0.1, found);

            Assert.Equal(Enumerable.Range(0, points.Length).Where(i => points[i] == place), found);
        });

    // Area of the parallelogram over its base, where the foot lies between the ends; else the nearer end.
    private static double PlainDistance(Vector3 point, Vector3 from, Vector3 to)
    {
        double toFrom = (point - from).Length;
        double toTo = (point - to).Length;
        double side = (to - from).Length;
        return side == 0 || toFrom * toFrom >= (toTo * toTo) + (side * side) || toTo * toTo >= (toFrom * toFrom) + (side * side)
            ? Math.Min(toFrom, toTo)
            : (point - from).Cross(to - from).Length / side;
    }
}
