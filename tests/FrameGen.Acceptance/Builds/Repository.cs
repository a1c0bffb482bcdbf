namespace FrameGen.Acceptance.Builds;

/// <summary>The checkout the tests run in.</summary>
internal static class Repository
{
    /// <summary>Folder that holds FrameGen.sln.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>A path under the root.</summary>
    public static string PathOf(params string[] parts) => Path.Combine([Root, .. parts]);

    private static string FindRoot()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "FrameGen.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("The tests run outside a checkout.");
    }
}
