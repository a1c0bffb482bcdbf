using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>
/// What a value may be. Forms are data: the reader reads with them, and whatever else must know the format
/// (an editor's schema, a list of keys) can walk them.
/// </summary>
internal abstract class Form
{
    /// <summary>What is expected, with its article: <c>a length such as `38 mm`</c>.</summary>
    public abstract string Words { get; }

    /// <summary>The keys of a map; none for other forms.</summary>
    public virtual IReadOnlyList<Key> Keys => [];

    /// <summary>The forms it is made of, beside those of its keys.</summary>
    public virtual IReadOnlyList<Form> Parts => [];
}

/// <summary>What a value may be, and how it is read.</summary>
/// <typeparam name="T">What it is read into.</typeparam>
internal abstract class Form<T> : Form
{
    /// <summary>Reads a value; what is wrong with it is reported, all of it.</summary>
    /// <returns>False after an error.</returns>
    public abstract bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out T value);

    /// <summary>The same form, read into something else.</summary>
    public Form<TOther> As<TOther>(Func<T, TOther> convert) => new ConvertedForm<T, TOther>(this, convert);

    /// <summary>Reports that the value is something else altogether.</summary>
    protected bool Refuse(YamlNode node, Reading reading, [MaybeNullWhen(false)] out T value)
    {
        value = default;
        reading.Error(node.At, $"expected {Words}, got {node.Words}");
        return false;
    }
}
