using System.Diagnostics;
using System.Globalization;
using System.Text.Json;
using Redshift.Testing;
using Xunit;

namespace Redshift.Cli.Tests;

public sealed class InjectTests : IDisposable
{
    private static readonly string Spectrum = Path.Combine(Repository.Root, "sample-spectra", "text", "visitor-2031c.csv");

    /// <summary>A fibre on blank sky: who expects galaxies alone gets one, and a confidence that is far too great if the map is.</summary>
    private static readonly string Doubtful = Path.Combine(Repository.Root, "sample-spectra", "fibre", "plate-101-044.fits");

    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Objects_are_put_into_a_spectrum_and_recovered()
    {
        var text = Zladder.Run("inject", Spectrum, "--count", "12", "--csv", _folder.File("one.csv"), "--jobs", "1", "--plot", _folder.File("new/recovery.png"));
        var json = Zladder.Run("inject", Spectrum, "--count", "12", "--csv", _folder.File("two.csv"), "--jobs", "2", "--json");

        Assert.Equal((0, "", 0, ""), (text.Status, text.Errors, json.Status, json.Errors));
        Assert.StartsWith("12 computed objects put into 1 spectrum, seed 1\n", text.Output, StringComparison.Ordinal);
        Assert.Contains("Not tested:", text.Output, StringComparison.Ordinal);
        Assert.Equal(File.ReadAllText(_folder.File("one.csv")), File.ReadAllText(_folder.File("two.csv")));
        Assert.Equal(13, File.ReadAllLines(_folder.File("one.csv")).Length);
        Assert.Equal("PNG"u8.ToArray(), File.ReadAllBytes(_folder.File("new/recovery.png"))[1..4]);
        using var document = JsonDocument.Parse(json.Output);
        var rungs = document.RootElement.GetProperty("by_snr").EnumerateArray().ToArray();
        Assert.Equal(["S/N 0.7", "S/N 1.5", "S/N 3", "S/N 6", "S/N 12", "S/N 25", "all"], rungs.Select(r => r.GetProperty("group").GetString()));
        Assert.Equal(12, document.RootElement.GetProperty("injections").GetArrayLength());
        Assert.Equal((1, 12), (rungs[5].GetProperty("good").GetDouble(), rungs[6].GetProperty("n").GetInt32()));
    }

    [Fact]
    public void Confidences_are_fitted_to_what_is_recovered_and_a_run_uses_them()
    {
        // Someone has stated confidences that are far too great.
        File.WriteAllText(_folder.File("bold.toml"), "[calibration.galaxy]\noffset = 4.0\n");
        var fit = Zladder.Run("inject", Spectrum, "--count", "500", "--expect", "galaxy", "--pipeline", _folder.File("bold.toml"), "--calibration", _folder.File("fit.toml"));

        Assert.Equal(0, fit.Status);
        Assert.Matches(@"\n  galaxy +\d+ +\d+ +0\.\d+ +0\.\d+ +0\.\d+  refitted\n", fit.Output);
        var text = File.ReadAllText(_folder.File("fit.toml"));
        Assert.StartsWith("# Part of a pipeline file", text, StringComparison.Ordinal);
        Assert.Contains("\n[calibration.galaxy]\noffset = ", text, StringComparison.Ordinal);
        double bold = Confidence("bold.toml"), fitted = Confidence("fit.toml");
        Assert.InRange(fitted, 0.5, bold - 0.001);
    }

    [Fact]
    public void A_sample_that_supports_nothing_is_refused_before_or_after_the_work()
    {
        var before = Zladder.Run("inject", Spectrum, "--calibration", _folder.File("no.toml"));
        Assert.Equal((2, "zladder: --calibration with 200 objects: expected --count 500 or more\n"), (before.Status, before.Errors));

        // Bright nebulae are all found.
        var after = Zladder.Run("inject", Spectrum, "--count", "500", "--expect", "nebula", "--calibration", _folder.File("no.toml"));
        Assert.Equal(4, after.Status);
        Assert.EndsWith("zladder: no calibration written: too few answers, or too few right or wrong ones; try more objects (--count)\n", after.Errors, StringComparison.Ordinal);
        Assert.Empty(Directory.GetFiles(_folder.Path));
    }

    [Fact]
    public void An_interrupt_ends_it_with_status_130()
    {
        File.WriteAllText(_folder.File("notes.txt"), "clouds all night\n");
        using var process = Zladder.Start("inject", _folder.Path, Spectrum, "--count", "100000");
        Assert.StartsWith("rejected: ", process.StandardError.ReadLine(), StringComparison.Ordinal);
        using (var kill = Process.Start("kill", ["-INT", process.Id.ToString(CultureInfo.InvariantCulture)]))
            kill.WaitForExit();
        var outcome = Zladder.Finish(process);

        Assert.Equal((130, ""), (outcome.Status, outcome.Output));
        Assert.True(outcome.Errors is "" or "zladder: interrupted\n", outcome.Errors);
    }

    [Fact]
    public void Without_a_usable_spectrum_it_ends_with_status_4_and_says_why()
    {
        File.WriteAllText(_folder.File("notes.txt"), "clouds all night\n");
        var outcome = Zladder.Run("inject", _folder.Path);

        Assert.Equal((4, ""), (outcome.Status, outcome.Output));
        Assert.StartsWith("rejected: notes.txt: ", outcome.Errors, StringComparison.Ordinal);
        Assert.EndsWith("zladder: no spectrum can be used, so there is nothing to put objects into\n", outcome.Errors, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--count 0", "--count: found '0'; expected a whole number, 1 or more")]
    [InlineData("--count 100001", "--count 100001: expected 100000 at most")]
    [InlineData("--seed -1", "--seed: found '-1'; expected a whole number, 0 or more")]
    [InlineData("--cuont 3", "there is no option --cuont")]
    public void Wrong_usage_is_said_in_one_line_with_status_2(string arguments, string message)
    {
        var outcome = Zladder.Run(["inject", Spectrum, .. arguments.Split(' ')]);

        Assert.Equal((2, ""), (outcome.Status, outcome.Output));
        Assert.Equal("zladder: " + message, outcome.Errors.Split('\n')[0]);
    }

    private double Confidence(string pipeline)
    {
        var run = Zladder.Run("run", Doubtful, "--expect", "galaxy", "--pipeline", _folder.File(pipeline), "--out", _folder.File("out-" + pipeline));
        Assert.Equal((0, ""), (run.Status, run.Errors));
        var rows = File.ReadAllLines(Path.Combine(_folder.File("out-" + pipeline), "catalogue.csv"));
        var column = Array.IndexOf(rows[0].Split(','), "confidence");
        return double.Parse(rows[1].Split(',')[column], CultureInfo.InvariantCulture);
    }

    [Fact]
    public void A_table_that_cannot_be_written_ends_with_status_3_before_the_work() =>
        Assert.Equal(3, Zladder.Run("inject", Spectrum, "--count", "100000", "--csv", _folder.File("no/such/folder.csv")).Status);
}
