using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;
using FrameGen.Formats.Dxf;
using FrameGen.Output;

namespace FrameGen.Cli;

/// <summary>The commands, their options and their help.</summary>
internal static class Commands
{
    /// <summary>All of them.</summary>
    public static Command Root(Terminal terminal)
    {
        var root = new Command(
            "framegen",
            "Sizes a tube frame described in a YAML file, cuts its tube ends and draws the papers the shop works from: "
                + "a cut list, a pattern and paper templates for every coped end, meshes, a set-up table.")
        {
            Build(terminal),
            Check(terminal),
            Size(terminal),
            Explain(terminal),
            Freeze(terminal),
            CompareOptions.Command(terminal),
            Verify(terminal),
            new VersionOption { Description = "Print the version.", Action = new PrintVersion() },
        };
        Examples(
            root,
            "framegen check specs/quayside-trailer.yaml     is the spec right, are the targets met?",
            "framegen build specs/quayside-trailer.yaml     write the papers to out/quayside-trailer",
            "framegen build --help                          all about one command");
        return root;
    }

    private static Command Build(Terminal terminal)
    {
        Argument<string> spec = Spec();
        var output = new Option<string?>("--output", "-o")
        {
            Description = "The output folder itself. Default: out/NAME, with the spec's name.",
            HelpName = "FOLDER",
        };
        var replace = new Option<bool>("--replace")
        {
            Description = "Move files that no build wrote, or that were changed since, to NAME.kept beside the folder. Without it they are named and nothing is written.",
        };
        var anyway = new Option<bool>("--anyway")
        {
            Description = $"Write the papers even when a target is not met, stamped {Cautions.NotMeetingTargets}.",
        };
        var dxf = new Option<string>("--dxf")
        {
            Description = "Version of DXF files: 2000 (AC1015), or r12 (AC1009) for old machines.",
            DefaultValueFactory = _ => "2000",
            HelpName = "VERSION",
        };
        dxf.AcceptOnlyFromAmong("2000", "r12");
        var units = new Option<string>("--dxf-units")
        {
            Description = "Unit of DXF files: mm, or in for machines that take every drawing as inches.",
            DefaultValueFactory = _ => "mm",
            HelpName = "UNIT",
        };
        units.AcceptOnlyFromAmong("mm", "in");
        var format = new Option<string?>("--format")
        {
            Description = "Write the templates in this format too: svg, 1:1 in mm.",
            HelpName = "FORMAT",
        };
        format.AcceptOnlyFromAmong("svg");
        Option<bool> json = Json();
        var quiet = new Option<bool>("--quiet", "-q") { Description = "Print errors and warnings only." };
        var command = new Command("build", "Choose the sections, cut the tubes and write all papers into a folder.")
        {
            spec, output, replace, anyway, dxf, units, format, json, quiet,
        };
        command.SetAction((Func<ParseResult, int>)(r => new BuildCommand(
            terminal,
            r.GetRequiredValue(spec),
            r.GetValue(output),
            r.GetValue(replace),
            r.GetValue(anyway),
            new PaperOptions(
                new DxfFormat(r.GetRequiredValue(dxf) is "r12" ? DxfVersion.R12 : DxfVersion.R2000, r.GetRequiredValue(units) is "in"),
                r.GetValue(format) is "svg"),
            r.GetValue(json),
            r.GetValue(quiet)).Run()));
        Examples(
            command,
            "framegen build specs/quayside-trailer.yaml",
            "framegen build trailer.yaml -o ~/jobs/0417/papers --replace",
            "framegen build trailer.yaml --dxf r12 --dxf-units in   for old machines");
        return command;
    }

    private static Command Check(Terminal terminal)
    {
        Argument<string> spec = Spec();
        Option<bool> json = Json();
        var command = new Command("check", "Read the spec, analyse and size the frame, cut the ends, and report. Writes nothing.") { spec, json };
        command.SetAction((Func<ParseResult, int>)(r => new CheckCommand(terminal, r.GetRequiredValue(spec), r.GetValue(json)).Run()));
        Examples(command, "framegen check specs/quayside-trailer.yaml");
        return command;
    }

    private static Command Size(Terminal terminal)
    {
        Argument<string> spec = Spec();
        Option<bool> json = Json();
        var command = new Command("size", "Choose the lightest sections that meet the targets, and say why. Writes nothing.") { spec, json };
        command.SetAction((Func<ParseResult, int>)(r => new SizeCommand(terminal, r.GetRequiredValue(spec), r.GetValue(json)).Run()));
        Examples(command, "framegen size specs/quayside-trailer.yaml");
        return command;
    }

