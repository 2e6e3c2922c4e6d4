using System.CommandLine;
using System.CommandLine.Parsing;
using System.Diagnostics;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Ledger;

namespace Redshift.Cli;

/// <summary><c>zladder run</c>: many spectra to a catalogue.</summary>
internal sealed class RunCommand
{
    private readonly Command _command = new("run", "Measure all spectra of files and folders and write the catalogue.");
    private readonly PathArguments _paths;
    private readonly SharedOptions _shared;

    private readonly Option<string> _out = OutputOptions.Out();

    private readonly Option<int?> _jobs = JobsOption.Create();
    private readonly Option<int?> _maxRejects = WholeNumber.Option("--max-rejects", "End with status 4 where more than N spectra or files cannot be used", 0);
    private readonly Option<bool> _plots = OutputOptions.Plots();

    private readonly Option<bool> _again = new("--again") { Description = "Measure everything again, also what an earlier run into the same folder did" };

    private readonly Option<bool> _verify = new("--verify")
    {
        Description = "Read all files and compare their content with the ledger; otherwise size and time tell whether a file changed",
    };

    private readonly Option<Shard?> _shard = new("--shard")
    {
        Description = "Measure only part I of N; the same inputs must be given for every part, and 'zladder merge' joins them",
        HelpName = "I/N",
        CustomParser = ParseShard,
    };

    private readonly Option<bool> _json = OutputOptions.Json();

    private RunCommand()
    {
        _paths = new(_command);
        _command.Add(_out);
        _shared = new(_command);
        _command.Add(_plots);
        _command.Add(_jobs);
        _command.Add(_maxRejects);
        _command.Add(_shard);
        _command.Add(_again);
        _command.Add(_verify);
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
        var jobs = JobsOption.Read(_jobs, parsed);
        using var session = new Session(parsed.GetRequiredValue(_out), settings, jobs, parsed.GetValue(_plots), parsed.GetValue(_shard));
        var measured = await session.MeasureAsync(files, parsed.GetValue(_again), parsed.GetValue(_verify), token).ConfigureAwait(false);
        var tally = Tally.Of(session.Ledger);
        Summary.Print(tally, measured, parsed.GetRequiredValue(_out), watch.Elapsed, parsed.GetValue(_json));
        // A part of the inputs may be empty; whether anything can be used is for the merge to say.
        return (tally.Results == 0 && parsed.GetValue(_shard) is null) || tally.Rejects > parsed.GetValue(_maxRejects) ? ExitCode.Unusable : ExitCode.Done;
    }

    private static Shard? ParseShard(ArgumentResult result)
    {
        var text = result.Tokens[0].Value;
        if (Shard.TryParse(text, out var shard))
            return shard;
        OptionValue.Refuse(result, "a part and the number of parts, such as 3/7; the first part is 1, the last one here 7");
        return null;
    }
}
