using System.Globalization;
using System.Text;
using Scriban;
using Scriban.Functions;
using Scriban.Runtime;

namespace FrameGen.Output;

/// <summary>A text output made from one of the built-in templates.</summary>
/// <remarks>
/// A template sees its model and pure functions only: no clock, no files, no evaluation of texts; and it can't run for ever.
/// Texts of the user are data, never template code.
/// </remarks>
internal static class TextTemplate
{
    private static readonly string[] Unsafe = ["date", "object", "timespan", "regex"];

    /// <summary>Renders a template.</summary>
    /// <param name="name">Name of the file in templates/.</param>
    /// <param name="model">Its variables: the properties in snake case.</param>
    /// <exception cref="InvalidOperationException">The template does not parse, or prints what is not there.</exception>
    public static string Render(string name, object model)
    {
        Template template = Template.Parse(Load(name), name);
        if (template.HasErrors)
        {
            throw new InvalidOperationException(template.Messages.ToString());
        }

        var functions = new BuiltinFunctions();
        foreach (string key in Unsafe)
        {
            functions.Remove(key);
        }

        var markdown = new ScriptObject(StringComparer.Ordinal);
        markdown.Import("escape", MarkdownText.Escape);
        functions.Add("markdown", markdown);
        var context = new TemplateContext(functions, StringComparer.Ordinal)
        {
            StrictVariables = true,
            EnableRelaxedMemberAccess = false,
            EnableRelaxedIndexerAccess = false,
            LoopLimit = 100_000,
            RecursiveLimit = 50,
            LimitToString = 1 << 20,
            OutputLimit = 1 << 24,
            OnStringLimit = ScriptLimitBehavior.Throw,
            OnOutputLimit = ScriptLimitBehavior.Throw,
            NewLine = "\n",
        };
        context.PushCulture(CultureInfo.InvariantCulture);
        var variables = new ScriptObject(StringComparer.Ordinal);
        variables.Import(model);
        context.PushGlobal(variables);
        string text = template.Render(context);
        return name.EndsWith(".md", StringComparison.Ordinal) ? MarkdownText.AlignTables(text) : text;
    }

    /// <summary>A built-in template, or a part of one, as it stands.</summary>
    /// <param name="name">Name of the file in templates/.</param>
    public static string Load(string name)
    {
        using Stream stream = typeof(TextTemplate).Assembly.GetManifestResourceStream($"templates/{name}")
            ?? throw new InvalidOperationException($"The template {name} is not built in.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return reader.ReadToEnd().ReplaceLineEndings("\n");
    }
}
