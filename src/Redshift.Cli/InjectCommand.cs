using System.CommandLine;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Inject;
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

    private readonly Option<string?> _calibration = new("--calibration")
    {
        Description = FormattableString.Invariant(
            $"Fit the confidences to what is recovered, and write them as part of a pipeline file; {Recalibration.LeastObjects} objects or more"),
        HelpName = "FILE",
    };

    private readonly Option<bool> _json = new("--json") { Description = "Print JSON" };

    private InjectCommand()
    {
        _paths = new(_command);
        foreach (var option in new Option[] { _count, _seed })
            _command.Add(option);
        _shared = new(_command);
        foreach (var option in new Option[] { _jobs, _csv, _plot, _calibration, _json })
            _command.Add(option);
        _command.SetAction(RunAsync);
    }

    /// <summary>Makes the command.</summary>
    public static Command Build() => new InjectCommand()._command;

    private async Task<int> RunAsync(ParseResult parsed, CancellationToken token)
    {
        // From here on the caller's thread is free to wait for an interrupt.
        await Task.Yield();
        var count = Count(parsed);
        var seed = (ulong)(parsed.GetValue(_seed) ?? UsualSeed);
        var settings = _shared.Settings(parsed);
        var files = InputFiles.Find(_paths.Read(parsed), null);
        // Begun before the long work, so that a path which cannot be written is heard of at once.
        using var table = parsed.GetValue(_csv) is { } path ? new CsvTable<Injection>(path, InjectionColumns.All) : null;
        using var calibration = parsed.GetValue(_calibration) is { } toml ? new CalibrationFile(toml) : null;
        using var run = new InjectionRun(settings, JobsOption.Read(_jobs, parsed));
        Read(run, files, seed, token);
        if (run.Givers == 0)
            return Refuse("no spectrum can be used, so there is nothing to put objects into");
        var injections = Inject(run, count, seed, token);
        foreach (var injection in injections)
            table?.Add(injection);
        table?.Complete();
        var maps = calibration is null ? [] : Recalibration.Of(injections, settings.Match);
        var recovery = new Recovery(injections);
        var report = new InjectionReport(recovery, run.Givers, seed, maps);
        Print(parsed, report, recovery);
        return calibration is null ? ExitCode.Done : Write(calibration, maps, report.Origin);
    }

    private static int Write(CalibrationFile calibration, IReadOnlyList<RecalibratedMap> maps, string origin)
    {
        if (maps.All(map => map.State == MapState.TooFew))
            return Refuse("no calibration written: too few answers, or too few right or wrong ones; try more objects (--count)");
        calibration.Complete(maps, origin);
        return ExitCode.Done;
    }

    private int Count(ParseResult parsed)
    {
        var count = parsed.GetValue(_count) ?? UsualCount;
        if (count > MostCount)
            throw new UsageException(FormattableString.Invariant($"--count {count}: expected {MostCount} at most"));
        if (parsed.GetValue(_calibration) is not null && count < Recalibration.LeastObjects)
            throw new UsageException(FormattableString.Invariant($"--calibration with {count} objects: expected --count {Recalibration.LeastObjects} or more"));
        return count;
    }

    private static void Read(InjectionRun run, IReadOnlyList<InputFile> files, ulong seed, CancellationToken token)
    {
        using var progress = new CountProgress("spectra stripped of their objects");
        run.Read(files, seed, reject => progress.Say("rejected: " + reject), progress.Step, token);
    }

    private static IReadOnlyList<Injection> Inject(InjectionRun run, int count, ulong seed, CancellationToken token)
    {
        using var progress = new CountProgress("objects measured");
        return run.Inject(count, seed, progress.Step, token);
    }

    private void Print(ParseResult parsed, InjectionReport report, Recovery recovery)
    {
        if (parsed.GetValue(_json))
            Console.WriteLine(report.BuildJson());
        else
            report.WriteText(Console.Out);
        if (parsed.GetValue(_plot) is { } picture)
            RecoveryPicture.Save(recovery, picture);
    }

    private static int Refuse(string message)
    {
        Console.Error.WriteLine("zladder: " + message);
        return ExitCode.Unusable;
    }
}
