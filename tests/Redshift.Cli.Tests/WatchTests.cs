using System.Diagnostics;
using System.Globalization;
using Xunit;

namespace Redshift.Cli.Tests;

/// <summary>A folder that fills while it is watched.</summary>
public sealed class WatchTests : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromMinutes(2);

    private readonly SpectraFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Files_enter_the_catalogue_as_they_arrive_and_an_interrupt_is_the_end()
    {
        using var process = Zladder.Start("watch", _folder.Spectra, "--out", _folder.Out("watched"), "--every", "0.2");
        try
        {
            WaitFor("sub/b.txt");
            _folder.WriteText("late.txt", seed: 5);
            WaitFor("late.txt");
        }
        finally
        {
            using var kill = Process.Start("kill", ["-INT", process.Id.ToString(CultureInfo.InvariantCulture)]);
            kill.WaitForExit();
            if (!process.WaitForExit(Patience))
                process.Kill();
        }

        var outcome = Zladder.Finish(process);
        Zladder.Run("run", _folder.Spectra, "--out", _folder.Out("run"));
        Assert.Equal(0, outcome.Status);
        Assert.StartsWith("3 spectra: ", outcome.Output, StringComparison.Ordinal);
        Assert.Contains("1 measured now, 3 in the catalogue, 1 rejects; waiting for more\n", outcome.Errors, StringComparison.Ordinal);
        foreach (var table in new[] { "catalogue.csv", "lines.csv", "rejects.csv" })
            Assert.Equal(File.ReadAllBytes(Path.Combine(_folder.Out("run"), table)), File.ReadAllBytes(Path.Combine(_folder.Out("watched"), table)));
    }

    [Fact]
    public void An_interval_that_is_none_is_wrong_usage()
    {
        var outcome = Zladder.Run("watch", _folder.Spectra, "--out", _folder.Out(), "--every", "never");

        Assert.Equal(2, outcome.Status);
        Assert.StartsWith("zladder: --every: found 'never'; expected a number of seconds from 0.1 to 3600\n", outcome.Errors, StringComparison.Ordinal);
    }

    private void WaitFor(string source)
    {
        var watch = Stopwatch.StartNew();
        var catalogue = Path.Combine(_folder.Out("watched"), "catalogue.csv");
        while (!File.Exists(catalogue) || !File.ReadAllText(catalogue).Contains($"\n{source},0,", StringComparison.Ordinal))
        {
            Assert.True(watch.Elapsed < Patience, $"{source} never came into the catalogue");
            Thread.Sleep(50);
        }
    }
}
