using Redshift.Fits;
using Redshift.Pipeline.Report.Formats;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Report.Formats;

public sealed class FitsFormatTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Table_holds_the_values_of_the_csv_and_says_what_they_are()
    {
        using var file = FitsFile.Open(Write(Tables.Catalogue()));
        var table = Assert.IsType<TableHdu>(file.Hdus[1]);

        Assert.Null(file.Damage);
        Assert.Equal("CATALOGUE", table.Name);
        Assert.Equal(3, table.RowCount);
        var velocity = table.Find("velocity_km_s")!;
        Assert.Equal(("km/s", "spect.dopplerVeloc.opt", "c times z"), (velocity.Unit, velocity.Ucd, velocity.Comment));
        Assert.Equal([29979.246, double.NaN, -0.003], velocity.ReadColumn());
        Assert.Equal([5, 0, 5], table.Find("lines_expected")!.ReadColumn());
        Assert.Equal(["M 42, core", "", "'=1+1, \\u00e9\\u0007"], Enumerable.Range(0, 3).Select(row => table.Find("target")!.ReadString(row)));
        Assert.Equal("5 > 4", table.Find("Z_2")!.ReadString(2));
        Assert.NotNull(table.Find("ESO_TEL_AIRM_START"));
    }

    [Fact]
    public void No_date_is_written()
    {
        using var file = FitsFile.Open(Write(Tables.Catalogue()));

        Assert.All(file.Hdus, hdu => Assert.DoesNotContain(hdu.Header, card => card.Keyword.StartsWith("DATE", StringComparison.Ordinal)));
    }

    [ToolFact("fitsverify")]
    public void Fitsverify_finds_no_fault()
    {
        foreach (var path in new[] { Write(Tables.Catalogue()), Write(Tables.Lines()), Write(Tables.Catalogue([])) })
        {
            var (exitCode, output) = ExternalTool.Run("fitsverify", path);
            Assert.True(exitCode == 0 && output.Contains("0 warning(s) and 0 error(s)", StringComparison.Ordinal), output);
        }
    }

    [AstropyFact]
    public void Astropy_reads_the_values_of_the_csv()
    {
        const string script = """
            import csv, math, sys
            from astropy.io import fits
            rows = list(csv.DictReader(open(sys.argv[1])))
            with fits.open(sys.argv[2], checksum=True) as file:
                file.verify('exception')
                table = file[1]
                assert len(rows) == len(table.data) == 2
                for i, row in enumerate(rows):
                    for name, text in row.items():
                        value = table.data[name][i]
                        same = value == text if isinstance(value, str) else math.isnan(value) if text == '' else value == float(text)
                        if not same: print(name, repr(text), repr(value))
                print(table.columns['observed_vacuum_a'].unit, table.header['TUCD5'], table.header['TCOMM5'])
            """;
        var csv = _folder.File("lines.csv");
        TableFormats.Write(Tables.Lines(), "csv", csv);

        Assert.Equal("Angstrom em.wl;spect.line Rest wavelength in vacuum\n", ExternalTool.RunPython(script, csv, Write(Tables.Lines())));
    }

    private string Write<TRow>(Table<TRow> table)
    {
        var path = _folder.File(table.Name + ".fits");
        TableFormats.Write(table, "fits", path);
        return path;
    }
}
