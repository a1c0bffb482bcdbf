using FrameGen.Diagnostics;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Sections;
using FrameGen.Model;
using FrameGen.Sizing;
using FrameGen.Sizing.Explanation;
using FrameGen.Spec;
using Xunit;
using static FrameGen.Tests.Sizing.FrameBuilder;

namespace FrameGen.Tests.Sizing.Explanation;

/// <summary>Explanations of frames small enough to solve by hand.</summary>
public sealed class TubeExplainerTests
{
    private const double E = 210_000;
    private const double G = E / 2.6;
    private const double L = 1500;
    private const double P = 1000;

    // What a force P at the end of a cantilever of length L moves it by, with shear: PL³/3EI + PL/GAs; As = κA, κ of Cowper (1966) at ν = 0.3.
    private static double Tip(double od, double wall) => Stretch(od, wall, 0, L);

    // The part of it that comes from between two distances from the clamp: ∫ P(L − x)²/EI dx + P(b − a)/GAs.
    private static double Stretch(double od, double wall, double a, double b)
    {
        double inertia = Math.PI / 64 * (Math.Pow(od, 4) - Math.Pow(od - (2 * wall), 4));
        double m = (od - (2 * wall)) / od;
        double q = (1 + (m * m)) * (1 + (m * m));
        double shearArea = Area(od, wall) * 6 * 1.3 * q / ((8.8 * q) + (23.6 * m * m));
        return (P * (Math.Pow(L - a, 3) - Math.Pow(L - b, 3)) / (3 * E * inertia)) + (P * (b - a) / (G * shearArea));
    }

    private static double Area(double od, double wall) => Math.PI / 4 * ((od * od) - Math.Pow(od - (2 * wall), 2));

    private static FrameBuilder Cantilever(params Section[] sizes)
    {
        FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("b", L, 0, 0).Choose("beams", sizes).Tube("beam", "a", "b", "beams").Clamp("a");
        return builder.Case("push", default, builder.Force("b", 0, 0, -P));
    }

    private static TubeExplanation Explain(SizedFrame sized, int tube = 0) => TubeExplainer.Explain(sized, tube, []);

    // 48.3 x 3.2 gives 46.3 mm, 48.3 x 2.6 54.7 mm, 42.4 x 3.2 70.5 mm: a limit of 50 mm takes the first.
    [Fact]
    public void The_next_lighter_size_breaks_the_target_by_what_it_comes_to_by_hand()
    {
        SizedFrame sized = Cantilever(Round(60.3, 3.2), Round(48.3, 3.2), Round(48.3, 2.6), Round(42.4, 2.6), Round(33.7, 2.6))
            .Displacement("push", "b", Vector3.UnitZ, 50).Size();
        TubeExplanation explanation = Explain(sized);

        Assert.Equal((SizeOrigin.Chosen, "round 48.3 x 3.2 mm"), (explanation.Origin, sized.Sections[0].Name));
        Assert.Equal(["round 48.3 x 2.6 mm", "round 42.4 x 2.6 mm", "round 33.7 x 2.6 mm"], explanation.Lighter.Select(l => l.Candidate.Section.Name));
        Assert.All(explanation.Lighter, l => Assert.Equal(SizeVerdict.BreaksTarget, l.Verdict));
        Assert.Equal(Tip(48.3, 2.6), explanation.Lighter[0].Broken.Single().Value, 1e-8);
        Assert.Equal(Tip(33.7, 2.6), explanation.Lighter[2].Broken.Single().Value, 1e-8);
        Assert.Equal(7850e-9 * (Area(48.3, 3.2) - Area(48.3, 2.6)) * L, explanation.Lighter[0].SavesKg, 1e-10);
        TargetDrive drive = explanation.Targets.Single();
        Assert.Equal((3, true, Tip(48.3, 3.2) / 50 >= 0.95), (drive.Breaks, drive.Drives, drive.IsActive));
    }

