using Redshift.Physics.Units;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Settings;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Batch;

/// <summary>Which files a further run into the same folder reads. The files are no spectra, so that no models are needed.</summary>
public sealed class RepeatedRunTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private readonly LedgerFile _ledger;

    public RepeatedRunTests()
    {
        foreach (var name in new[] { "a.txt", "b.txt", "c.txt" })
            File.WriteAllText(At(name), "clouds over " + name);
        Directory.CreateDirectory(_folder.File("out"));
        _ledger = LedgerFile.Open(_folder.File("out"));
        Assert.Equal(["read a.txt", "read b.txt", "read c.txt"], Run());
    }

    public void Dispose()
    {
        _ledger.Dispose();
        _folder.Dispose();
    }

    [Fact]
    public void Nothing_is_read_where_nothing_changed() => Assert.Empty(Run());

    [Fact]
    public void A_file_with_another_time_is_compared_and_kept_where_its_content_is_the_same()
    {
        File.SetLastWriteTimeUtc(At("b.txt"), new DateTime(2030, 1, 1, 0, 0, 0, DateTimeKind.Utc));

        Assert.Equal(["kept b.txt"], Run());
        Assert.Empty(Run());
    }

    [Fact]
    public void A_changed_file_is_read_again()
    {
        File.WriteAllText(At("b.txt"), "more clouds");

        Assert.Equal(["read b.txt"], Run());
        Assert.Contains(_ledger.Rejects(), reject => reject[0] == "b.txt" && reject[3].Contains("more clouds", StringComparison.Ordinal));
    }

    [Fact]
    public void A_change_that_hides_behind_size_and_time_is_found_by_verifying()
    {
        var time = File.GetLastWriteTimeUtc(At("b.txt"));
        File.WriteAllText(At("b.txt"), "clouds over B.txt");
        File.SetLastWriteTimeUtc(At("b.txt"), time);

        Assert.Empty(Run());
        Assert.Equal(["kept a.txt", "read b.txt", "kept c.txt"], Run(verify: true));
    }

    [Fact]
    public void All_is_read_again_when_asked() => Assert.Equal(["read a.txt", "read b.txt", "read c.txt"], Run(again: true));

    [Fact]
    public void All_is_read_again_with_other_settings() => Assert.Equal(
        ["read a.txt", "read b.txt", "read c.txt"], Run(settings: new() { Load = new() { Medium = WavelengthMedium.Air } }));

    [Fact]
    public void A_moved_night_is_compared_and_kept()
    {
        Directory.Move(_folder.File("in"), _folder.File("moved"));
        Directory.Move(_folder.File("moved"), _folder.File("night2"));

        Assert.Equal(["kept a.txt", "kept b.txt", "kept c.txt"], Run(folder: "night2"));
    }

    [Fact]
    public void A_file_that_went_away_and_comes_back_needs_no_reading()
    {
        File.Move(At("b.txt"), _folder.File("b.txt"));
        Assert.Empty(Run());
        Assert.Equal(["a.txt", "c.txt"], _ledger.Rejects().Select(reject => reject[0]));
        File.Move(_folder.File("b.txt"), At("b.txt"));

        Assert.Empty(Run());
        Assert.Equal(["a.txt", "b.txt", "c.txt"], _ledger.Rejects().Select(reject => reject[0]));
    }

    [Fact]
    public void A_missing_path_is_looked_for_in_every_run()
    {
        var files = InputFiles.Find([At("a.txt"), At("d.txt")], null);

        Assert.Equal(["read d.txt"], Run(files: files));
        Assert.Equal(["read d.txt"], Run(files: files));
        File.WriteAllText(At("d.txt"), "clouds");
        Assert.Equal(["read d.txt"], Run(files: InputFiles.Find([At("a.txt"), At("d.txt")], null)));
        Assert.Empty(Run(files: InputFiles.Find([At("a.txt"), At("d.txt")], null)));
    }

    [Fact]
    public void A_file_that_was_not_finished_is_taken_up_again()
    {
        _ledger.Database.Execute("UPDATE file SET complete = 0 WHERE source = 'c.txt'");

        Assert.Equal(["kept c.txt"], Run());
        Assert.Empty(Run());
    }

    [Fact]
    public async Task An_interrupted_run_keeps_what_it_did_and_goes_on_from_there()
    {
        using var interrupt = new CancellationTokenSource();
        // More than the queue between reading and recording holds: reading cannot be over before the first record.
        for (var i = 0; i < 3000; i++)
            File.WriteAllText(At($"many{i}.txt"), $"clouds {i}");
        var plan = WorkPlan.Make(_ledger, Files("in"), new());
        var run = new RecordedRun(new(new(), 1), _ledger, _ => interrupt.Cancel());

        await Assert.ThrowsAnyAsync<OperationCanceledException>(() => run.RunAsync(plan.Files, interrupt.Token));

        var left = Run().Count;
        Assert.InRange(left, 1, 2999);
        Assert.Equal(3003, _ledger.Rejects().Count());
    }

    private string At(string name)
    {
        Directory.CreateDirectory(_folder.File("in"));
        return Path.Combine(_folder.File("in"), name);
    }

    private IReadOnlyList<InputFile> Files(string folder) => InputFiles.Find([_folder.File(folder)], null);

    // What was read, and whether what was known before was kept.
    private List<string> Run(
        bool again = false, bool verify = false, PipelineSettings? settings = null, string folder = "in", IReadOnlyList<InputFile>? files = null)
    {
        var read = new List<string>();
        var plan = WorkPlan.Make(_ledger, files ?? Files(folder), settings ?? new(), again, verify);
        var run = new RecordedRun(new(settings ?? new(), 1), _ledger, entry =>
        {
            if (entry is FileBegun begun)
                read.Add((begun.Keeps ? "kept " : "read ") + begun.Source);
        });
        run.RunAsync(plan.Files, CancellationToken.None).GetAwaiter().GetResult();
        return read;
    }
}
