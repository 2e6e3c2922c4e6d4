using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Tests.Report;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Ledger;

public sealed class LedgerFileTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Rows_come_back_cell_for_cell_in_the_order_of_the_catalogue()
    {
        using (var ledger = LedgerFile.Open(_folder.Path))
        {
            FilledLedger.Fill(
                ledger, ["AIRMASS"], new Reject("b.fits", 11, "HDU 1", "x", "y"), Answer("b.fits", 10), Answer("b.fits", 2), Answer("B.fits", 0),
                new Reject("a.fits", null, "file", "x", "y"));
        }

        using var read = LedgerFile.OpenExisting(_folder.Path);
        Assert.Equal(["B.fits 0", "b.fits 2", "b.fits 10"], read.Catalogue().Select(Key));
        Assert.Equal(["B.fits 0", "b.fits 2", "b.fits 10"], read.Lines().Select(Key));
        Assert.Equal(["a.fits ", "b.fits 11"], read.Rejects().Select(Key));
        Assert.Equal(["AIRMASS"], read.Keep);
        Assert.Equal(CatalogueColumns.With(["AIRMASS"]).Select(column => column.Value(Answer("b.fits", 2)).Text), read.Catalogue().ElementAt(1));
        Assert.Equal(LineColumns.All.Select(column => column.Value(new(Answer("b.fits", 2).Observation, Examples.HAlpha())).Text), read.Lines().ElementAt(1));
        Assert.Equal(new Dictionary<string, int> { ["firm"] = 3, ["rejected"] = 2 }, read.CountByState());
    }

    [Fact]
    public void Files_that_are_no_input_any_more_leave_the_tables_but_not_the_ledger()
    {
        using var ledger = LedgerFile.Open(_folder.Path);
        FilledLedger.Fill(ledger, [], Answer("a.fits", 0), Answer("b.fits", 0));
        FilledLedger.Fill(ledger, [], Answer("b.fits", 0));
        Assert.Equal(["b.fits 0"], ledger.Catalogue().Select(Key));

        using (var listing = new LedgerListing(ledger))
        {
            Assert.NotNull(listing.Add("a.fits", "/a.fits"));
            listing.Complete();
        }

        Assert.Equal(["a.fits 0"], ledger.Catalogue().Select(Key));
    }

    [Fact]
    public void A_list_that_is_not_completed_changes_nothing()
    {
        using var ledger = LedgerFile.Open(_folder.Path);
        FilledLedger.Fill(ledger, [], Answer("a.fits", 0));
        using (var listing = new LedgerListing(ledger))
            listing.Add("b.fits", "/b.fits");

        Assert.Equal(["a.fits 0"], ledger.Catalogue().Select(Key));
    }

    [Fact]
    public void A_file_that_changed_loses_its_outcomes_and_a_spoilt_one_becomes_a_reject()
    {
        using var ledger = LedgerFile.Open(_folder.Path);
        FilledLedger.Fill(ledger, [], Answer("a.fits", 0), Answer("a.fits", 1), Answer("b.fits", 0));
        FilledLedger.Write(
            ledger,
            new FileBegun("a.fits", new(1, 1), "hash", "fingerprint", Keeps: false),
            new SpectrumDone("a.fits", StoredOutcome.Of(Answer("a.fits", 0), CatalogueColumns.All), 1, 0),
            new FileEnded("a.fits", 0, null),
            new FileEnded("b.fits", 0, new Reject("b.fits", null, "file", "another time", "the same")));

        Assert.Equal(["a.fits 0"], ledger.Catalogue().Select(Key));
        Assert.Equal(["b.fits "], ledger.Rejects().Select(Key));
    }

    [Fact]
    public void Who_reads_finds_the_same_rows_again_while_a_run_goes_on()
    {
        using var ledger = LedgerFile.Open(_folder.Path);
        FilledLedger.Fill(ledger, [], Answer("a.fits", 0));
        using var read = LedgerFile.OpenExisting(_folder.Path);
        Assert.Equal(["a.fits 0"], read.Catalogue().Select(Key));

        FilledLedger.Fill(ledger, [], Answer("a.fits", 0), Answer("b.fits", 0));

        Assert.Equal(["a.fits 0"], read.Catalogue().Select(Key));
        Assert.Equal(["a.fits 0", "b.fits 0"], ledger.Catalogue().Select(Key));
    }

    private static ObservationResult Answer(string source, int row) => Examples.Full() with { Observation = Examples.Observation(source, row) };

    private static string Key(string[] cells) => cells[0] + " " + cells[1];
}
