using System.CommandLine;
using System.Diagnostics;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Plots;
using Redshift.Pipeline.Results;

namespace Redshift.Cli;

/// <summary><c>zladder run</c>: many spectra to a catalogue.</summary>
internal sealed class RunCommand
{
    private readonly Command _command = new("run", "Measure all spectra of files and folders and write the catalogue.");
    private readonly PathArguments _paths;
    private readonly SharedOptions _shared;

    private readonly Option<string> _out = new("--out")
    {
        Description = "Folder for the catalogue; made where it does not exist",
        HelpName = "DIR",
        Required = true,
    };

    private readonly Option<int?> _jobs = Count("--jobs", "Number of spectra measured at the same time; as many as there are processors unless given", 1);
    private readonly Option<int?> _maxRejects = Count("--max-rejects", "End with status 4 where more than N spectra or files cannot be used", 0);
    private readonly Option<bool> _plots = new("--plots") { Description = "Draw every spectrum with its answer into the folder plots" };
    private readonly Option<bool> _json = new("--json") { Description = "Print the summary as JSON" };

    private RunCommand()
    {
        _paths = new(_command);
        _command.Add(_out);
        _shared = new(_command);
        _command.Add(_plots);
        _command.Add(_jobs);
        _command.Add(_maxRejects);
        _command.Add(_json);
        _command.SetAction(RunAsync);
    }

    /// <summary>Makes the command.</summary>
    public static Command Build() => new RunCommand()._command;

    private async Task<int> RunAsync(ParseResult parsed, CancellationToken token)
    {
        var watch = Stopwatch.StartNew();
        // From here on the caller's thread is free to wait for an interrupt, even while standard input keeps us waiting.
        await Task.Yield();
        var settings = _shared.Settings(parsed);
        var files = InputFiles.Find(_paths.Read(parsed), parsed.GetRequiredValue(_out));
        var jobs = parsed.GetValue(_jobs) ?? Workers.Available(Environment.GetEnvironmentVariable);
        using var folder = new ReportFolder(parsed.GetRequiredValue(_out), settings.Load.Keep);
        using var progress = Progress.Start(files.Count);
        var tally = new Tally();
        Action<ObservationResult>? draw = parsed.GetValue(_plots) ? new PlotFolder(folder.Path, progress.Say).Draw : null;
        await foreach (var outcome in new BatchRun(settings, jobs, draw).RunAsync(files, token).ConfigureAwait(false))
        {
            Record(outcome, folder, progress);
            tally.Count(outcome);
            progress.Update(outcome.File, tally);
        }

        folder.Complete();
        progress.Dispose();
        Summary.Print(tally, folder.Path, watch.Elapsed, parsed.GetValue(_json));
        return tally.Results == 0 || tally.Rejects > parsed.GetValue(_maxRejects) ? ExitCode.Unusable : ExitCode.Done;
    }

    private static void Record(BatchOutcome outcome, ReportFolder folder, Progress progress)
    {
        if (outcome.Result is { } result)
            folder.Add(result);
        if (outcome.Reject is not { } reject)
            return;
        folder.Add(reject);
        progress.Say("rejected: " + reject);
    }

    private static Option<int?> Count(string name, string description, int least) => new(name)
    {
        Description = description,
        HelpName = "N",
        CustomParser = result => WholeNumber.Parse(result, least),
    };
}
