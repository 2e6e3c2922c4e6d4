using System.Diagnostics;
using System.Globalization;
using System.Text.Json;
using Redshift.Pipeline.Ledger;
using Xunit;

namespace Redshift.Cli.Tests;

/// <summary>Runs that go on where an earlier one stopped.</summary>
public sealed class ResumeTests : IDisposable
{
    private static readonly string[] Tables = ["catalogue.csv", "lines.csv", "rejects.csv", "columns.csv"];

    private readonly SpectraFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_run_that_is_killed_again_and_again_ends_with_the_bytes_of_an_undisturbed_one()
    {
        for (var i = 0; i < 20; i++)
            _folder.WriteText($"many/{i}.txt", seed: i + 3);
        _folder.WriteFits("f.fits");
        Zladder.Run("run", _folder.Spectra, "--out", _folder.Out("whole"));
        // The moments are chosen by what is done, so that some of them fall into the work whatever the machine.
        foreach (var enough in new[] { 1, 4, 15 })
            EndAfter(enough, "-KILL");
        var last = Zladder.Run("run", _folder.Spectra, "--out", _folder.Out("killed"), "--json");

        Assert.Equal(0, last.Status);
        Assert.InRange(Measured(last), 0, 23 - 14);
        Assert.All(Tables, table => Assert.Equal(Bytes("whole", table), Bytes("killed", table)));
    }

    [Fact]
    public void An_interrupt_finishes_what_is_in_flight_and_says_how_to_go_on()
    {
        for (var i = 0; i < 300; i++)
            _folder.WriteText($"many/{i}.txt", seed: i + 3);
        var outcome = EndAfter(3, "-INT");

        Assert.Equal(130, outcome.Status);
        Assert.Matches(@"(^|\n)\d+ spectra are measured and recorded; the same command goes on from there\nzladder: interrupted\n$", outcome.Errors);
        Assert.InRange(Outcomes(), 3, 302);
        Assert.Equal(["ledger.db"], Directory.GetFiles(_folder.Out("killed")).Select(Path.GetFileName));
    }

    [Fact]
    public void A_second_run_measures_only_what_is_new_and_pictures_that_are_missing()
    {
        Zladder.Run("run", _folder.At("sub"), _folder.At("notes.md"), "--out", _folder.Out());
        var same = Zladder.Run("run", _folder.At("sub"), _folder.At("notes.md"), "--out", _folder.Out());
        var more = Zladder.Run("run", _folder.Spectra, "--out", _folder.Out(), "--json");
        var drawn = Zladder.Run("run", _folder.Spectra, "--out", _folder.Out(), "--plots", "--json");
        var enough = Zladder.Run("run", _folder.Spectra, "--out", _folder.Out(), "--plots", "--json");

        Assert.Contains("1 spectrum: ", same.Output, StringComparison.Ordinal);
        Assert.Contains("(0 measured now, ", same.Output, StringComparison.Ordinal);
        Assert.Equal((1, 2, 0), (Measured(more), Measured(drawn), Measured(enough)));
        Assert.True(File.Exists(Path.Combine(_folder.Out(), "plots", "sub", "b.txt.0.png")));
    }

    [Fact]
    public void A_damaged_ledger_is_status_3_and_leaves_the_tables_alone()
    {
        Directory.CreateDirectory(_folder.Out());
        File.WriteAllText(Path.Combine(_folder.Out(), "ledger.db"), new string('x', 9000));
        File.WriteAllText(Path.Combine(_folder.Out(), "catalogue.csv"), "earlier");
        var outcome = Zladder.Run("run", _folder.Spectra, "--out", _folder.Out());

        Assert.Equal(3, outcome.Status);
        Assert.Equal(
            $"zladder: could not go on: {Path.Combine(_folder.Out(), "ledger.db")}: found a file that is no database; expected a ledger; "
            + "move it away to start anew, or bring back a copy; the tables beside it are untouched\n",
            outcome.Errors);
        Assert.Equal("earlier", File.ReadAllText(Path.Combine(_folder.Out(), "catalogue.csv")));
    }

    // Lets a run work until the ledger holds that many outcomes.
    private Zladder.Outcome EndAfter(int enough, string signal)
    {
        using var process = Zladder.Start("run", _folder.Spectra, "--out", _folder.Out("killed"));
        while (!process.HasExited && Outcomes() < enough)
            Thread.Sleep(20);
        using (var kill = Process.Start("kill", [signal, process.Id.ToString(CultureInfo.InvariantCulture)]))
            kill.WaitForExit();
        return Zladder.Finish(process);
    }

    private int Outcomes()
    {
        try
        {
            using var ledger = LedgerFile.OpenExisting(_folder.Out("killed"));
            return ledger.CountByState().Values.Sum();
        }
        catch (LedgerException)
        {
            return 0;
        }
    }

    private byte[] Bytes(string folder, string table) => File.ReadAllBytes(Path.Combine(_folder.Out(folder), table));

    private static int Measured(Zladder.Outcome outcome)
    {
        using var json = JsonDocument.Parse(outcome.Output);
        return json.RootElement.GetProperty("measured").GetInt32();
    }
}
