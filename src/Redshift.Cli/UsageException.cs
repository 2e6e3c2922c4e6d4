namespace Redshift.Cli;

/// <summary>What was asked for on the command line cannot be done as it stands.</summary>
internal sealed class UsageException(string message) : Exception(message);
