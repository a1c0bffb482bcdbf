using FrameGen.Diagnostics;

namespace FrameGen.Spec.Yaml;

/// <summary>What ends the reading of a YAML file.</summary>
/// <param name="at">Where.</param>
/// <param name="message">In the user's words.</param>
internal sealed class YamlProblem(SourcePlace at, string message) : Exception(message)
{
    /// <summary>Where.</summary>
    public SourcePlace At => at;
}
