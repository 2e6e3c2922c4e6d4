using System.CommandLine;

namespace Redshift.Cli;

/// <summary>The options of commands that fill an output folder.</summary>
internal static class OutputOptions
{
    /// <summary>Makes the option <c>--out</c>.</summary>
    /// <param name="helpName">What stands for the folder in the help.</param>
    public static Option<string> Out(string helpName = "DIR") => new("--out")
    {
        Description = "Folder for the catalogue; made where it does not exist",
        HelpName = helpName,
        Required = true,
    };

    /// <summary>Makes the option <c>--plots</c>.</summary>
    public static Option<bool> Plots() => new("--plots") { Description = "Draw every spectrum with its answer into the folder plots" };

    /// <summary>Makes the option <c>--json</c>.</summary>
    public static Option<bool> Json() => new("--json") { Description = "Print the summary as JSON" };
}
