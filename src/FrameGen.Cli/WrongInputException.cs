namespace FrameGen.Cli;

/// <summary>A command can't be followed as it was given.</summary>
/// <param name="message">What is wrong, and what to do.</param>
internal sealed class WrongInputException(string message) : Exception(message);
