namespace PathPortal.Cli;

/// <summary>A mistake of the caller's or of the surroundings, told in one line.</summary>
internal sealed class CommandException(string message) : Exception(message);
