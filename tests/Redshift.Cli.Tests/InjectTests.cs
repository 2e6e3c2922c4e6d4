using System.Text.Json;
using Redshift.Testing;
using Xunit;

namespace Redshift.Cli.Tests;

public sealed class InjectTests : IDisposable
{
    private static readonly string Spectrum = Path.Combine(Repository.Root, "sample-spectra", "text", "visitor-2031c.csv");

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

    [Fact]
    public void A_table_that_cannot_be_written_ends_with_status_3_before_the_work() =>
        Assert.Equal(3, Zladder.Run("inject", Spectrum, "--count", "100000", "--csv", _folder.File("no/such/folder.csv")).Status);
}
