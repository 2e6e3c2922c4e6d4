using System.CommandLine;
using Redshift.Pipeline;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Explain;
using Redshift.Pipeline.Report.Plots;

namespace Redshift.Cli;

/// <summary><c>zladder explain</c>: one spectrum, its answer and the reasons.</summary>
internal sealed class ExplainCommand
{
    private readonly Command _command = new("explain", "Measure one spectrum and say why the answer is believed.");
    private readonly Argument<string> _file = new("FILE") { Description = "File with the spectrum" };
    private readonly SharedOptions _shared;

    private readonly Option<int> _row = new("--row")
    {
        Description = "Which spectrum of a file with several, from 0",
        HelpName = "N",
        CustomParser = result => WholeNumber.Parse(result, 0) ?? 0,
    };

    private readonly Option<bool> _layout = new("--layout")
    {
        Description = "Show what was found in the file and how it was read, without measuring",
    };

    private readonly Option<string?> _plot = new("--plot") { Description = "Draw the spectrum with its answer", HelpName = "PNG" };
    private readonly Option<bool> _json = new("--json") { Description = "Print JSON" };

    private ExplainCommand()
    {
        _command.Add(_file);
        _command.Add(_row);
        _shared = new(_command);
        _command.Add(_layout);
        _command.Add(_plot);
        _command.Add(_json);
        _command.SetAction(Run);
    }

    /// <summary>Makes the command.</summary>
    public static Command Build() => new ExplainCommand()._command;

    private int Run(ParseResult parsed)
    {
        var settings = _shared.Settings(parsed);
        var path = parsed.GetRequiredValue(_file);
        var row = parsed.GetValue(_row);
        if (!File.Exists(path))
            throw new UsageException($"there is no file {path}");
        var (observation, reject) = Find(SpectrumLoader.Load(path, HarmlessText.ForTable(Path.GetFileName(path)), settings.Load), row);
        if (parsed.GetValue(_layout))
            PrintLayout(observation, SpectrumLoader.Describe(path, row, settings.Load), parsed.GetValue(_json));
        if (observation is null)
        {
            Console.Error.WriteLine("rejected: " + HarmlessText.Printable(reject!.ToString()));
            return ExitCode.Unusable;
        }

        if (!parsed.GetValue(_layout))
            Explain(parsed, new ObservationPipeline(settings).Analyze(observation), settings.Load.Keep);
        return ExitCode.Done;
    }

    private static LoadOutcome Find(IEnumerable<LoadOutcome> outcomes, int row)
    {
        var count = 0;
        foreach (var outcome in outcomes)
        {
            if (outcome.Observation?.Row == row || outcome.Reject?.Row == row || outcome.Reject is { Row: null })
                return outcome;
            count++;
        }

        throw new UsageException($"there is no row {row}: the file holds {count} {(count == 1 ? "spectrum" : "spectra")}, counted from 0");
    }

    private static void PrintLayout(Observation? observation, FileDescription file, bool json)
    {
        if (json)
            Console.WriteLine(ExplanationJson.BuildLayout(observation, file));
        else
            Explanation.WriteLayout(Console.Out, observation, file);
    }

    private void Explain(ParseResult parsed, Pipeline.Results.ObservationResult result, IReadOnlyList<string> keep)
    {
        if (parsed.GetValue(_plot) is { } picture)
            SpectrumPicture.Save(result, picture);
        if (parsed.GetValue(_json))
            Console.WriteLine(ExplanationJson.Build(result, keep));
        else
            Explanation.Write(Console.Out, result);
    }
}