    [Fact]
    public void Stiffness_that_is_all_in_one_group_moves_a_target_by_its_whole_share()
    {
        SizedFrame sized = Cantilever(Round(48.3, 3.2)).Displacement("push", "b", Vector3.UnitZ, 50).Stiffness("b", Vector3.UnitZ, 10).Size();
        TubeExplanation explanation = Explain(sized);
        Assert.Equal(SizeOrigin.OnlyOne, explanation.Origin);

        // Movement and compliance go with 1/stiffness: d(ratio) = -ratio · d(stiffness)/stiffness.
        Assert.Equal(-Tip(48.3, 3.2) / 50, explanation.Targets[0].PerStiffness!.Value, 2e-6);
        Assert.Equal(-10 * Tip(48.3, 3.2) / P, explanation.Targets[1].PerStiffness!.Value, 2e-6);
    }

    [Fact]
    public void Mass_in_the_walls_counts_by_the_closed_form_s_slope()
    {
        SizedFrame sized = Cantilever(Round(48.3, 3.2)).Displacement("push", "b", Vector3.UnitZ, 50).Strength(0.5).Size();
        TubeExplanation explanation = Explain(sized);

        const double H = 1e-5;
        double mass = Math.Log(Area(48.3, 3.2 + H) / Area(48.3, 3.2 - H));
        double slope = (Tip(48.3, 3.2 + H) - Tip(48.3, 3.2 - H)) / 50 / mass;
        Assert.Equal(slope, explanation.Targets[0].PerMass!.Value, 1e-5 * Math.Abs(slope));

        // To use the same share of a limit 1 mm lower takes so much: dm/dv of the walls, times v over the limit.
        double kg = 7850e-9 * L * (Area(48.3, 3.2 + H) - Area(48.3, 3.2 - H)) / (Tip(48.3, 3.2 - H) - Tip(48.3, 3.2 + H)) * Tip(48.3, 3.2) / 50;
        Assert.Equal(kg, explanation.Targets[0].KgPerUnit!.Value, 1e-5 * kg);

        // Stress is PL (D/2)/I at the clamp, and knows nothing of E.
        double Use(double wall) => 0.5 * P * L * 24.15 / (Math.PI / 64 * (Math.Pow(48.3, 4) - Math.Pow(48.3 - (2 * wall), 4))) / 235;
        double stress = (Use(3.2 + H) - Use(3.2 - H)) / mass;
        Assert.Equal(stress, explanation.Targets[1].PerMass!.Value, 1e-5 * Math.Abs(stress));
        Assert.Equal(0, explanation.Targets[1].PerStiffness!.Value, 1e-9);
    }

    // Energy of a load sits in the groups by shares; those of a target measured along its own load add up to all of it.
    [Fact]
    public void Two_groups_share_a_movement_by_the_energy_in_each()
    {
        FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("m", 500, 0, 0).Node("b", L, 0, 0)
            .Fixed("roots", Round(60.3, 3.2)).Fixed("tips", Round(48.3, 3.2))
            .Tube("root", "a", "m", "roots").Tube("tip", "m", "b", "tips").Clamp("a");
        SizedFrame sized = builder.Case("push", default, builder.Force("b", 0, 0, -P)).Displacement("push", "b", Vector3.UnitZ, 50).Size();

        Assert.Equal(-Stretch(60.3, 3.2, 0, 500) / 50, Explain(sized, 0).Targets[0].PerStiffness!.Value, 2e-6);
        Assert.Equal(-Stretch(48.3, 3.2, 500, L) / 50, Explain(sized, 1).Targets[0].PerStiffness!.Value, 2e-6);
    }

    // A strut of 30 mm lands on the chord; the chord of 25 mm would be stiff enough and can't carry it.
    [Fact]
    public void A_size_that_a_joint_refuses_says_which_tube_is_too_wide_for_it()
    {
        SizedFrame sized = new FrameBuilder()
            .Choose("chords", Round(25, 2), Round(30, 2), Round(35, 2)).Fixed("struts", Round(30, 2))
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Tube("chord", "a", "b", "chords").NodeOn("n", "chord", 500)
            .Node("top", 500, 0, 600).Tube("strut", "n", "top", "struts").Clamp("a").Clamp("b").Size();
        TriedSize tried = Explain(sized).Lighter.Single();

        Assert.Equal((SizeVerdict.DoesNotFit, 15.0, 12.5), (tried.Verdict, tried.Problem!.Needed, tried.Problem.Allowed));
        Assert.Contains("strut (struts, round 30 x 2 mm) is wider than the chord (chords, round 25 x 2 mm) it lands on", tried.Refusal, StringComparison.Ordinal);
        Assert.Contains("15 mm, its seat's half 12.5 mm", tried.Refusal, StringComparison.Ordinal);
    }

