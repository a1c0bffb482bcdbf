using System.Globalization;
using System.Text.Json;
using FrameGen.Geometry;
using FrameGen.Model;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Acceptance.Builds;

/// <summary>
/// The shop's question: does the marked end fit? Each developed pattern is read by a foreign reader (ezdxf), rolled back onto its
/// tube and held against the mates, whose axes come from the set-up table: the definition of a fit needs no published value.
/// </summary>
public class RollBackTests
{
    private const double Tolerance = 0.02;

    // A through tube, a leaning brace cut to it, and a thinner one cut to both: nothing about the last end is symmetric.
    private const string DoubleCope = """
        framegen: 1
        title: Asymmetric double cope
        nodes:
          a: [-300 mm, 0 mm, 0 mm]
          b: [300 mm, 0 mm, 0 mm]
          m: {on: main, at: 50 %}
          c: [180 mm, 210 mm, 60 mm]
          d: [-70 mm, 190 mm, 260 mm]
        tubes:
          main:  {from: a, to: b, group: big}
          brace: {from: m, to: c, group: middle}
          stay:  {from: d, to: m, group: small}
        groups:
          big:    {material: E235+N, section: round 40 x 2 mm}
          middle: {material: E235+N, section: round 32 x 2 mm}
          small:  {material: E235+N, section: round 26 x 1.5 mm}
        fabrication: {cut: CUT}
        """;

    [Theory]
    [InlineData("contour")]
    [InlineData("radial")]
    public void A_rolled_back_double_cope_fits_its_mates_and_is_not_mirrored(string cut)
    {
        using BuiltFrame built = BuiltFrame.FromText(DoubleCope.Replace("CUT", cut, StringComparison.Ordinal)).Succeeded();
        Fit straight = Worst(built, "stay", atFrom: false, mirrored: false);
        Fit mirrored = Worst(built, "stay", atFrom: false, mirrored: true);

        Assert.InRange(straight.Gap, 0, Tolerance);
        Assert.InRange(straight.Interference, 0, Tolerance);
        Assert.True(mirrored.Gap > 1 || mirrored.Interference > 1, $"a mirrored pattern would fit as well: {mirrored}");
    }

    [Theory]
    [InlineData(90, 0)]
    [InlineData(75, 4)]
    [InlineData(60, 0)]
    [InlineData(45, -6)]
    [InlineData(30, 3)]
    [InlineData(20, 0)]
    public void A_rolled_back_brace_fits_at_any_angle_and_offset(double degrees, double offset)
    {
        (double sin, double cos) = Math.SinCos(degrees * Math.PI / 180);
        string text = string.Create(CultureInfo.InvariantCulture, $$"""
            framegen: 1
            title: One brace
            nodes:
              a: [-900 mm, 0 mm, 0 mm]
              b: [900 mm, 0 mm, 0 mm]
              m: {on: main, at: 50 %}
              c: [{{500 * cos:0.######}} mm, {{offset}} mm, {{500 * sin:0.######}} mm]
            tubes:
              main:  {from: a, to: b, group: big}
              brace: {from: {node: m, offset: [0 mm, {{offset}} mm, 0 mm]}, to: c, group: small}
            groups:
              big:   {material: E235+N, section: round 45 x 2 mm}
              small: {material: E235+N, section: round 30 x 2 mm}
            """);
        foreach (string cut in new[] { "contour", "radial" })
        {
            using BuiltFrame built = BuiltFrame.FromText($"{text}\nfabrication: {{cut: {cut}}}\n").Succeeded();
            Fit fit = Worst(built, "brace", atFrom: true, mirrored: false);
            Assert.InRange(fit.Gap, 0, Tolerance);
            Assert.InRange(fit.Interference, 0, Tolerance);
        }
    }

    [Theory]
    [InlineData("quayside-trailer")]
    [InlineData("tarn-truss")]
    public void Every_coped_end_of_a_demo_fits_its_mates(string name)
    {
        using BuiltFrame built = BuiltFrame.FromFile(Repository.PathOf("specs", name + ".yaml")).Succeeded();
        int looked = 0;
        foreach (JsonProperty tube in built.FrameJson().GetProperty("tubes").EnumerateObject())
        {
            foreach (string end in new[] { "from", "to" })
            {
                if (tube.Value.GetProperty("ends").GetProperty(end).GetProperty("cut").GetString() != "cope")
                {
                    continue;
                }

                Fit fit = Worst(built, tube.Name, end == "from", mirrored: false);
                Assert.True(fit.Gap <= Tolerance && fit.Interference <= Tolerance, $"{tube.Name} {end}: {fit}");
                looked++;
            }
        }

        Assert.True(looked >= 8, $"only {looked} coped ends");
    }

