using System.CommandLine;

namespace FrameGen.Cli;

/// <summary>The options and the help of <c>framegen compare</c>.</summary>
internal static class CompareOptions
{
    /// <summary>The command.</summary>
    public static Command Command(Terminal terminal)
    {
        var spec = new Argument<string?>("SPEC") { Description = "A frame's YAML file, to compare for one of its tubes.", Arity = ArgumentArity.ZeroOrOne };
        var tube = new Argument<string?>("TUBE") { Description = "The tube: at the stiffness that its member targets ask for, else that it has.", Arity = ArgumentArity.ZeroOrOne };
        Option<string?> span = Text("--as", "SPAN", "Without a spec: how the tube is held: cantilever (loaded at its end), simply-supported or fixed-fixed (in the middle).");
        Option<string?> load = Text("--load", "FORCE", "Its load: \"500 N\".");
        Option<string?> length = Text("--length", "LENGTH", "Its length: \"600 mm\".");
        Option<string?> most = Text("--max-deflection", "LENGTH", "How far the load may move it: \"2 mm\".");
        Option<string?> bending = Text("--min-bending-stiffness", "EI", "Or the least EI: \"1200 N.m2\".");
        Option<string?> torsion = Text("--min-torsional-stiffness", "GJ", "Or, or as well, the least GJ: \"800 N.m2\".");
        Option<string?> by = Text("--by", "WHAT", "What a tube of a spec without member targets keeps: bending (default), torsion or both.");
        Option<string?> along = Text("--along", "WAY", "Which way it is bent: top (along the height), side or weaker. Default: top; the weaker for a tube of a spec.");
        Option<string[]> materials = List("--material", "NAMES", "Metals, with commas between them. Default: one of each kind.");
        Option<string[]> ratios = List("--wall-ratio", "NUMBERS", "Outer size over wall, at most: a row for each. Default: 20.");
        Option<string?> wall = Text("--wall", "LENGTH", "Least wall: \"1.5 mm\". Alone it sets the wall; with --wall-ratio the thicker of the two counts.");
        var thin = new Option<bool>("--thin-wall") { Description = "Round tubes by the thin-wall formulas." };
        Option<string?> svg = Text("--svg", "FILE", "Write a plot of mass against outer size.");
        Option<bool> json = Commands.Json();
        var command = new Command("compare", "Shapes and metals side by side at equal stiffness: size, mass, wall class, the nearest size in stock and its price.")
        {
            spec, tube, span, load, length, most, bending, torsion, by, along, materials, ratios, wall, thin, svg, json,
        };
        command.SetAction((Func<ParseResult, int>)(r => new CompareCommand(terminal, new CompareRequest(
            r.GetValue(spec),
            r.GetValue(tube),
            r.GetValue(span),
            r.GetValue(load),
            r.GetValue(length),
            r.GetValue(most),
            r.GetValue(bending),
            r.GetValue(torsion),
            r.GetValue(by),
            r.GetValue(along),
            r.GetValue(materials) ?? [],
            r.GetValue(ratios) ?? [],
            r.GetValue(wall),
            r.GetValue(thin),
            r.GetValue(svg),
            r.GetValue(json))).Run()));
        Commands.Examples(
            command,
            "framegen compare --as cantilever --load \"500 N\" --length \"600 mm\" --max-deflection \"2 mm\"",
            "framegen compare specs/quayside-trailer.yaml rail-l --svg rail.svg",
            "framegen compare --min-bending-stiffness \"1200 N.m2\" --material S355,6082-T6 --wall-ratio 10,20,40");
        return command;
    }

    private static Option<string?> Text(string name, string help, string description) => new(name) { Description = description, HelpName = help };

    private static Option<string[]> List(string name, string help, string description) => new(name) { Description = description, HelpName = help };
}