    // The wanted end: the strut stands at 60 degrees on the chord and leans towards its start, so that its obtuse angle to +x is 120.
    [Fact]
    public void An_end_is_explained_by_what_it_lands_on_and_how()
    {
        SizedFrame sized = new FrameBuilder()
            .Fixed("chords", Round(40, 2)).Fixed("struts", Round(30, 2))
            .Node("a", 0, 0, 0).Node("b", 1000, 0, 0).Tube("chord", "a", "b", "chords").NodeOn("n", "chord", 500)
            .Node("top", 500 - 300, 0, 300 * Math.Sqrt(3)).Tube("strut", "n", "top", "struts").Clamp("a").Clamp("b").Size();
        TubeExplanation explanation = Explain(sized, 1);
        ExplainedEnd foot = explanation.Ends[0];

        Assert.Equal((End.From, CutKind.Cope, true, false), (foot.End, foot.Kind, foot.IsCut, foot.OrderIsWritten));
        Assert.Equal(["chord", "strut"], foot.Joint.Tubes.Select(t => sized.Model.Tubes[t].Name));
        Contact contact = Assert.Single(foot.Contacts);
        Assert.Equal((0, 60.0), (contact.Tube, Math.Round(double.RadiansToDegrees(contact.Angle), 9)));
        Assert.Empty(foot.Problems);
        Assert.Equal((CutKind.Square, 0), (explanation.Ends[1].Kind, explanation.Ends[1].Contacts.Count));
    }

    [Fact]
    public void What_the_spec_gives_is_compared_with_its_neighbours_in_stock()
    {
        FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("b", L, 0, 0).Fixed("beams", Round(48.3, 3.2)).Tube("beam", "a", "b", "beams").Clamp("a");
        SizedFrame sized = builder.Case("push", default, builder.Force("b", 0, 0, -P)).Displacement("push", "b", Vector3.UnitZ, 60).Size();
        Candidate[] stock = [.. new[] { Round(42.4, 3.2), Round(48.3, 2.6), Round(48.3, 3.2), Round(60.3, 3.2), Round(60.3, 5), Round(76.1, 5) }.Select(s => new Candidate(s, "yard", 6000, null))];
        var explanation = TubeExplainer.Explain(sized, 0, stock);

        // 54.7 mm with 2.6 mm of wall: it would do within 60 mm; 42.4 x 3.2 is heavier than that and gives 70 mm.
        Assert.Equal(SizeOrigin.Given, explanation.Origin);
        Assert.Equal(["round 60.3 x 5 mm", "round 60.3 x 3.2 mm"], explanation.Heavier.Select(h => h.Candidate.Section.Name));
        Assert.Equal(
            [("round 42.4 x 3.2 mm", SizeVerdict.BreaksTarget), ("round 48.3 x 2.6 mm", SizeVerdict.WouldDo)],
            explanation.Lighter.Select(l => (l.Candidate.Section.Name, l.Verdict)));
        Assert.True(explanation.LighterWouldDo);
    }

    // Two groups, two sizes in the shopping list at most: the beam's own lighter size would be a third.
    [Fact]
    public void A_limit_on_different_sizes_is_what_keeps_a_heavier_one()
    {
        FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("b", L, 0, 0).Node("c", 0, 5000, 0).Node("d", L, 5000, 0)
            .Choose("beams", Round(48.3, 2.6), Round(48.3, 3.2)).Fixed("others", Round(48.3, 3.2))
            .Tube("beam", "a", "b", "beams").Tube("other", "c", "d", "others").Clamp("a").Clamp("c");
        builder.Case("push", default, builder.Force("b", 0, 0, -P)).Displacement("push", "b", Vector3.UnitZ, 60);
        FrameModel model = builder.Build() with { Sizing = new SizingSpec(SizingObjective.Mass, 1, null) };
        DiagnosticList diagnostics = [];
        SizedFrame sized = SectionSizer.Size(model, diagnostics)!;

        Assert.Equal("round 48.3 x 3.2 mm", sized.Sections[0].Name);
        Assert.Equal(SizeVerdict.TooManySizes, Explain(sized).Lighter.Single().Verdict);
    }

