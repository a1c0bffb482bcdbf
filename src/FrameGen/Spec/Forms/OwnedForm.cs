using System.Diagnostics.CodeAnalysis;
using FrameGen.Spec.Yaml;

namespace FrameGen.Spec.Forms;

/// <summary>A form whose value is joined with the name it stands under.</summary>
internal sealed class OwnedForm<T, TOwned>(Form<T> inner, Func<Placed<string>, T, TOwned> join) : Form<TOwned>
{
    /// <inheritdoc/>
    public override string Words => inner.Words;

    /// <inheritdoc/>
    public override IReadOnlyList<Form> Parts => [inner];

    /// <inheritdoc/>
    public override bool TryRead(YamlNode node, Reading reading, [MaybeNullWhen(false)] out TOwned value)
    {
        if (inner.TryRead(node, reading, out T? read))
        {
            value = join(reading.Owner, read);
            return true;
        }

        value = default;
        return false;
    }
}
