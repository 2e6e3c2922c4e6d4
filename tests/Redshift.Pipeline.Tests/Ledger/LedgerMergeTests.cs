using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Tests.Report;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Ledger;

public sealed class LedgerMergeTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public LedgerMergeTests()
    {
        Directory.CreateDirectory(_folder.File("out"));
        Directory.CreateDirectory(_folder.File("one"));
    }

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Parts_are_joined_by_source_and_row_whatever_their_order()
    {
        string[] parts =
        [
            Part("one", "1/3", Answer("b.fits", 1), Answer("stack.fits", 1000)),
            Part("two", "2/3", Answer("a.fits", 0), Answer("stack.fits", 0), new Reject("c.fits", null, "file", "x", "y")),
            Part("three", "3/3"),
        ];

        KnowAlso("three", "stack.fits");
        Assert.Empty(Merge(parts));
        var rows = Rows();
        Assert.Equal(["a.fits 0", "b.fits 1", "stack.fits 0", "stack.fits 1000", "c.fits "], rows);
        Assert.Empty(Merge([.. parts.Reverse()]));
        Assert.Equal(rows, Rows());
    }

    [Fact]
    public void A_part_that_was_done_twice_is_told_and_counts_once()
    {
        var one = Part("one", "1/1", Answer("a.fits", 0));
        var twin = Part("twin", "1/1", Answer("a.fits", 0));

        Assert.Equal([(new Shard(1, 1), 2)], Merge(one, twin));
        Assert.Equal(["a.fits 0"], Rows());
    }

    [Fact]
    public void What_a_killed_run_left_in_the_folder_does_not_touch_the_joined_ledger()
    {
        using (var running = LedgerFile.Open(_folder.File("one")))
        {
            FilledLedger.Fill(running, [], Answer("z.fits", 0));
            // As a killed run leaves it: the last commits are still in the log beside the ledger.
            foreach (var file in Directory.GetFiles(_folder.File("one")))
                File.Copy(file, Path.Combine(_folder.File("out"), Path.GetFileName(file)));
        }

        Directory.Delete(_folder.File("one"), recursive: true);
        Merge(Part("one", "1/2", Answer("a.fits", 0)), Part("two", "2/2", Answer("b.fits", 0)));
        Assert.Equal(["a.fits 0", "b.fits 0"], Rows());
        Assert.Equal(["ledger.db"], Directory.GetFiles(_folder.File("out")).Select(Path.GetFileName));
    }

    [Fact]
    public void Twins_that_do_not_agree_are_refused_and_the_older_ledger_stays()
    {
        var one = Part("one", "1/1", Answer("a.fits", 0));
        Merge(one);
        var twin = Part("twin", "1/1", Answer("a.fits", 0) with { Z = 0.2 });

        Assert.Equal(
            $"{Ledger(twin)}: found another answer for a.fits row 0 than in the parts before; expected equal answers of parts that were done twice; "
            + "merge them without one of the two",
            Refusal(one, twin));
        Assert.Equal(["a.fits 0"], Rows());
        Assert.Equal(["ledger.db"], Directory.GetFiles(_folder.File("out")).Select(Path.GetFileName));
    }

    [Fact]
    public void A_file_that_changed_between_the_parts_is_refused()
    {
        var one = Part("one", "1/2", Answer("stack.fits", 0));
        var two = Part("two", "2/2", Answer("stack.fits", 1000));
        using (var ledger = LedgerFile.Open(two))
            ledger.Database.Execute("UPDATE file SET hash = 'other'");

        Assert.Equal(
            $"{Ledger(two)}: found another content of stack.fits than in the parts before; expected files that stay as they are; run the parts that read it again",
            Refusal(one, two));
    }

    [Fact]
    public void Missing_parts_are_named()
    {
        var two = Part("two", "2/4", Answer("a.fits", 0));

        Assert.Equal($"{Ledger(two)}: found no ledger beside it for part 1/4, 3/4, 4/4; expected all parts; run these, then merge", Refusal(two));
    }

    [Fact]
    public void A_part_that_is_not_finished_is_refused()
    {
        var one = FilledLedger.Part(_folder.File("one"), "1/1", setup => setup with { Finished = false });

        Assert.Equal($"{Ledger(one)}: found a run that is not finished; expected a finished one; give its command again, then merge", Refusal(one));
    }

    [Fact]
    public void Parts_of_different_runs_are_refused()
    {
        var one = Part("one", "1/2");
        string Other(string name, Func<LedgerSetup, LedgerSetup> change) => FilledLedger.Part(_folder.File(name), "2/2", change);

        Assert.Contains("found another list of inputs than in ", Refusal(one, Other("a", setup => setup with { Inputs = "other" })), StringComparison.Ordinal);
        Assert.Contains(
            "found other settings or another engine than in ", Refusal(one, Other("b", setup => setup with { Fingerprint = "other" })), StringComparison.Ordinal);
        Assert.Contains("found part 2/3 beside part 1/2 in ", Refusal(one, Other("c", setup => setup with { Shard = new(2, 3) })), StringComparison.Ordinal);
    }

    private static ObservationResult Answer(string source, int row) => Examples.Full() with { Observation = Examples.Observation(source, row) };

    // A part knows large files that it has no spectra of by name only.
    private void KnowAlso(string name, string source)
    {
        using var ledger = LedgerFile.Open(_folder.File(name));
        using var listing = new LedgerListing(ledger);
        listing.Add(source, "/" + source);
        listing.Complete();
    }

    private static string Ledger(string folder) => Path.Combine(folder, LedgerFile.Name);

    private string Part(string name, string shard, params object[] outcomes) => FilledLedger.Part(_folder.File(name), shard, null, outcomes);

    private IReadOnlyList<(Shard Part, int Times)> Merge(params string[] folders) => LedgerMerge.Write(folders, _folder.File("out"));

    private string Refusal(params string[] folders) => Assert.Throws<LedgerException>(() => Merge(folders)).Message;

    private List<string> Rows()
    {
        using var ledger = LedgerFile.OpenExisting(_folder.File("out"));
        return [.. ledger.Catalogue().Concat(ledger.Rejects()).Select(cells => cells[0] + " " + cells[1])];
    }
}
