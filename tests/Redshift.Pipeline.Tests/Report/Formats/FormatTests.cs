using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Formats;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Tests.Ledger;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Report.Formats;

public sealed class FormatTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public static TheoryData<string> Names => [.. TableFormats.Names];

    public void Dispose() => _folder.Dispose();

    [Theory]
    [MemberData(nameof(Names))]
    public void The_same_table_gives_the_same_bytes(string format)
    {
        Assert.Equal(Written(Tables.Catalogue(), format), Written(Tables.Catalogue(), format));
        Assert.NotEqual(Written(Tables.Catalogue([Examples.Full()]), format), Written(Tables.Catalogue([Examples.Nothing()]), format));
    }

    [Fact]
    public void Csv_is_what_a_run_writes()
    {
        using (var ledger = LedgerFile.Open(_folder.Path))
        {
            FilledLedger.Fill(ledger, ["AIRMASS"], Examples.Full(), Examples.Nothing());
            CatalogueFiles.Write(ledger, _folder.Path);
        }

        var table = new Table<ObservationResult>("catalogue", "", CatalogueColumns.With(["AIRMASS"]), [Examples.Full(), Examples.Nothing()]);
        Assert.Equal(File.ReadAllBytes(_folder.File("catalogue.csv")), Written(table, "csv"));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void A_table_that_breaks_off_leaves_the_older_file_alone(string format)
    {
        var path = _folder.File("catalogue");
        File.WriteAllText(path, "earlier");

        Assert.Throws<InvalidOperationException>(() => TableFormats.Write(Tables.Catalogue(BreakOff()), format, path));

        Assert.Equal("earlier", File.ReadAllText(path));
        Assert.Equal([path], Directory.GetFiles(_folder.Path));
    }

    [Fact]
    public void A_fits_table_that_loses_rows_between_two_passes_is_not_written()
    {
        var passes = 0;
        IEnumerable<ObservationResult> Rows()
        {
            passes++;
            yield return Examples.Full();
            if (passes == 1)
                yield return Examples.Nothing();
        }

        var problem = Assert.Throws<IOException>(() => Written(Tables.Catalogue(Rows()), "fits"));
        Assert.Equal("the table lost rows while it was written", problem.Message);
    }

    private static IEnumerable<ObservationResult> BreakOff()
    {
        yield return Examples.Full();
        throw new InvalidOperationException("broken off");
    }

    private byte[] Written<TRow>(Table<TRow> table, string format)
    {
        var path = _folder.File("table");
        TableFormats.Write(table, format, path);
        return File.ReadAllBytes(path);
    }
}
