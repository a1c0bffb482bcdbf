using FrameGen.Diagnostics;
using FrameGen.Spec;
using Xunit;

namespace FrameGen.Tests.Spec;

/// <summary>One fault a spec: the error has the fault's place, names the value and says what to do.</summary>
public class KeyErrorTests
{
    /// <summary>A piece of text that replaces another one, the piece the error points to, and what it says.</summary>
    public static TheoryData<string, string, string, string> Replaced => new()
    {
        { "framegen: 1", "framegen: 2", "2", "this program reads version 1 of the spec format, got '2'" },
        { "framegen: 1", "framegen: [1]", "[1]", "reads version 1 of the spec format, got a list" },
        { "framegen: 1\n", "title: a\nframegen: 1\n", "framegen", "'framegen' must be the first key of the file; move it up" },
        { "framegen: 1\n", "title: a\n", "title", "a spec needs the key 'framegen': the format's version, first in the file (`framegen: 1`)" },
        { "groups:\n", "grups:\n", "framegen", "a spec needs the key 'groups'" },
        { "groups:\n", "grups:\n", "grups", "unknown key 'grups' in a spec; did you mean 'groups'?" },
        { "group: posts", "gruop: posts", "gruop", "unknown key 'gruop' in a tube; did you mean 'group'?" },
        { "group: posts", "group: posts, via: post, bend_radius: 1 mm", "post, bend", "expected a list [..] of nodes, got 'post'" },
        { "group: posts", "group: posts, bend_radius: 1 mm", "bend_radius", "'bend_radius' needs 'via' beside it" },
        { "group: posts", "group: posts, via: [foot]", "via", "'via' needs 'bend_radius' beside it" },
        { "group: posts", "group: posts, hinge: {}", "{}", "one of 'from', 'to' is missing" },
        { "group: posts", "group: posts, hinge: {from: [x]}", "x]", "expected rx, ry or rz, got 'x'" },
        { "group: posts", "group: posts, hinge: {from: [ry, ry]}", "ry]", "'ry' is named twice" },
        { "group: posts", "group: posts, hinge: {from: [rx], to: [rx]}", "to: [rx]", "with 'rx' at both ends the tube can spin about its own axis" },
        { "group: posts", "colour: red, group: posts", "colour", "unknown key 'colour' in a tube; it takes from, to, group, via" },
        { "group: posts", "group: ", "}", "expected a group's name, got nothing" },
        { "group: posts", "group: [posts]", "[posts]", "expected a group's name, got a list" },
        { "group: posts", "group: my posts", "my posts", "'my posts' is no name; write a letter, then letters, digits, '_' or '-', 64 at most" },
        { "from: foot, ", "", "{to", "a tube needs the key 'from': where its axis begins (`from: front-l`)" },
        { "to: head", "to: foot", "foot, group", "tube 'post' begins and ends at node 'foot'; give it two nodes" },
        { "  post:", "  con:", "con", "'con' can't be a name here: names become file names, and Windows keeps this one for a device" },
        { "  post:", "  LPT1:", "LPT1", "Windows keeps this one for a device" },
        { "  post:", "  1st:", "1st", "'1st' is no name" },
        { "  head:", "  Foot:", "Foot", "node 'Foot' is 'foot' of line 3 again: names are compared without regard to case; rename one" },
        { "900 mm", "900", "900", "expected a length such as `38 mm` or `1.5 in`, got the bare number 900; write `900 mm` if that is meant" },
        { "0 mm, 900 mm", "0, 900 mm", "0, 900", "got the bare number 0; write `0 mm` if that is meant" },
        { "900 mm", "900 kg", "900 kg", "expected a length such as `38 mm` or `1.5 in`, got a mass (kg)" },
        { "900 mm", "90 %", "90 %", "expected a length such as `38 mm` or `1.5 in`, got a share (%)" },
        { "900 mm", "'1,5 mm'", ",5", "decimal comma" },
        { "900 mm", "1,5 mm", "[0 mm, 0 mm, 1,5", "a decimal comma splits a value in two" },
        { "900 mm", "1e10 mm", "1e10", "`1e10 mm` is 1E+10 mm, larger than any frame needs (at most 1E+09 mm)" },
        { "900 mm", "1e999 mm", "1e999", "`1e999 mm` is too large or no number at all" },
        { "900 mm", "tall", "tall", "'tall' does not begin with a number; expected a length such as `38 mm` or `1.5 in`" },
        { "900 mm", "~", "~", "expected a length such as `38 mm` or `1.5 in`, got nothing" },
        { "900 mm", "=max(1 mm, 2 mm)", "(1 mm", "this '(' is never closed; in a list [..] a value that holds a comma needs quotes round it" },
        { "[0 mm, 0 mm, 900 mm]", "[0 mm, 900 mm]", "[0 mm, 900", "expected three values [x, y, z], each a length such as `38 mm` or `1.5 in`, got 2" },
        { "[0 mm, 0 mm, 900 mm]", "900 mm", "900", "expected a position: [x, y, z], {on: TUBE, at: 40 %}" },
        { "[0 mm, 0 mm, 900 mm]", "{onn: post, at: 4 %}", "onn", "unknown key 'onn'; did you mean 'on'?" },
        { "[0 mm, 0 mm, 900 mm]", "{on: post}", "{on", "one of 'at', 'distance' is missing" },
        { "[0 mm, 0 mm, 900 mm]", "{on: post, at: 4 %, distance: 3 mm}", "distance", "'distance' and 'at' exclude each other; keep one of them" },
        { "[0 mm, 0 mm, 900 mm]", "{on: post, at: 120 %}", "120", "`120 %` must be from 0 % to 100 %" },
        { "[0 mm, 0 mm, 900 mm]", "{on: post, at: 0.4}", "0.4", "expected a share such as `40 %`, got the bare number 0.4" },
        { "[0 mm, 0 mm, 900 mm]", "{between: [foot], at: 4 %}", "[foot]", "expected 2 nodes, got 1" },
        { "[0 mm, 0 mm, 900 mm]", "{between: [foot, FOOT], at: 4 %}", "FOOT", "'FOOT' is named twice; name it once" },
        { "group: posts", "group: posts, up: any", "any", "expected a direction such as x, -z or [0, 1, 1], got 'any'" },
        { "group: posts", "group: posts, up: [0, 0, 0]", "[0, 0, 0]", "a direction can't be [0, 0, 0]" },
        { "group: posts", "group: posts, up: [0 mm, 1, 0]", "0 mm, 1", "expected a plain number such as `1.5`, got a length (mm)" },
        { "group: posts", "group: posts, ends: {from: {cut: mitre}}", "mitre", "expected cope or square, got 'mitre'" },
        { "group: posts", "group: posts, ends: {from: {gap: -1 mm}}", "-1 mm", "`-1 mm` must be 0 or more" },
        { "group: posts", "group: posts, ends: {to: {cut: cope, extend: 3 mm}}", "extend", "'extend' moves a square or plane cut, and this end is coped" },
        { "group: posts", "group: posts, ends: {to: {cut: square, gap: 3 mm}}", "gap", "'gap' is left between a coped end and its mates, and this end is square" },
        { "group: posts", "group: posts, ends: {from: {wrap: yes}}", "yes", "expected true or false, got 'yes'" },
        { "section: round 38 x 1.5 mm", "welded: true", "{material", "one of 'section', 'choose' is missing" },
        { "section: round", "choose: {stock: rack}, section: round", "section", "'section' and 'choose' exclude each other" },
        { "material: S235", "material: S 235", "S 235", "is no name of a material" },
        { "nodes:", "nodes: {}\nnodez:", "{}", "at least one node is needed" },
    };

