using System.Globalization;
using System.IO.Compression;
using System.Text;
using Redshift.Physics.Units;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

public sealed class TextTests : IDisposable
{
    private readonly LoadBench _bench = new();

    public void Dispose() => _bench.Dispose();

    [Fact]
    public void Columns_without_names_are_wavelength_and_flux()
    {
        var observation = LoadBench.One(_bench.Text(Lines(" {0:F1}  {1:F6}  {1:F6}  0.000000")));
        Assert.Equal((WavelengthMedium.Air, true), (observation.Medium, observation.MediumAssumed));
        Assert.False(observation.Spectra[0].HasErrors);
        Assert.Equal(5001.394851, observation.Spectra[0].Wavelength[0], 1e-6);
        Assert.Equal(LoadBench.Flux(), observation.Spectra[0].Flux.Select(static value => Math.Round(value, 6)));
    }

    [Theory]
    [InlineData("#  wl flam flam_err\n", "{0} {1} 0.5")]
    [InlineData("wavelength,flux,error\n", "{0},{1},0.5")]
    [InlineData("Wavelength (Angstrom);Flux (erg/s/cm2/A);Sigma (erg/s/cm2/A)\n", "{0};{1};0.5")]
    [InlineData("% made by hand\n\nLAMBDA\tFLUX\tNOISE\nAngstrom\tadu\tadu\n", "{0}\t{1}\t0.5")]
    [InlineData("wave|flux|e_flux\n", "{0}|{1}|0.5D0")]
    public void Names_separators_and_comments_are_understood(string head, string line)
    {
        var spectrum = LoadBench.One(_bench.Text(head + Lines(line))).Spectra[0];
        Assert.Equal(LoadBench.Pixels, spectrum.Count);
        Assert.True(spectrum.HasErrors);
        Assert.Equal(4, spectrum.InverseVariance[0], 1e-12);
    }

    [Theory]
    [InlineData("wave(nm) flux\n", "{0} {1}", 10)]
    [InlineData("# Wavelength [micron]   Flux\n", "{0} {1}", 1e4)]
    [InlineData("# wavelength in nm\n", "{0} {1}", 10)]
    [InlineData("log_wave flux\n", "{0} {1}", 0)]
    public void Unit_in_the_lines_above_is_used(string head, string line, double angstroms)
    {
        var text = head + "# wavelengths are in vacuum\n" + string.Concat(Enumerable.Range(0, LoadBench.Pixels)
            .Select(i => string.Format(CultureInfo.InvariantCulture, line, angstroms == 0 ? Math.Log10(5000 + i) : (5000 + i) / angstroms, 10 + i % 7) + "\n"));
        Assert.Equal(5000, LoadBench.One(_bench.Text(text)).Spectra[0].Wavelength[0], 1e-6);
    }

    [Fact]
    public void Cells_left_empty_are_missing_values()
    {
        var lines = Enumerable.Range(0, LoadBench.Pixels).Select(static i => i switch
        {
            5 => $"{5000 + i},,0.5",
            6 => $"{5000 + i},1{i % 7}.0,",
            _ => $"{5000 + i},1{i % 7}.0,0.5",
        });
        var spectrum = LoadBench.One(_bench.Text("wave,flux,err\n" + string.Join('\n', lines))).Spectra[0];
        Assert.Equal([4, 0, 0, 4], spectrum.InverseVariance[4..8].Select(static value => Math.Round(value, 9)));
        Assert.Equal([14, 0, 16, 10], spectrum.Flux[4..8]);
    }

    [Theory]
    [InlineData("wave,flux\n")]
    [InlineData("wave,flux,\n")]
    [InlineData("")]
    public void Comma_behind_the_last_cell_adds_no_column(string head)
    {
        var spectrum = LoadBench.One(_bench.Text(head + Lines("{0},{1},"))).Spectra[0];
        Assert.Equal(LoadBench.Pixels, spectrum.Count);
        Assert.False(spectrum.HasErrors);
    }

    [Fact]
    public void Remarks_settle_medium_and_frame()
    {
        var observation = LoadBench.One(_bench.Text("# Wavelengths are in vacuum, corrected to the heliocentric frame\n" + Lines("{0} {1}")));
        Assert.Equal((WavelengthMedium.Vacuum, false, VelocityFrame.Heliocentric), (observation.Medium, observation.MediumAssumed, observation.Frame));
        Assert.Empty(observation.Cautions);
    }

    [Fact]
    public void Remarks_in_the_form_of_header_cards_are_read_as_these()
    {
        const string Remarks = "# OBJECT = HD 12345\n# RA: 12:30:00\n# DEC: -05:15:00\n# DATE-OBS = 2020-01-02T03:04:05\n# EXPTIME = 600 / s\n# INSTRUME = Prism 3\n# SPECSYS = BARYCENT\n# AIRORVAC = vac\n";
        var observation = LoadBench.One(_bench.Text(Remarks + Lines("{0} {1}")));
        Assert.Equal(("HD 12345", 187.5, -5.25, 600.0, "Prism 3"), (observation.Target, observation.RaDeg, observation.DecDeg, observation.ExposureS, observation.Instrument));
        Assert.Equal(new DateTime(2020, 1, 2, 3, 9, 5, DateTimeKind.Utc), observation.MidTimeUtc);
        Assert.Equal((WavelengthMedium.Vacuum, false, VelocityFrame.Barycentric), (observation.Medium, observation.MediumAssumed, observation.Frame));
    }

