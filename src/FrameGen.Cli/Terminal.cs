using System.Buffers;
using System.Globalization;
using System.Text;
using Spectre.Console;
using Spectre.Console.Rendering;

namespace FrameGen.Cli;

/// <summary>Where results and messages go, and what the place can show.</summary>
/// <remarks>Colour and progress only where the writer really is the terminal's; colour never with NO_COLOR.</remarks>
internal sealed class Terminal
{
    /// <summary>Stands in a drawing for a blank that the drawing library must not move; printed as a blank.</summary>
    public const char TiedBlank = '\u00A0';

    private const int DefaultWidth = 80;

    private static readonly SearchValues<char> CodeCharacters = SearchValues.Create("[0123456789;");

    /// <summary>Takes the two writers.</summary>
    public Terminal(TextWriter output, TextWriter error)
    {
        Out = output;
        Error = error;
        OutIsTerminal = ReferenceEquals(output, Console.Out) && !Console.IsOutputRedirected;
        ErrorIsTerminal = ReferenceEquals(error, Console.Error) && !Console.IsErrorRedirected;
    }

    /// <summary>Results.</summary>
    public TextWriter Out { get; }

    /// <summary>Errors, warnings and progress.</summary>
    public TextWriter Error { get; }

    /// <summary>True where results go to a terminal.</summary>
    public bool OutIsTerminal { get; }

    /// <summary>True where messages go to a terminal.</summary>
    public bool ErrorIsTerminal { get; }

    /// <summary>Columns to fill: the terminal's, 80 where there is none.</summary>
    public int Width => OutIsTerminal && Console.WindowWidth > 0 ? Console.WindowWidth : DefaultWidth;

    private bool Colour => OutIsTerminal && string.IsNullOrEmpty(Environment.GetEnvironmentVariable("NO_COLOR"));

    /// <summary>
    /// Draws a table or a text, with no blanks at the ends of lines and no empty lines above or below. The drawing library is loaded by
    /// the first call.
    /// </summary>
    public void Draw(IRenderable content)
    {
        using var drawn = new StringWriter(CultureInfo.InvariantCulture);
        IAnsiConsole console = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Ansi = AnsiSupport.No,
            ColorSystem = ColorSystemSupport.NoColors,
            Interactive = InteractionSupport.No,
            Out = new AnsiConsoleOutput(drawn),
        });
        if (Colour)
        {
            // The place itself is asked what it can show; the drawing goes through a text, so that lines can be trimmed.
            Capabilities place = AnsiConsole.Create(new AnsiConsoleSettings { Out = new AnsiConsoleOutput(Out) }).Profile.Capabilities;
            console.Profile.Capabilities.Ansi = place.Ansi;
            console.Profile.Capabilities.ColorSystem = place.ColorSystem;
        }

        console.Profile.Width = Width;
        console.Write(content);
        string[] lines = [.. drawn.ToString().Split('\n').Select(WithoutTrailingBlanks)];
        int first = Array.FindIndex(lines, l => l.Length > 0);
        int last = Array.FindLastIndex(lines, l => l.Length > 0);
        for (int i = Math.Max(first, 0); i <= last; i++)
        {
            Out.WriteLine(lines[i].Replace(TiedBlank, ' '));
        }
    }

    /// <summary>Takes the blanks off the end of a line, also those before the last colour codes.</summary>
    internal static string WithoutTrailingBlanks(string line)
    {
        int end = line.Length;
        var codes = new StringBuilder();
        while (end > 0)
        {
            int code = line[end - 1] == 'm' ? line.LastIndexOf('\e', end - 1) : -1;
            if (line[end - 1] is ' ' or '\r' or TiedBlank)
            {
                end--;
            }
            else if (code >= 0 && line.AsSpan(code + 1, end - code - 2).IndexOfAnyExcept(CodeCharacters) < 0)
            {
                codes.Insert(0, line[code..end]);
                end = code;
            }
            else
            {
                break;
            }
        }

        return line[..end] + codes;
    }
}