    /// <summary>Text added at the end of a spec, the piece of it the error points to, and what it says.</summary>
    public static TheoryData<string, string, string> Added => new()
    {
        { "title: \"bell \\u0007\"", "\"bell", "the control character U+0007 can't be printed; remove it" },
        { "title: [a]", "[a]", "expected text, got a list" },
        { "display: {length: ft}", "ft", "expected mm, cm or in, got 'ft'" },
        { "display: {fraction: 1/16}", "fraction", "'fraction' rounds inches; write `length: in` beside it" },
        { "display: {length: in, fraction: 1/12}", "1/12", "expected 1/8, 1/16, 1/32 or 1/64, got '1/12'; did you mean" },
        { "include: rack.yaml", "rack", "expected a list [..] of paths, got 'rack.yaml'" },
        { "parameters: {pi: 3 mm}", "pi", "a parameter can't be called 'pi': in expressions that is a constant" },
        { "parameters: {G: 3 mm}", "G", "a parameter can't be called 'G'" },
        { "parameters: {a: [1]}", "[1]", "expected a quantity, a number or an expression" },
        { "parameters: {a: 5 mmm}", "mmm", "unknown unit 'mmm'; did you mean 'mm'?" },
        { "mirror: {across: w, suffix: [-l, -r]}", "w,", "expected x, y or z, got 'w'" },
        { "mirror: {across: y, suffix: [-l]}", "[-l]", "expected 2 name endings, got 1" },
        { "mirror: {across: y, suffix: [-l, al-l]}", "al-l", "a name can't tell '-l' from 'al-l'" },
        { "mirror: {across: y, suffix: [-l, ' r']}", "' r'", "expected an ending of names such as -l" },
        { "materials: {m: {E: 210 GPa, density: 7.85 g/cm3}}", "{E", "one of 'G', 'poisson' is missing" },
        { "materials: {m: {E: 210, poisson: 0.3, density: 7.85 g/cm3}}", "210", "expected a stress such as `235 MPa` or `210 GPa`, got the bare number 210" },
        { "materials: {m: {E: 210 GPa, poisson: 0.5, density: 7.85 g/cm3}}", "0.5", "`0.5` must be between -1 and 0.5" },
        { "materials: {m: {E: 210 GPa, poisson: 0.3, density: 7.85 kg}}", "7.85", "expected a density such as `7.85 g/cm3` or `7850 kg/m3`, got a mass (kg)" },
        { "stock: {rack: {material: S235, price_per_m: 4.2 mm, sizes: [rod 9 mm]}}", "4.2 mm", "expected a price per metre such as 4.2" },
        { "stock: {rack: {material: S235, sizes: []}}", "[]", "expected one or more sections, got none" },
        { "have: [{section: rod 9 mm, material: S235, lengths: [0 mm]}]", "0 mm", "`0 mm` must be more than 0" },
    };

