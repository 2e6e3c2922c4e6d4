using System.Diagnostics;
using System.Globalization;

namespace Redshift.Benchmarks.Runs;

/// <summary>What a whole process cost.</summary>
/// <param name="Wall">From start to end.</param>
/// <param name="Processor">Processor time, user and system.</param>
/// <param name="PeakMegabytes">Highest resident memory.</param>
internal sealed record MeasuredProcess(TimeSpan Wall, TimeSpan Processor, double PeakMegabytes)
{
    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(10);

    /// <summary>Runs a process to its end.</summary>
    /// <exception cref="InvalidOperationException">It failed.</exception>
    public static MeasuredProcess Run(string program, params IReadOnlyList<string> arguments)
    {
        var before = ResourceUsage.OfChildren();
        var watch = Stopwatch.StartNew();
        var start = new ProcessStartInfo(program, arguments) { RedirectStandardOutput = true, RedirectStandardError = true };
        using var process = Process.Start(start) ?? throw new InvalidOperationException($"{program} did not start");
        var said = Task.WhenAll(process.StandardOutput.ReadToEndAsync(), process.StandardError.ReadToEndAsync());
        var peak = 0.0;
        while (!process.WaitForExit(Pause))
            peak = Math.Max(peak, Peak(process.Id));
        process.WaitForExit();
        var wall = watch.Elapsed;
        if (process.ExitCode != 0)
            throw new InvalidOperationException($"{program} failed with {process.ExitCode}: {string.Join('\n', said.Result)}");
        return new(wall, ResourceUsage.OfChildren() - before, peak);
    }

    // VmHWM is a high-water mark: the last look before the end misses little (proc(5)).
    private static double Peak(int process)
    {
        try
        {
            var line = File.ReadLines($"/proc/{process}/status").FirstOrDefault(line => line.StartsWith("VmHWM:", StringComparison.Ordinal));
            return line is null ? 0 : double.Parse(line.AsSpan(6).Trim().TrimEnd("kB").Trim(), CultureInfo.InvariantCulture) / 1000;
        }
        catch (IOException)
        {
            return 0;
        }
    }
}
