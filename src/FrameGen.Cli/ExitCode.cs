namespace FrameGen.Cli;

/// <summary>What the program returns to the shell.</summary>
internal static class ExitCode
{
    /// <summary>Done.</summary>
    public const int Done = 0;

    /// <summary>The targets can't be met, or the papers don't match.</summary>
    public const int Unmet = 1;

    /// <summary>The spec or the command line is wrong.</summary>
    public const int WrongInput = 2;

    /// <summary>The environment failed: disk, rights.</summary>
    public const int Environment = 3;

    /// <summary>A fault of the program.</summary>
    public const int Fault = 70;
}