    /// <summary>The same for supports, masses, cases and targets.</summary>
    public static TheoryData<string, string, string> AddedLoads => new()
    {
        { "supports: {foot: {hold: [x, w]}}", "w]", "expected x, y, z, rx, ry or rz, got 'w'" },
        { "supports: {foot: {hold: [x, x]}}", "x]", "'x' is named twice" },
        { "supports: {foot: {mirror: false}}", "{mirror", "one of 'hold', 'spring' is missing" },
        { "supports: {foot: {spring: {}}}", "{}", "one of 'x', 'y', 'z', 'rx', 'ry', 'rz' is missing" },
        { "supports: {foot: {spring: {z: 4 N.m/deg}}}", "4 N.m", "expected a stiffness such as `60 N/mm`" },
        { "supports: {foot: {spring: {rz: 4 N/mm}}}", "4 N/mm", "expected a turning stiffness such as `12 N.m/deg`" },
        { "supports: {foot: {spring: {z: 0 N/mm}}}", "0 N/mm", "`0 N/mm` must be more than 0" },
        { "supports: {foot: {hold: [x, z], spring: {z: 4 N/mm}}}", "4 N/mm", "'z' is held, and a spring there does nothing" },
        { "masses: [{node: foot, tube: post, mass: 3 kg}]", "tube", "'tube' and 'node' exclude each other" },
        { "masses: [{node: foot, mass: 3 lbs}]", "lbs", "unknown unit 'lbs'; did you mean 'lb'?" },
        { "masses: {node: foot, mass: 3 kg}", "{node", "expected a list [..] of masses, got keys with values" },
        { "cases: {all: {self_weight: [0, 0, -1]}}", "all", "'all' can't be a name here: it is a word of the format" },
        { "cases: {a: {supports: [foot]}}", "{supports", "one of 'self_weight', 'loads', 'add' is missing" },
        { "cases: {a: {self_weight: [0, 0, -1 N]}}", "-1 N", "expected a plain number such as `1.5`, got a force (N)" },
        { "cases: {a: {loads: [{node: foot}]}}", "{node", "one of 'force', 'moment' is missing" },
        { "cases: {a: {loads: [{tube: post, force: [1 N, 1 N, 1 N]}]}}", "{tube", "where on the tube is missing: 'at' or 'distance'" },
        { "cases: {a: {loads: [{force: [1 N, 1 N, 1 N]}]}}", "{force", "expected a load: one of the keys 'node', 'line', 'tube' is missing" },
        { "cases: {a: {loads: [{tube: post, line: [1 N, 1 N/m, 1 N/m]}]}}", "1 N, 1 N/m", "expected a load per length such as `500 N/m` or `3 lbf/in`, got a force (N)" },
        { "cases: {a: {add: {b: 1 N}}}", "1 N", "expected a plain number such as `1.5`, got a force (N)" },
        { "targets: [{}]", "{}", "one of 'displacement', 'rotation'" },
        { "targets: [{strength: {safety_factor: 2}, stiffness: {node: foot, along: x, min: 5 N/mm}}]", "stiffness", "'stiffness' and 'strength' exclude each other" },
        { "targets: [{strenght: {safety_factor: 2}}]", "strenght", "unknown key 'strenght' in a target; did you mean 'strength'?" },
        { "targets: [{stiffness: {node: foot, along: any, min: 5 N/mm}}]", "any", "expected a direction such as x, -z or [0, 1, 1], got 'any'" },
        { "targets: [{stiffness: {node: foot, along: x, min: 5 N.m/deg}}]", "5 N.m", "with 'along' expected a stiffness such as `60 N/mm` or `300 lbf/in`, got a turning stiffness (N.m/deg)" },
        { "targets: [{stiffness: {node: foot, about: x, min: 5 N/mm}}]", "5 N/mm", "with 'about' expected a turning stiffness such as `12 N.m/deg`" },
        { "targets: [{stiffness: {node: foot, about: x, along: x, min: 5 N/mm}}]", "along", "'along' and 'about' exclude each other" },
        { "targets: [{displacement: {case: a, node: foot, to: head, along: x, max: 5 mm}}]", "to:", "'to' does not go with 'node'; write 'node', or 'from' and 'to'" },
        { "targets: [{displacement: {case: a, from: foot, along: x, max: 5 mm}}]", "from", "'from' needs 'to' beside it" },
        { "targets: [{displacement: {case: a, from: foot, to: foot, along: x, max: 5 mm}}]", "foot, along", "'from' and 'to' are both 'foot'" },
        { "targets: [{displacement: {case: a, along: x, max: 5 mm}}]", "{case", "'node' is missing, or 'from' and 'to'" },
        { "targets: [{strength: {cases: some, safety_factor: 2}}]", "some", "expected 'all', got 'some'" },
        { "targets: [{member: {tube: post, as: cantilever, load: 4 N}}]", "{tube", "a member target with 'as' needs 'max_deflection' too" },
        { "targets: [{member: {tube: post}}]", "{tube", "needs 'as', 'load' and 'max_deflection', or" },
        { "targets: [{member: {tube: post, load: 4 N, min_bending_stiffness: 4 N.m2}}]", "min_b", "'min_bending_stiffness' does not go with 'load'; write two targets" },
    };

