using System.CommandLine;
using System.CommandLine.Parsing;
using System.Diagnostics;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Report;

namespace Redshift.Cli;

/// <summary><c>zladder watch</c>: a folder that fills during the night.</summary>
internal sealed class WatchCommand
{
    private const double ShortestInterval = 0.1;
    private const double LongestInterval = 3600;

    private readonly Command _command = new("watch", "Measure the files of a folder as they arrive, and keep the catalogue current, until interrupted.");
    private readonly Argument<string> _watched = new("DIR") { Description = "Folder to watch, with all folders below it" };

    private readonly Option<string> _out = OutputOptions.Out("OUT");

    private readonly SharedOptions _shared;

    private readonly Option<double> _every = new("--every")
    {
        Description = "Seconds between two looks; a file is complete when it stays the same from one look to the next",
        HelpName = "S",
        DefaultValueFactory = _ => 5,
        CustomParser = ParseInterval,
    };

    private readonly Option<bool> _plots = OutputOptions.Plots();
    private readonly Option<int?> _jobs = JobsOption.Create();

    private WatchCommand()
    {
        MistypedOption.Refuse(_watched);
        _command.Add(_watched);
        _command.Add(_out);
        _shared = new(_command);
        _command.Add(_every);
        _command.Add(_plots);
        _command.Add(_jobs);
        _command.SetAction(RunAsync);
    }

    /// <summary>Makes the command.</summary>
    public static Command Build() => new WatchCommand()._command;

    private async Task<int> RunAsync(ParseResult parsed, CancellationToken token)
    {
        var clock = Stopwatch.StartNew();
        // From here on the caller's thread is free to wait for an interrupt.
        await Task.Yield();
        var output = parsed.GetRequiredValue(_out);
        using var session = new Session(output, _shared.Settings(parsed), JobsOption.Read(_jobs, parsed), parsed.GetValue(_plots));
        try
        {
            await WatchAsync(parsed, session, token).ConfigureAwait(false);
        }
        catch (OperationCanceledException)
        {
            // This is how a watch ends. What was measured of files in flight belongs into the catalogue too.
            session.WriteTables(CancellationToken.None);
        }

        Summary.Print(Tally.Of(session.Ledger), null, output, clock.Elapsed, json: false);
        return ExitCode.Done;
    }

    private async Task WatchAsync(ParseResult parsed, Session session, CancellationToken token)
    {
        var folder = parsed.GetRequiredValue(_watched);
        var watch = new FolderWatch(folder, parsed.GetRequiredValue(_out));
        var wasThere = true;
        while (true)
        {
            if (wasThere != (wasThere = watch.IsThere))
                Console.Error.WriteLine($"{HarmlessText.Printable(folder)} {(wasThere ? "is back" : "cannot be seen; waiting for it")}");
            if (watch.Look() is { } files)
                Tell(await session.MeasureAsync(files, again: false, verify: false, token).ConfigureAwait(false), session);
            await Task.Delay(TimeSpan.FromSeconds(parsed.GetValue(_every)), token).ConfigureAwait(false);
        }
    }

    private static void Tell(int measured, Session session)
    {
        var tally = Tally.Of(session.Ledger);
        Console.Error.WriteLine($"{measured} measured now, {tally.Results} in the catalogue, {tally.Rejects} rejects; waiting for more");
    }

    private static double ParseInterval(ArgumentResult result) => DecimalNumber.Parse(
        result, seconds => seconds is >= ShortestInterval and <= LongestInterval,
        FormattableString.Invariant($"a number of seconds from {ShortestInterval} to {LongestInterval}"));
}
