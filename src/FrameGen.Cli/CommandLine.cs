using System.CommandLine;
using System.CommandLine.Invocation;
using System.CommandLine.Parsing;
using FrameGen.Output;
using FrameGen.Output.Folders;
using FrameGen.Spec;

namespace FrameGen.Cli;

/// <summary>The program as a function of its arguments.</summary>
public static class CommandLine
{
    /// <summary>Runs a command.</summary>
    /// <param name="args">Arguments, without the program's name.</param>
    /// <param name="stdout">Results.</param>
    /// <param name="stderr">Errors, warnings and progress.</param>
    /// <returns>0 done; 1 targets not met or papers that don't match; 2 wrong spec or arguments; 3 disk or rights; 70 a fault.</returns>
    public static int Run(IReadOnlyList<string> args, TextWriter stdout, TextWriter stderr)
    {
        try
        {
            return Invoke(args, new Terminal(stdout, stderr));
        }
        catch (OutputRefusedException e)
        {
            ListFiles(stderr, e);
            return ExitCode.WrongInput;
        }
        catch (WrongInputException e)
        {
            stderr.WriteLine($"error: {e.Message}");
            return ExitCode.WrongInput;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            stderr.WriteLine($"error: {e.Message}");
            Trace(stderr, e);
            return ExitCode.Environment;
        }
#pragma warning disable CA1031 // The last line of defence: whatever went wrong, the user gets a sentence and the code 70.
        catch (Exception e)
#pragma warning restore CA1031
        {
            string what = e is SelfCheckException ? $"the build's check of its own papers failed: {e.Message}" : $"{e.GetType().Name}: {e.Message}";
            stderr.WriteLine($"internal error: {what}");
            stderr.WriteLine($"This is a fault of {ToolIdentity.Name} {ToolIdentity.Version}, not of your spec. Nothing was written.");
            stderr.WriteLine("Please report it with the spec; FRAMEGEN_TRACE=1 in the environment prints where it happened.");
            Trace(stderr, e);
            return ExitCode.Fault;
        }
    }

    private static int Invoke(IReadOnlyList<string> args, Terminal terminal)
    {
        Command root = Commands.Root(terminal);

        // A leading @ is part of a file's name, not an order to read arguments from a file.
        ParseResult result = root.Parse(args.Count == 0 ? ["--help"] : args, new ParserConfiguration { ResponseFileTokenReplacer = null });
        if (result.Action is ParseErrorAction)
        {
            PrintErrors(result, terminal.Error);
            return ExitCode.WrongInput;
        }

        int code = result.Invoke(new InvocationConfiguration
        {
            Output = args.Count == 0 ? terminal.Error : terminal.Out,
            Error = terminal.Error,
            EnableDefaultExceptionHandler = false,
            ProcessTerminationTimeout = null,
        });
        return args.Count == 0 ? ExitCode.WrongInput : code;
    }

    private static void PrintErrors(ParseResult result, TextWriter stderr)
    {
        Command command = result.CommandResult.Command;
        if (result.UnmatchedTokens is [string token, ..])
        {
            IEnumerable<string> names = command.Subcommands.Select(c => c.Name).Concat(command.Options.Select(o => o.Name));
            string what = command.Subcommands.Count > 0 ? "there is no command" : $"{command.Name} does not take";
            stderr.WriteLine($"error: {what} '{token}'{NearestName.Suggest(token, names)}");
        }
        else
        {
            foreach (ParseError error in result.Errors)
            {
                stderr.WriteLine($"error: {error.Message}");
            }
        }

        string path = command.Subcommands.Count > 0 ? command.Name : $"framegen {command.Name}";
        stderr.WriteLine($"'{path} --help' tells more.");
    }

    private static void ListFiles(TextWriter stderr, OutputRefusedException refusal)
    {
        const int AtMost = 20;
        stderr.WriteLine($"error: {refusal.Message}");
        foreach (string file in refusal.Files.Take(AtMost))
        {
            stderr.WriteLine($"  {file}");
        }

        if (refusal.Files.Count > AtMost)
        {
            stderr.WriteLine($"  and {refusal.Files.Count - AtMost} more");
        }

        stderr.WriteLine("Nothing was written.");
    }

    private static void Trace(TextWriter stderr, Exception e)
    {
        if (Environment.GetEnvironmentVariable("FRAMEGEN_TRACE") is { Length: > 0 } and not "0")
        {
            stderr.WriteLine(e);
        }
    }
}