    /// <summary>The same for the shop's keys.</summary>
    public static TheoryData<string, string, string> AddedShop => new()
    {
        { "joints: {foot: {}}", "{}", "one of 'order', 'miter' is missing" },
        { "joints: {foot: {order: [post, post]}}", "post]", "'post' is named twice" },
        { "joints: {foot: {miter: [post, bow], order: [bow]}}", "bow]}}", "tube 'bow' stands in 'miter' already" },
        { "fabrication: {page: A5}", "A5", "expected A4, A3, letter or tabloid, got 'A5'; did you mean" },
        { "fabrication: {tolerance: 0 mm}", "0 mm", "`0 mm` must be from 0.0001 mm to 1 mm" },
        { "fabrication: {springback: 2 mm}", "2 mm", "expected an angle such as `0.5 deg` or a share such as `40 %`, got a length (mm)" },
        { "fabrication: {kerf: -2 mm}", "-2 mm", "`-2 mm` must be 0 or more" },
        { "cases:", "\n", "expected names, each with what the case is (`NAME: ...`), got nothing" },
    };

    [Theory]
    [MemberData(nameof(Replaced))]
    public void Says_what_is_wrong_with_a_changed_piece(string old, string changed, string pointsTo, string message)
    {
        string text = SpecText.Small.Replace(old, changed, StringComparison.Ordinal);
        Assert.NotEqual(SpecText.Small, text, StringComparer.Ordinal);
        AssertSays(text, changed.Length == 0 ? 0 : text.IndexOf(changed, StringComparison.Ordinal), pointsTo, message);
    }

    [Theory]
    [MemberData(nameof(Added))]
    [MemberData(nameof(AddedLoads))]
    [MemberData(nameof(AddedShop))]
    public void Says_what_is_wrong_with_an_added_key(string added, string pointsTo, string message) =>
        AssertSays(SpecText.Small + added + "\n", SpecText.Small.Length, pointsTo, message);

    [Theory]
    [InlineData("group: posts, ends: {to: {vent: 4 N}}", "expected a length such as")]
    [InlineData("group: posts, ends: {to: {vent: 0 mm}}", "`0 mm` must be more than 0")]
    public void Says_what_is_wrong_with_a_vent(string changed, string message) => Assert.Contains(
        message, SpecText.OnlyError(SpecText.Small.Replace("group: posts", changed, StringComparison.Ordinal)), StringComparison.Ordinal);