    // By price the heavier tube can be the cheaper one: then it is what is looked at.
    [Fact]
    public void Where_cost_is_made_least_the_next_cheaper_is_tried()
    {
        FrameBuilder builder = Cantilever(Round(48.3, 3.2), Round(48.3, 2.6), Round(60.3, 3.2)).Displacement("push", "b", Vector3.UnitZ, 50);
        FrameModel model = builder.Build();
        TubeGroup group = model.Groups[0];
        double Price(Section section) => section.Name is "round 60.3 x 3.2 mm" ? 4 : section.Name is "round 48.3 x 3.2 mm" ? 5 : 3;
        model = model with
        {
            Sizing = new SizingSpec(SizingObjective.Cost, null, null),
            Groups = [group with { Candidates = [.. group.Candidates.Select(c => c with { PricePerMetre = Price(c.Section) })] }],
        };
        SizedFrame sized = SectionSizer.Size(model, [])!;
        TubeExplanation explanation = Explain(sized);

        Assert.Equal("round 60.3 x 3.2 mm", sized.Sections[0].Name);
        TriedSize cheaper = Assert.Single(explanation.Lighter);
        Assert.Equal(("round 48.3 x 2.6 mm", true), (cheaper.Candidate.Section.Name, explanation.IsByCost));
        Assert.Equal((4 - 3) * L / 1000, cheaper.SavesCost!.Value, 1e-12);
    }

    // A proven choice can't leave a lighter size that would do alone.
    [Fact]
    public void Nothing_lighter_would_do_alone_where_the_choice_is_proven()
    {
        int tried = 0;
        for (int seed = 1; seed <= 20; seed++)
        {
            SizedFrame? sized = SectionSizer.Size(RandomFrames.Make(seed, 300), []);
            if (sized?.Status is not SizingStatus.ProvenLightest)
            {
                continue;
            }

            for (int group = 0; group < sized.Model.Groups.Count; group++)
            {
                int tube = Enumerable.Range(0, sized.Model.Tubes.Count).First(t => sized.Model.Tubes[t].Group == group);
                TubeExplanation explanation = Explain(sized, tube);
                Assert.False(explanation.LighterWouldDo);
                Assert.All(explanation.Lighter, l => Assert.True(l.SavesKg > 0 && (l.Broken.Count > 0 || l.Problem is not null)));
                tried += explanation.Lighter.Count;
            }
        }

        Assert.InRange(tried, 20, int.MaxValue);
    }

    // Frequency and buckling: the same slopes as two exact analyses of a design whose metal is that much stiffer, over a step ten times smaller.
    [Fact]
    public void Eigenvalues_slopes_are_those_of_analyses_nearby()
    {
        SizedFrame sized = Column(1).Size();
        TubeExplanation explanation = Explain(sized);
        const double H = 1e-4;
        for (int target = 0; target < 2; target++)
        {
            double slope = (Column(1 + H).Size().Targets[target].Ratio - Column(1 - H).Size().Targets[target].Ratio) / Math.Log((1 + H) / (1 - H));
            Assert.Equal(slope, explanation.Targets[target].PerStiffness!.Value, 1e-5 * Math.Abs(slope));

            // Every load factor goes with the stiffness, every frequency with its root: ratio = limit/value.
            double power = target == 0 ? -1 : -0.5;
            Assert.Equal(power * sized.Targets[target].Ratio, slope, 1e-5 * sized.Targets[target].Ratio);
        }

        static FrameBuilder Column(double stiffer)
        {
            FrameBuilder builder = new FrameBuilder().Node("a", 0, 0, 0).Node("b", 0, 0, L)
                .Fixed("posts", Round(48.3, 3.2), Steel with { E = E * stiffer, G = G * stiffer }).Tube("post", "a", "b", "posts").Clamp("a").MassOnNode("b", 20);
            return builder.Case("press", default, builder.Force("b", 0, 0, -P)).Buckling(2).Frequency(2);
        }
    }
}
