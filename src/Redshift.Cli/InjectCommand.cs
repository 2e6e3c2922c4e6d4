using System.CommandLine;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Inject;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Plots;

namespace Redshift.Cli;

/// <summary><c>zladder inject</c>: computed objects put into the user's own spectra, and what is recovered of them.</summary>
internal sealed class InjectCommand
{
    private const int UsualCount = 200;
    private const int MostCount = 100_000;
    private const int UsualSeed = 1;

    private readonly Command _command = new(
        "inject", "Put computed objects into your own spectra and tell what is recovered on this instrument.");

    private readonly PathArguments _paths;
    private readonly SharedOptions _shared;

    private readonly Option<int?> _count = WholeNumber.Option(
        "--count", FormattableString.Invariant($"Number of objects, {UsualCount} unless given and {MostCount} at most"), 1);

    private readonly Option<int?> _seed = WholeNumber.Option(
        "--seed", FormattableString.Invariant($"Another number, other objects; {UsualSeed} unless given"), 0);

    private readonly Option<int?> _jobs = JobsOption.Create();
    private readonly Option<string?> _csv = new("--csv") { Description = "Write a table with a row for every object", HelpName = "FILE" };
    private readonly Option<string?> _plot = new("--plot") { Description = "Draw what is recovered", HelpName = "PNG" };
    private readonly Option<bool> _json = new("--json") { Description = "Print JSON" };

    private InjectCommand()
    {
        _paths = new(_command);
        foreach (var option in new Option[] { _count, _seed })
            _command.Add(option);
        _shared = new(_command);
        foreach (var option in new Option[] { _jobs, _csv, _plot, _json })
            _command.Add(option);
        _command.SetAction(RunAsync);
    }

    /// <summary>Makes the command.</summary>
    public static Command Build() => new InjectCommand()._command;

    private async Task<int> RunAsync(ParseResult parsed, CancellationToken token)
    {
        // From here on the caller's thread is free to wait for an interrupt.
        await Task.Yield();
        var count = parsed.GetValue(_count) ?? UsualCount;
        if (count > MostCount)
            throw new UsageException(FormattableString.Invariant($"--count {count}: expected {MostCount} at most"));
        var seed = (ulong)(parsed.GetValue(_seed) ?? UsualSeed);
        var files = InputFiles.Find(_paths.Read(parsed), null);
        using var run = new InjectionRun(_shared.Settings(parsed), JobsOption.Read(_jobs, parsed));
        run.Read(files, seed, SayReject, token);
        if (run.Givers == 0)
        {
            Console.Error.WriteLine("zladder: no spectrum can be used, so there is nothing to put objects into");
            return ExitCode.Unusable;
        }

        // Begun before the long work, so that a path which cannot be written is heard of at once.
        using var table = parsed.GetValue(_csv) is { } path ? new CsvTable<Injection>(path, InjectionColumns.All) : null;
        var injections = run.Inject(count, seed, token);
        foreach (var injection in injections)
            table?.Add(injection);
        table?.Complete();
        Report(parsed, new(injections), run.Givers, seed);
        return ExitCode.Done;
    }

    private void Report(ParseResult parsed, Recovery recovery, int givers, ulong seed)
    {
        var report = new InjectionReport(recovery, givers, seed);
        if (parsed.GetValue(_json))
            Console.WriteLine(report.BuildJson());
        else
            report.WriteText(Console.Out);
        if (parsed.GetValue(_plot) is { } picture)
            RecoveryPicture.Save(recovery, picture);
    }

    private static void SayReject(Reject reject) => Console.Error.WriteLine("rejected: " + HarmlessText.Printable(reject.ToString()));
}
