using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Tests.Ledger;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class CatalogueFilesTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("report").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public void Catalogue_has_the_agreed_columns_in_the_agreed_order()
    {
        Write();
        // The order is a promise to every script that reads a catalogue.
        Assert.Equal(
            "source,row,target,ra_deg,dec_deg,mid_time_utc,mid_time_bjd_tdb,exposure_s,instrument,z,z_err,frame,z_file,velocity_km_s,"
            + "velocity_err_km_s,velocity_correction_km_s,medium,confidence,verdict,ln_odds,kind,kind_confidence,spectral_type,"
            + "spectral_type_err,snr_pixel,snr_angstrom,noise_scale,resolution,resolution_from,lines_expected,lines_matched,"
            + "zero_point_km_s,zero_point_err_km_s,next_z,next_kind,next_confidence,cautions,AIRMASS",
            Lines("catalogue.csv")[0]);
    }

    [Fact]
    public void Catalogue_holds_the_values_with_fixed_decimals()
    {
        Write();
        // c z = 299792.458 * 0.1; next_z = (1 + 0.5)(1 + 1e-4) - 1, the correction being c * 1e-4.
        Assert.Equal(
            "night1/a.fits,0,\"M 42, core\",83.822083,-5.391111,2026-01-02T03:04:05.000,,600.000,'=spec,0.1000000,0.0001235,barycentric,"
            + "0.0999000,29979.246,37.011,29.979,air-assumed,0.9988,firm,12.346,galaxy,0.9999,G2,1.3,10.13,12.00,1.1000,2000.0,keyword,"
            + "5,4,-3.200,1.500,0.5001500,quasar,0.0012,check-medium;rival-redshift,1.25",
            Lines("catalogue.csv")[1]);
    }

    [Fact]
    public void Catalogue_leaves_empty_what_is_unknown()
    {
        Write();
        Assert.Equal(
            "night1/b.fits,0,,,,,,,,,,unknown,,,,,vacuum,0.0000,nothing,0.000,unknown,0.0000,,,0.00,0.00,1.0000,,estimate,0,0,,,,,,,",
            Lines("catalogue.csv")[2]);
    }

    [Fact]
    public void Line_table_holds_every_line()
    {
        Write();
        Assert.Equal(
            [
                "source,row,line,family,rest_vacuum_a,rest_air_a,observed_vacuum_a,observed_err_a,offset_km_s,offset_err_km_s,flux,"
                + "flux_err,flux_unit,equivalent_width_rest_a,equivalent_width_err_a,fwhm_observed_km_s,fwhm_intrinsic_km_s,"
                + "ln_likelihood_gain,state,note",
                "night1/a.fits,0,H alpha,hydrogen,6564.6140,6562.8010,7220.4190,0.1230,-4.500,5.100,1.50000E-15,1.00000E-17,"
                + "erg/s/cm2/A,-25.2500,0.5000,250.000,200.000,512.250,matched,",
                "",
            ],
            Lines("lines.csv"));
    }

    [Fact]
    public void Rejects_are_listed()
    {
        Write();
        Assert.Equal(
            ["source,row,place,found,expected", "night1/c.fits,3,HDU 1,\"text \"\"x\"\"\",a number", ""],
            Lines("rejects.csv"));
    }

    [Fact]
    public void Every_column_of_every_table_is_explained()
    {
        Write();
        var guide = Lines("columns.csv");
        Assert.Equal("table,name,unit,ucd,description", guide[0]);
        foreach (var table in new[] { "catalogue.csv", "lines.csv", "rejects.csv" })
        {
            foreach (var column in Lines(table)[0].Split(','))
            {
                var row = Assert.Single(guide, line => line.StartsWith($"{table},{column},", StringComparison.Ordinal));
                Assert.False(row.EndsWith(','), $"{table} {column} has no description");
            }
        }
    }

    [Fact]
    public void Files_are_ascii_with_line_feeds()
    {
        Write();
        foreach (var file in Directory.GetFiles(_folder, "*.csv"))
            Assert.DoesNotContain(File.ReadAllBytes(file), letter => letter is not (byte)'\n' and (< 0x20 or > 0x7e));
    }

    [Fact]
    public void Nothing_appears_before_a_table_is_complete()
    {
        Write();
        var before = Lines("lines.csv");
        using var ledger = LedgerFile.Open(_folder);
        FilledLedger.Fill(ledger, [], Examples.Full(), Examples.Nothing() with { Lines = [Examples.HAlpha()] });

        Assert.Throws<OperationCanceledException>(() => CatalogueFiles.Write(ledger, _folder, new CancellationToken(canceled: true)));
        Assert.Equal(before, Lines("lines.csv"));
        Assert.Empty(Directory.GetFiles(_folder, "*.unfinished"));
    }

    [Fact]
    public void A_second_run_into_the_same_folder_is_refused()
    {
        using var first = new OutputFolder(_folder);

        Assert.Throws<FolderInUseException>(() => new OutputFolder(_folder));
    }

    private void Write()
    {
        using var ledger = LedgerFile.Open(_folder);
        FilledLedger.Fill(ledger, ["AIRMASS"], Examples.Nothing(), Examples.Full(), new Reject("night1/c.fits", 3, "HDU 1", "text \"x\"", "a number"));
        CatalogueFiles.Write(ledger, _folder);
    }

    private string[] Lines(string name) => File.ReadAllText(Path.Combine(_folder, name)).Split('\n');
}
