using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Sizing;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Acceptance.Formats;

/// <summary>Tubes that are hard to draw: thin and thick, short, long names, both ends cut, inches.</summary>
internal static class DrawnTubes
{
    private static readonly DisplaySpec Inches = new(LengthUnit.Inch, 16, MassUnit.Pound, ForceUnit.PoundForce);

    private static readonly (string Name, DrawnTube Tube)[] All =
    [
        ("equal tubes at 90 degrees", new(new RoundTube(38, 1.5), 846)
        {
            From = DrawnTube.Saddle(19, 19, 90, 0, 1),
            To = DrawnTube.Saddle(19, 25, 60, 4, 2),
        }),
        ("16 mm tube at 35 degrees", new(new RoundTube(16, 1.5), 400)
        {
            From = DrawnTube.Saddle(8, 8, 35, 0, 0),
            To = DrawnTube.Saddle(8, 12, 35, 0, 3),
            Mates = ["bow-left", "shaft-l"],
        }),
        ("168 mm tube, asymmetric double cope", new(new RoundTube(168.3, 4), 1500)
        {
            From = DrawnTube.Deeper(DrawnTube.Saddle(84.15, 90, 50, 3, 1), DrawnTube.Saddle(84.15, 90, 70, 0, 3.6)),
            To = DrawnTube.Saddle(84.15, 84.15, 45, 0, 1),
        }),
        ("inches on letter, targets missed", new(new RoundTube(30, 1.5), 300)
        {
            To = DrawnTube.Saddle(15, 19, 45, 0, 1),
            Status = SizingStatus.Unmet,
            Page = PageSize.Letter,
            Display = Inches,
        }),
        ("short tube", new(new RoundTube(30, 1.5), 90)
        {
            From = DrawnTube.Saddle(15, 19, 60, 0, 1),
            To = DrawnTube.Saddle(15, 19, 45, 0, 1),
            Status = SizingStatus.Unmet,
        }),
        ("ends that nearly meet", new(new RoundTube(30, 1.5), 64)
        {
            From = DrawnTube.Saddle(15, 19, 60, 0, 1),
            To = DrawnTube.Saddle(15, 19, 45, 0, 4),
        }),
        ("miter", new(new RoundTube(42.4, 2.6), 700)
        {
            From = c => 21.2 * Math.Tan(Math.PI / 8) * Math.Cos(c),
            FittedAs = CutKind.Miter,
        }),
        ("names of 64 letters, ten tubes, 8 mm rod", new(new Rod(8), 120)
        {
            From = DrawnTube.Saddle(4, 8, 50, 1, 2),
            Names = [.. Enumerable.Range(0, 10).Select(i => $"a-tube-with-quite-a-long-name-that-still-fits-the-limit-of-64-le-{i}")],
            Mates = ["MMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMMM"],
            Title = "A frame whose title goes on and on, so that it takes several lines on a narrow piece of paper",
        }),
        ("quarter-inch tube on letter", new(new RoundTube(6.35, 0.7), 371)
        {
            To = DrawnTube.Saddle(3.175, 9.5, 80, 0, 1),
            Page = PageSize.Letter,
            Display = Inches,
        }),
        ("six places in the mark and thick paper", new(new RoundTube(25, 2), 300)
        {
            From = DrawnTube.Saddle(12.5, 16, 70, 2, 5),
            Mark = "T123-A",
            Paper = 1,
            Page = PageSize.A3,
        }),
        ("16 mm tube, many mates, long names", new(new RoundTube(16, 1), 260)
        {
            From = DrawnTube.Deeper(DrawnTube.Saddle(8, 9, 35, 0, 0.5), DrawnTube.Saddle(8, 10, 60, 1, 3)),
            To = DrawnTube.Saddle(8, 30, 35, 20, 5),
            Names = [.. Enumerable.Range(0, 6).Select(i => $"a-stay-with-a-name-of-some-length-{i}")],
            Mates = [.. Enumerable.Range(0, 7).Select(i => $"a-mate-with-quite-a-name-{i}")],
            Title = "A frame whose title goes on and on, so that it takes several lines on a narrow piece of paper",
        }),
        ("16 mm tube, short, both ends at 35 degrees", new(new RoundTube(16, 1), 60)
        {
            From = DrawnTube.Saddle(8, 10, 35, 0, 0),
            To = DrawnTube.Saddle(8, 10, 35, 0, 0),
            Status = SizingStatus.Unmet,
        }),
        ("168 mm tube at 25 degrees, six mates", new(new RoundTube(168.3, 6.3), 700)
        {
            From = DrawnTube.Saddle(84.15, 110, 25, 0, 2),
            To = DrawnTube.Saddle(84.15, 110, 25, 10, 4),
            Mates = [.. Enumerable.Range(0, 6).Select(i => $"post-{i}")],
        }),
        ("168 mm tube, short, six mates", new(new RoundTube(168.3, 4), 420)
        {
            From = DrawnTube.Deeper(DrawnTube.Saddle(84.15, 100, 60, 0, 0), DrawnTube.Saddle(84.15, 90, 75, 0, 2)),
            To = DrawnTube.Saddle(84.15, 168, 70, 60, 1),
            Mates = [.. Enumerable.Range(0, 6).Select(i => $"a-mate-with-quite-a-name-{i}")],
            Display = Inches,
            Page = PageSize.Letter,
        }),
        ("square ends", new(new RoundTube(30, 1.5), 300)),
    ];

    public static TheoryData<string> Names { get; } = [.. All.Select(t => t.Name)];

    public static TheoryData<string> FittedNames { get; } = [.. All.Where(t => (t.Tube.From ?? t.Tube.To) is not null).Select(t => t.Name)];

    public static DrawnTube Named(string name) => All.Single(t => string.Equals(t.Name, name, StringComparison.Ordinal)).Tube;
}
