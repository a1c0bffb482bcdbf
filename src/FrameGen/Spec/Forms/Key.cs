using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A key of the format, declared once.</summary>
/// <param name="Name">As written.</param>
/// <param name="Description">What it is for, for people.</param>
/// <param name="Example">A value, as written.</param>
internal abstract record Key(string Name, string Description, string Example)
{
    /// <summary>True where a map must have it.</summary>
    public bool IsRequired { get; init; }

    /// <summary>True where it is read and checked but has no effect yet: using it is an error that says so.</summary>
    public bool IsNotSupportedYet { get; init; }

    /// <summary>What it holds.</summary>
    public abstract Form Form { get; }

    /// <summary>Reads its value.</summary>
    public abstract bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out object value);
}

/// <summary>A key and what its value is read into.</summary>
internal sealed record Key<T>(string Name, Form<T> Holds, string Description, string Example) : Key(Name, Description, Example)
    where T : notnull
{
    /// <inheritdoc/>
    public override Form Form => Holds;

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out object value)
    {
        bool isRead = Holds.TryRead(node, reading, out T? typed);
        value = typed;
        return isRead;
    }
}
