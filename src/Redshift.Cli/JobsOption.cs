using System.CommandLine;
using Redshift.Pipeline.Batch;

namespace Redshift.Cli;

/// <summary>The option <c>--jobs</c>, the same in every command that measures many spectra.</summary>
internal static class JobsOption
{
    /// <summary>Makes the option.</summary>
    public static Option<int?> Create() => WholeNumber.Option(
        "--jobs", "Number of spectra measured at the same time; as many as there are processors unless given", 1);

    /// <summary>What was given, or what the machine has room for.</summary>
    public static int Read(Option<int?> option, ParseResult parsed) =>
        parsed.GetValue(option) ?? Workers.Available(Environment.GetEnvironmentVariable);
}