    /// <summary>Largest gap and interference over a whole end, mm: between the wall at the cut and the nearest mate.</summary>
    private static Fit Worst(BuiltFrame built, string name, bool atFrom, bool mirrored)
    {
        FrameModel model = built.Model();
        JsonElement frame = built.FrameJson();
        JsonElement json = frame.GetProperty("tubes").GetProperty(name);
        Tube tube = model.Tubes.Single(t => t.Name == name);
        (double outer, double wall) = Size(frame, model, tube);
        JsonElement top = json.GetProperty("top");
        var up = new Vector3(top[0].GetDouble(), top[1].GetDouble(), top[2].GetDouble());

        // The drawing's top line lies at the turn's clock angle on the tube; seen along the tube, clock angles grow clockwise.
        (string file, double turn, bool swapped) = BuiltFrame.PartOf(frame, name);
        (double sin, double cos) = Math.SinCos(double.DegreesToRadians(turn));
        Vector3 along = (tube.To.Point - tube.From.Point).Normalized();
        var pattern = new RolledPattern(
            built.PathOf("developed", file + ".dxf"),
            swapped ? tube.To.Point : tube.From.Point,
            swapped ? tube.From.Point : tube.To.Point,
            (cos * up) + (sin * along.Cross(up)),
            outer);
        Assert.Equal(1, pattern.CutLines);

        int node = tube[atFrom ? End.From : End.To].Node;
        Mate[] mates = [.. json.GetProperty("ends").GetProperty(atFrom ? "from" : "to").GetProperty("by").EnumerateArray()
            .Select(m => MateAt(node, m.GetProperty("tube").GetString()!, frame, model))];
        bool radial = model.Fabrication.Cut == CutMode.Radial;
        double gap = 0;
        double interference = 0;
        foreach (Point2 point in pattern.EndCurve(atFrom != swapped))
        {
            // Contour: the skin itself lies on a mate. Radial: somewhere in the wall it touches one, and nowhere is it inside.
            double nearest = double.PositiveInfinity;
            int depths = radial ? 8 : 0;
            for (int k = 0; k <= depths; k++)
            {
                Vector3 place = pattern.Roll(point, outer - (depths == 0 ? 0 : wall * k / depths), mirrored);
                nearest = Math.Min(nearest, mates.Min(m => m.Outside(place)));
            }

            gap = Math.Max(gap, nearest);
            interference = Math.Max(interference, -nearest);
        }

        return new Fit(gap, interference);
    }

    /// <summary>A mate's full outer shape: a cylinder, ended where the mate itself ends at the node.</summary>
    private static Mate MateAt(int node, string name, JsonElement frame, FrameModel model)
    {
        Tube mate = model.Tubes.Single(t => t.Name == name);
        double radius = Size(frame, model, mate).Outer;
        End? end = mate.From.Node == node ? End.From : mate.To.Node == node ? End.To : null;
        if (end is not { } ending)
        {
            return new Mate(mate.From.Point, mate.Axes.X, radius, null);
        }

        JsonElement cut = frame.GetProperty("tubes").GetProperty(name).GetProperty("ends").GetProperty(ending == End.From ? "from" : "to");
        Vector3 into = mate.Into(ending);
        Vector3 edge = mate[ending].Point;
        Vector3 outward = -into;
        switch (cut.GetProperty("cut").GetString())
        {
            case "square":
                edge = mate.From.Point + (cut.GetProperty("curve")[0][1].GetDouble() * mate.Axes.X);
                break;
            case "miter":
                Tube partner = model.Tubes.Single(t => t.Name == cut.GetProperty("by")[0].GetProperty("tube").GetString());
                outward = (partner.Into(partner.From.Node == node ? End.From : End.To) - into).Normalized();
                break;
            default:
                break;
        }

        return new Mate(mate[ending].Point, into, radius, (edge, outward));
    }

    private static (double Outer, double Wall) Size(JsonElement frame, FrameModel model, Tube tube)
    {
        JsonElement group = frame.GetProperty("groups").GetProperty(model.Groups[tube.Group].Name);
        return (group.GetProperty("od_mm").GetDouble() / 2, group.GetProperty("wall_mm").GetDouble());
    }

    private sealed record Mate(Vector3 OnAxis, Vector3 Direction, double Radius, (Vector3 Edge, Vector3 Outward)? Ends)
    {
        /// <summary>How far a place is outside the mate; negative inside.</summary>
        public double Outside(Vector3 place)
        {
            double skin = RolledPattern.Distance(place, OnAxis, Direction) - Radius;
            return Ends is { } ends ? Math.Max(skin, (place - ends.Edge).Dot(ends.Outward)) : skin;
        }
    }

    private readonly record struct Fit(double Gap, double Interference);
}