    [Theory]
    [InlineData("wave flux\n---- ----\n", "{0} {1}")]
    [InlineData("==== ====\nwave flux\n==== ====\n", "{0} {1}")]
    [InlineData("|wave|flux|\n|----|----|\n", "|{0}|{1}|")]
    public void Lines_drawn_between_names_and_numbers_are_passed_over(string head, string line) =>
        Assert.Equal(LoadBench.Flux(), LoadBench.One(_bench.Text(head + Lines(line))).Spectra[0].Flux);

    [Theory]
    [InlineData("# wavelength (Angstrom)  flux density (mJy)\n")]
    [InlineData("# - {name: wave, unit: Angstrom, datatype: float64}\n# - {name: flux, unit: mJy, datatype: float64}\nwave flux\n")]
    public void Unit_of_the_flux_in_the_lines_above_is_used(string head) =>
        Assert.Equal("erg/s/cm2/Angstrom", LoadBench.One(_bench.Text(head + Lines("{0} {1}"))).Spectra[0].FluxUnit);

    [Theory]
    [InlineData("nan")]
    [InlineData("inf")]
    [InlineData("*****")]
    [InlineData("INDEF")]
    public void Words_for_a_missing_number_mask_their_pixel(string word)
    {
        var spectrum = LoadBench.One(_bench.Text(string.Concat(Enumerable.Range(0, LoadBench.Pixels).Select(i => $"{5000 + i} {(i == 3 ? word : $"1{i % 7}")}\n")))).Spectra[0];
        Assert.Equal([1, 1, 1, 0, 1], spectrum.InverseVariance[..5]);
    }

    [Fact]
    public void Line_of_types_is_no_line_of_names_or_units()
    {
        var spectrum = LoadBench.One(_bench.Text("|wave|flux|error|\n|double|double|double|\n|nm|mJy|mJy|\n|null|null|null|\n" + Lines(" {0} {1} 0.5"))).Spectra[0];
        Assert.Equal(50000, spectrum.Wavelength[0], 20.0);
        Assert.Equal(("erg/s/cm2/Angstrom", true), (spectrum.FluxUnit, spectrum.HasErrors));
    }

    [Fact]
    public void Masked_pixels_of_a_named_column_are_left_out()
    {
        var spectrum = LoadBench.One(_bench.Text("# wl flux error bpmap\n" + string.Concat(Enumerable.Range(0, LoadBench.Pixels).Select(static i => $"{5000 + i} {10 + i % 7} 0.5 {(i == 3 ? 1 : 0)}\n")))).Spectra[0];
        Assert.Equal([4, 4, 4, 0, 4], spectrum.InverseVariance[..5]);
    }

    [Fact]
    public void Numbers_run_together_at_a_minus_sign_are_taken_apart()
    {
        var spectrum = LoadBench.One(_bench.Text(string.Concat(Enumerable.Range(0, LoadBench.Pixels).Select(static i => $"{5000 + i}.00-{i % 7}.50E-01\n")))).Spectra[0];
        Assert.Equal([-0.05, -0.15, -0.25], spectrum.Flux[..3]);
    }

    [Fact]
    public void Numbers_run_together_without_a_sign_are_refused_with_the_line()
    {
        var reject = LoadBench.Refused(_bench.Text(" 1150.0165.161285 63.328011165.161285  0.000000\n" + Lines("{0:F1} {1:F6} {1:F6} 0.000000")));
        Assert.Equal("line 1", reject.Place);
        Assert.Equal("'1150.0165.161285 63.328011165.161285  0.000000'", reject.Found);
    }

    [Fact]
    public void Decimal_comma_is_refused_clearly()
    {
        var reject = LoadBench.Refused(_bench.Text("5000,12 1,5\n5001,12 1,6\n"));
        Assert.Equal(("line 1", "numbers with a decimal point, not a comma"), (reject.Place, reject.Expected));
    }

    [Fact]
    public void Line_with_another_number_of_columns_is_refused() =>
        Assert.Equal("line 65", LoadBench.Refused(_bench.Text(Lines("{0} {1} 0.5") + "6000 1\n")).Place);

    [Fact]
    public void Compressed_text_is_read()
    {
        using var stream = new MemoryStream();
        using (var gzip = new GZipStream(stream, CompressionMode.Compress, leaveOpen: true)) gzip.Write(Encoding.ASCII.GetBytes(Lines("{0} {1}")));
        Assert.Equal(LoadBench.Pixels, LoadBench.One(_bench.Bytes("s.txt.gz", stream.ToArray())).Spectra[0].Count);
    }

    [Theory]
    [InlineData("version https://git-lfs.github.com/spec/v1\noid sha256:0b\nsize 77760\n", "a pointer of git")]
    [InlineData("only words\nand more of them\n", "a letter")]
    [InlineData("1\n2\n3\n", "one column")]
    [InlineData("3 1\n1 2\n2 1\n1 1\n3 2\n2 2\n", "no order")]
    public void Text_that_is_no_spectrum_is_refused(string text, string what) =>
        Assert.False(string.IsNullOrEmpty(LoadBench.Refused(_bench.Text(text, "spectrum.fits")).Expected), what);

    private static string Lines(string format)
    {
        var flux = LoadBench.Flux();
        return string.Concat(flux.Select((value, i) => string.Format(CultureInfo.InvariantCulture, format, 5000.0 + 5 * i, value) + "\n"));
    }
}
