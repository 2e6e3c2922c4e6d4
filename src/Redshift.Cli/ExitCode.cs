namespace Redshift.Cli;

/// <summary>The exit status of the command.</summary>
internal static class ExitCode
{
    /// <summary>Done; rejects are listed.</summary>
    public const int Done = 0;

    /// <summary>Wrong usage, or a pipeline file that cannot be used.</summary>
    public const int Usage = 2;

    /// <summary>Could not go on: disk full, folder not writable.</summary>
    public const int Stopped = 3;

    /// <summary>Nothing usable, or more rejects than allowed.</summary>
    public const int Unusable = 4;

    /// <summary>Another run writes into the output folder.</summary>
    public const int FolderInUse = 5;

    /// <summary>Interrupted from the keyboard or by a signal.</summary>
    public const int Interrupted = 130;
}
