using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Model;
using Xunit;

namespace FrameGen.Tests.Fabrication;

/// <summary>A piece is the same piece wherever it lies; its mirror image is not.</summary>
public class PartMatchTests
{
    private const double Tolerance = 0.02;

    public static TheoryData<int> Seeds => [.. Enumerable.Range(0, 24)];

    [Theory]
    [MemberData(nameof(Seeds))]
    public void A_moved_piece_is_the_same_part(int seed)
    {
        CutFrame here = TwistedBrace.Cut(seed);
        CutFrame there = TwistedBrace.Cut(seed, TwistedBrace.Motion(seed));
        Placement placed = Found(here, there, mirrored: false);
        Assert.False(placed.Swapped);
        CurvesAgree(here.Tubes[2], there.Tubes[2], placed, mirrored: false);
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void A_piece_with_its_ends_changed_round_is_the_same_part(int seed)
    {
        CutFrame here = TwistedBrace.Cut(seed);
        CutFrame there = TwistedBrace.Cut(seed, TwistedBrace.Motion(seed), swapped: true);
        Placement placed = Found(here, there, mirrored: false);
        Assert.True(placed.Swapped);
        CurvesAgree(here.Tubes[2], there.Tubes[2], placed, mirrored: false);
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void A_mirror_image_is_the_opposite_hand_only(int seed)
    {
        CutFrame here = TwistedBrace.Cut(seed);
        Func<Vector3, Vector3> motion = TwistedBrace.Motion(seed);
        CutFrame there = TwistedBrace.Cut(seed, v => motion(TwistedBrace.Mirror(v)), swapped: seed % 3 == 0);
        Placement placed = Found(here, there, mirrored: true);
        CurvesAgree(here.Tubes[2], there.Tubes[2], placed, mirrored: true);
        (PartShape a, PartShape b) = (TwistedBrace.Shape(here), TwistedBrace.Shape(there));
        Assert.Null(new PartMatch(a, b, Tolerance).Find(mirrored: false));
        Assert.NotEqual(0, a.Chirality);
        Assert.Equal(-a.Chirality, b.Chirality);
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void The_mark_and_the_hand_lie_in_the_shape(int seed)
    {
        PartShape here = TwistedBrace.Shape(TwistedBrace.Cut(seed));
        foreach (bool swapped in (bool[])[false, true])
        {
            PartShape there = TwistedBrace.Shape(TwistedBrace.Cut(seed, TwistedBrace.Motion(seed), swapped));
            Assert.Equal(here.Fingerprint(), there.Fingerprint());
            Assert.Equal(here.Chirality, there.Chirality);
        }

        PartShape mirrored = TwistedBrace.Shape(TwistedBrace.Cut(seed, TwistedBrace.Mirror));
        Assert.Equal(here.Fingerprint(), mirrored.Fingerprint());
    }

    // 0.03 mm is more than the tolerance of 0.02 mm; 4 degrees are 0.7 mm on the skin.
    [Theory]
    [MemberData(nameof(Seeds))]
    public void A_piece_that_differs_by_more_than_the_tolerance_is_another_part(int seed)
    {
        CutFrame here = TwistedBrace.Cut(seed);
        CutFrame longer = TwistedBrace.Cut(seed, longer: 0.03);
        CutFrame twisted = TwistedBrace.Cut(seed, turned: Math.PI / 45);
        foreach (CutFrame there in (CutFrame[])[longer, twisted])
        {
            Assert.Null(new PartMatch(TwistedBrace.Shape(here), TwistedBrace.Shape(there), Tolerance).Find(mirrored: false));
        }

        CutFrame nearly = TwistedBrace.Cut(seed, longer: 0.005);
        Assert.NotNull(new PartMatch(TwistedBrace.Shape(here), TwistedBrace.Shape(nearly), Tolerance).Find(mirrored: false));
    }

    private static Placement Found(CutFrame here, CutFrame there, bool mirrored)
    {
        Placement? placed = new PartMatch(TwistedBrace.Shape(here), TwistedBrace.Shape(there), Tolerance).Find(mirrored);
        Assert.NotNull(placed);
        Assert.Equal(TwistedBrace.Index, placed.Value.Tube);
        return placed.Value;
    }

    /// <summary>Clock angle on the tube = clock angle on the drawing (negated when swapped, or in a mirror) + turn, on the exact cuts.</summary>
    private static void CurvesAgree(CutTube drawn, CutTube other, Placement placed, bool mirrored)
    {
        foreach (End end in (End[])[End.From, End.To])
        {
            End source = placed.Swapped ? (end == End.From ? End.To : End.From) : end;
            for (int degrees = 0; degrees < 360; degrees += 7)
            {
                double onDrawing = double.DegreesToRadians(degrees);
                double onTube = (placed.Swapped == mirrored ? onDrawing : -onDrawing) + placed.Turn;
                Assert.Equal(drawn[source].Surface.At(onDrawing, 10), other[end].Surface.At(onTube, 10), 1e-6);
            }
        }
    }
}
