using FrameGen.Diagnostics;

namespace FrameGen.Spec.Forms;

/// <summary>What is known while a value is read.</summary>
/// <param name="Problems">What is wrong so far.</param>
/// <param name="Owner">The name the value stands under: the tube's, the case's; empty outside such lists.</param>
internal sealed record Reading(ProblemList Problems, Placed<string> Owner)
{
    /// <summary>Reports an error.</summary>
    public void Error(SourcePlace at, string message) => Problems.Error(at, message);
}
