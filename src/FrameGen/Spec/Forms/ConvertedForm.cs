using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A form whose value is turned into something else.</summary>
internal sealed class ConvertedForm<T, TOther>(Form<T> inner, Func<T, TOther> convert) : Form<TOther>
{
    /// <inheritdoc/>
    public override string Words => inner.Words;

    /// <inheritdoc/>
    public override IReadOnlyList<Form> Parts => [inner];

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out TOther value)
    {
        if (inner.TryRead(node, reading, out T? read))
        {
            value = convert(read);
            return true;
        }

        value = default;
        return false;
    }
}