    private static Command Explain(Terminal terminal)
    {
        Argument<string> spec = Spec();
        var tube = new Argument<string>("TUBE") { Description = "The tube's name." };
        Option<bool> json = Json();
        var command = new Command(
            "explain",
            "Why a tube has its size: what the next lighter sizes break, which targets drive it and how much, the forces along it; and what cuts its ends. Writes nothing.")
        {
            spec, tube, json,
        };
        command.SetAction((Func<ParseResult, int>)(r => new ExplainCommand(terminal, r.GetRequiredValue(spec), r.GetRequiredValue(tube), r.GetValue(json)).Run()));
        Examples(command, "framegen explain specs/quayside-trailer.yaml rail-l");
        return command;
    }

    private static Command Freeze(Terminal terminal)
    {
        Argument<string> spec = Spec();
        var add = new Option<bool>("--add")
        {
            Description = "Keep the sizes that are frozen, and choose sizes for new groups beside them.",
        };
        var replace = new Option<bool>("--replace")
        {
            Description = "Choose all sizes anew; the old file is moved to NAME.kept beside the spec.",
        };
        var anyway = new Option<bool>("--anyway") { Description = "Freeze the sizes even when a target is not met." };
        Option<bool> json = Json();
        var command = new Command(
            "freeze",
            "Pin the sizes of a frame that is built: writes NAME.frozen.yaml beside the spec. From then on build, check and size use these sizes, "
                + "check every target with them, and say what would be chosen today.")
        {
            spec, add, replace, anyway, json,
        };
        command.SetAction((Func<ParseResult, int>)(r => new FreezeCommand(
            terminal, r.GetRequiredValue(spec), r.GetValue(add), r.GetValue(replace), r.GetValue(anyway), r.GetValue(json)).Run()));
        Examples(
            command,
            "framegen freeze specs/quayside-trailer.yaml",
            "framegen freeze specs/quayside-trailer.yaml --add     after a rack was added to the frame");
        return command;
    }

    private static Command Verify(Terminal terminal)
    {
        var folder = new Argument<string>("FOLDER") { Description = "An output folder." };
        var spec = new Option<string?>("--spec")
        {
            Description = "Say also whether the papers are what this spec gives today.",
            HelpName = "FILE",
        };
        Option<bool> json = Json();
        var command = new Command(
            "verify",
            "Are these papers whole, unchanged, and what the spec in them gives? Checks every file's hash, rebuilds from the copy of the spec and compares every byte.")
        {
            folder, spec, json,
        };
        command.SetAction((Func<ParseResult, int>)(r => new VerifyCommand(terminal, r.GetRequiredValue(folder), r.GetValue(spec), r.GetValue(json)).Run()));
        Examples(
            command,
            "framegen verify out/quayside-trailer",
            "framegen verify out/quayside-trailer --spec specs/quayside-trailer.yaml");
        return command;
    }

    private static Argument<string> Spec() => new("SPEC") { Description = "The frame's YAML file." };

    /// <summary>The option that prints JSON.</summary>
    public static Option<bool> Json() => new("--json") { Description = "Print the result as JSON on standard output." };

    /// <summary>Gives a command its help with examples at the end.</summary>
    public static void Examples(Command command, params string[] lines) => command.Options.Add(
        new HelpOption { Description = "Print this help.", Action = new HelpWithExamples(lines) });

    /// <summary>The usual help, with examples after it and no line longer than a terminal's.</summary>
    private sealed class HelpWithExamples(IReadOnlyList<string> lines) : SynchronousCommandLineAction
    {
        private const int Width = 80;

        public override int Invoke(ParseResult parseResult)
        {
            TextWriter output = parseResult.InvocationConfiguration.Output;
            new HelpAction { MaxWidth = Width }.Invoke(parseResult);
            output.WriteLine(lines.Count == 1 ? "Example:" : "Examples:");
            foreach (string line in lines)
            {
                output.WriteLine($"  {line}");
            }

            return ExitCode.Done;
        }
    }

    private sealed class PrintVersion : SynchronousCommandLineAction
    {
        public override int Invoke(ParseResult parseResult)
        {
            parseResult.InvocationConfiguration.Output.WriteLine($"{ToolIdentity.Name} {ToolIdentity.Version}");
            return ExitCode.Done;
        }
    }
}