    [Fact]
    public void A_shape_that_is_none_is_refused_in_a_choice() => Assert.Contains(
        "expected round, rod, square, rect or ellipse, got 'sqare'; did you mean 'square'?",
        SpecText.OnlyError(SpecText.Small.Replace("section: round 38 x 1.5 mm", "choose: {stock: en10219, shape: sqare}", StringComparison.Ordinal)),
        StringComparison.Ordinal);

    [Fact]
    public void Tells_all_errors_at_once_in_the_order_of_the_text()
    {
        string text = SpecText.Small
            .Replace("900 mm", "900 kg", StringComparison.Ordinal)
            .Replace("group: posts", "gruop: posts", StringComparison.Ordinal)
            .Replace("1.5 mm", "20 mm", StringComparison.Ordinal) + "fabrication: {kerf: 2, page: A5}\n";
        IReadOnlyList<Diagnostic> errors = SpecText.Errors(text);
        Assert.Equal("4 6 6 8 9 9", string.Join(' ', errors.Select(error => $"{error.At!.Line}")));
    }

    [Fact]
    public void Takes_what_is_accepted_from_the_start()
    {
        FrameSpec spec = SpecText.Sound(SpecText.Small.Replace("group: posts", "group: posts, up: -x, ends: {from: {cut: square, extend: -2 mm}, to: {gap: 1 mm, wrap: true}}", StringComparison.Ordinal) + """
            revision: 3
            notes:
            display: {length: in, fraction: 1/16, mass: lb, force: lbf}
            have: [{section: rod 9 mm, material: S235, lengths: [1850 mm, 920 mm]}]
            stock: {rack: {material: [S235, 1.4301], bar: 6 m, price_per_m: 4.2, sizes: [round 25 x 1.5 mm]}}
            sizing: {objective: cost, different_sizes: 3}
            supports: {foot: {hold: [x, y, z, rx, ry, rz], mirror: false}}
            cases:
              push: {supports: [foot], loads: [{tube: post, at: 40 %, force: [1 N, 0 N, 0 N]}, {tube: post, distance: 3 mm, moment: [1 Nm, 0 Nm, 0 Nm]}]}
            targets:
              - stiffness: {from: foot, to: head, about: z, min: =3 N.m/deg * 2, supports: [foot]}
              - displacement: {case: push, node: head, along: any, max: 3 mm}
            fabrication: {cut: contour, gap: 0.2 mm, paper: 0.1 mm, tolerance: 0.02 mm, kerf: 2 mm, bar_trim: 5 mm, page: tabloid, grip: 60 mm, springback: 2 deg}
            """);
        Assert.Equal(("3", string.Empty), (spec.Revision, spec.Notes));
        Assert.Equal(new DisplaySpec(LengthUnit.Inch, 16, MassUnit.Pound, ForceUnit.PoundForce), spec.Display);
        Assert.Equal((RequestedCut.Square, true), (spec.Tubes[0].From.Cut.Cut, spec.Tubes[0].To.Cut.Wrap));
        Assert.Null(Assert.IsType<DisplacementTargetSpec>(spec.Targets[1]).Along);
        Assert.Equal(QuantityKind.TurningStiffness, Assert.IsType<StiffnessTargetSpec>(spec.Targets[0]).Min.Kind);
        DiagnosticList diagnostics = [];
        ParameterTable table = ParameterTable.Evaluate(spec.Parameters, diagnostics);
        Assert.Equal(-1, table.Value(spec.Tubes[0].Up!.X, diagnostics));
        Assert.Equal(0, table.Value(spec.Tubes[0].Up!.Z, diagnostics));
        Assert.Equal(-2, table.Value(spec.Tubes[0].From.Cut.Extend!, diagnostics));
        Assert.Equal(6 * 180_000 / Math.PI, table.Value(Assert.IsType<StiffnessTargetSpec>(spec.Targets[0]).Min, diagnostics)!.Value, 1e-9);
        Assert.Empty(diagnostics);
    }

    private static void AssertSays(string text, int from, string pointsTo, string message)
    {
        int index = text.IndexOf(pointsTo, from, StringComparison.Ordinal);
        index = index >= 0 ? index : text.IndexOf(pointsTo, StringComparison.Ordinal);
        Assert.True(index >= 0, pointsTo);
        string before = text[..index];
        string place = $"{SpecText.Root}:{before.Count(c => c == '\n') + 1}:{index - before.LastIndexOf('\n')}: ";
        string[] errors = [.. SpecText.Errors(text).Select(error => error.ToString())];
        Assert.True(
            errors.Any(error => error.StartsWith(place, StringComparison.Ordinal) && error.Contains(message, StringComparison.Ordinal)),
            $"expected {place}{message}\ngot {string.Join("\n    ", errors)}");
    }
}
