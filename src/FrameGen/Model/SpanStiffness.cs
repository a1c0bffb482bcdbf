using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>How a tube thought of alone bends: plain bending theory (Roark, Formulas for Stress and Strain, table 8.1).</summary>
public static class SpanStiffness
{
    /// <summary>
    /// k of δ = PL³/kEI: 3 for a cantilever loaded at its end, 48 for a simply supported span and 192 for one clamped at both ends, loaded in
    /// the middle.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">Not a kind of span.</exception>
    public static double Share(SpanKind span) => span switch
    {
        SpanKind.Cantilever => 3,
        SpanKind.SimplySupported => 48,
        SpanKind.FixedFixed => 192,
        _ => throw new ArgumentOutOfRangeException(nameof(span), span, "Not a kind of span."),
    };

    /// <summary>The least EI, N·mm², that keeps a span's deflection within a limit.</summary>
    /// <param name="span">How it is held.</param>
    /// <param name="load">P, N; its sign does not matter.</param>
    /// <param name="length">L, mm.</param>
    /// <param name="maxDeflection">δ, mm; positive.</param>
    public static double LeastBending(SpanKind span, double load, double length, double maxDeflection) =>
        Math.Abs(load) * length * length * length / (Share(span) * maxDeflection);
}
