using System.Reflection;

namespace FrameGen.Output;

/// <summary>What every file says about the program that wrote it.</summary>
public static class ToolIdentity
{
    /// <summary>Name of the program.</summary>
    public const string Name = "FrameGen";

    /// <summary>Version without the source revision, so that files don't change with every commit: <c>0.1.0</c>.</summary>
    public static string Version { get; } = FindVersion();

    private static string FindVersion()
    {
        string full = typeof(ToolIdentity).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "0";
        return full.Split('+')[0];
    }
}
