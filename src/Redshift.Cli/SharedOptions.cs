using System.CommandLine;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Settings;

namespace Redshift.Cli;

/// <summary>The options that say how spectra are read and what is searched; the same in every command that analyses.</summary>
internal sealed class SharedOptions
{
    private readonly Option<string?> _pipeline = new("--pipeline")
    {
        Description = "Pipeline file (TOML) with the parameters of the stages; see the folder pipelines",
        HelpName = "FILE",
    };

    private readonly Option<string?> _expect = WordOption.Create("--expect", "Search only one kind of object", [.. Words.Kinds.Keys, "any"]);

    private readonly Option<(double Low, double High)?> _range = new("--z-range")
    {
        Description = FormattableString.Invariant(
            $"Search only these redshifts, two numbers from {RedshiftRange.Lowest} to {RedshiftRange.Highest} with a comma between"),
        HelpName = "LO,HI",
        CustomParser = result => NumberPair.Parse(result, RedshiftRange.Lowest, RedshiftRange.Highest),
    };

    /// <summary>Makes the options and adds them to a command.</summary>
    public SharedOptions(Command command)
    {
        command.Add(_pipeline);
        command.Add(_expect);
        command.Add(_range);
    }

    /// <summary>The pipeline file, or the defaults, with what the command line says on top.</summary>
    /// <exception cref="SettingsException">The pipeline file cannot be used.</exception>
    public PipelineSettings Settings(ParseResult parsed)
    {
        var settings = parsed.GetValue(_pipeline) is { } file ? PipelineFile.Load(file) : new PipelineSettings();
        var match = settings.Match;
        if (parsed.GetValue(_expect) is { } kind)
            match = match with { Expect = Words.Kinds.TryGetValue(kind, out var value) ? value : null };
        if (parsed.GetValue(_range) is var (low, high))
            match = match with { ZMin = low, ZMax = high };
        return settings with { Match = match };
    }
}
