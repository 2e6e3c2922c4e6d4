using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

public sealed class UnitTests : IDisposable
{
    private readonly LoadBench _bench = new();

    public void Dispose() => _bench.Dispose();

    [Theory]
    [InlineData("Angstrom", 1)]
    [InlineData("Angstroms", 1)]
    [InlineData("ANGSTROMS", 1)]
    [InlineData("angstrom", 1)]
    [InlineData("Angstroem", 1)]
    [InlineData("Ang", 1)]
    [InlineData("Angs.", 1)]
    [InlineData("A", 1)]
    [InlineData("AA", 1)]
    [InlineData("0.1 nm", 1)]
    [InlineData("0.1nm", 1)]
    [InlineData("10**-10 m", 1)]
    [InlineData("1e-10 m", 1)]
    [InlineData("nm", 10)]
    [InlineData("1 nm", 10)]
    [InlineData("[nm]", 10)]
    [InlineData("nanometers", 10)]
    [InlineData("um", 1e4)]
    [InlineData("micron", 1e4)]
    [InlineData("MICRONS", 1e4)]
    [InlineData("micrometer", 1e4)]
    [InlineData("m", 1e10)]
    [InlineData("meter", 1e10)]
    public void Length_in_any_spelling_is_read(string unit, double angstroms)
    {
        var wavelengths = Read("LAMBDA", LoadBench.Linear(5000 / angstroms, 1 / angstroms), unit).Wavelength;
        Assert.Equal(5000, wavelengths[0], 1e-6);
        Assert.Equal(5063, wavelengths[^1], 1e-6);
    }

    // 5000 Å in other quantities, with the exact constants of the SI of 2019.
    [Theory]
    [InlineData("FREQUENCY", "Hz", 2.99792458e18 / 5000)]
    [InlineData("FREQUENCY", "THz", 2.99792458e6 / 5000)]
    [InlineData("WAVENUMBER", "cm-1", 20000)]
    [InlineData("WAVENUMBER", "cm^-1", 20000)]
    [InlineData("WAVENUMBER", "cm**(-1)", 20000)]
    [InlineData("WAVENUMBER", "1/cm", 20000)]
    [InlineData("ENERGY", "eV", 12398.419843320026 / 5000)]
    [InlineData("ENERGY", "keV", 12.398419843320026 / 5000)]
    public void Other_quantities_are_turned_into_wavelengths_and_sorted(string name, string unit, double value)
    {
        var spectrum = Read(name, LoadBench.Linear(value, value * 1e-4), unit);
        Assert.Equal(5000, spectrum.Wavelength[^1], 1e-6);
        Assert.True(spectrum.Wavelength[0] < spectrum.Wavelength[1]);
        Assert.Equal(LoadBench.Flux()[0], spectrum.Flux[^1]);
    }

    [Theory]
    [InlineData("LOGLAM", "")]
    [InlineData("loglam", "Angstrom")]
    [InlineData("WAVE", "log10(Angstrom)")]
    [InlineData("WAVE", "log(Angstroms)")]
    [InlineData("WAVE", "dex(Angstrom)")]
    [InlineData("WAVE", "Angstrom")]
    [InlineData("WAVE", "")]
    public void Decimal_logarithm_is_told_by_name_unit_or_size(string name, string unit) =>
        Assert.Equal(Math.Pow(10, 3.6), Read(name, LoadBench.Linear(3.6, 1e-4), unit).Wavelength[0], 1e-8);

    [Fact]
    public void Natural_logarithm_is_told_by_its_unit() =>
        Assert.Equal(5000, Read("WAVE", LoadBench.Linear(Math.Log(5000), 1e-4), "ln(Angstrom)").Wavelength[0], 1e-8);

    [Theory]
    [InlineData(1150, 1, 1)] // far ultraviolet
    [InlineData(5000, 1, 1)]
    [InlineData(843, 13, 1)] // ultraviolet, already divided by 1 + z
    [InlineData(778, 21, 1)] // the same, to 2100
    [InlineData(370, 10, 10)]
    [InlineData(300, 34, 10)] // from the atmosphere's end to the K band
    [InlineData(800, 26, 10)] // infrared, with the red end of the optical
    [InlineData(846, 0.4, 10)] // the calcium triplet
    [InlineData(994, 23, 10)] // near infrared
    [InlineData(0.99, 0.02, 1e4)]
    [InlineData(5e-7, 1e-10, 1e10)]
    public void Missing_unit_is_judged_by_the_size_of_the_values(double first, double step, double angstroms) =>
        Assert.Equal(first * angstroms, Read("WAVE", LoadBench.Linear(first, step), "").Wavelength[0], 1e-6 * first * angstroms);

    [Fact]
    public void Judged_unit_other_than_angstrom_is_cautioned()
    {
        Assert.Contains("check-wavelength-unit", Observe("WAVE", LoadBench.Linear(500, 1), "").Cautions);
        Assert.DoesNotContain("check-wavelength-unit", Observe("WAVE", LoadBench.Linear(5000, 1), "").Cautions);
        Assert.DoesNotContain("check-wavelength-unit", Observe("WAVE", LoadBench.Linear(500, 1), "nm").Cautions);
    }

    // f(λ) = f(ν) c/λ²: 1 Jy = 1e-23 erg/s/cm²/Hz is 1.19916983e-12 erg/s/cm²/Å at 5000 Å.
    [Theory]
    [InlineData("Jy", 1.199169832e-12)]
    [InlineData("mJy", 1.199169832e-15)]
    [InlineData("nJy", 1.199169832e-21)]
    [InlineData("erg/s/cm2/Hz", 1.199169832e11)]
    [InlineData("W m-2 Hz-1", 1.199169832e14)]
    [InlineData("1e-26 erg/s/cm2/Hz", 1.199169832e-15)]
    [InlineData("10**-17 erg/(s cm2 Hz)", 1.199169832e-6)]
    public void Flux_per_frequency_becomes_flux_per_wavelength_with_its_error(string unit, double factor)
    {
        var spectrum = _bench.One(writer => writer.WriteTable("", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("WAVELENGTH_VAC", LoadBench.Linear(5000, 10)) with { Unit = "Angstrom" },
            ColumnDefinition.Doubles("FLUX", LoadBench.Flux()) with { Unit = unit },
            ColumnDefinition.Doubles("FLUX_ERROR", LoadBench.Constant(0.5)) with { Unit = unit },
        ])).Spectra[0];
        Assert.Equal("erg/s/cm2/Angstrom", spectrum.FluxUnit);
        Assert.Equal(1, spectrum.Flux[0] / (10 * factor), 1e-8);
        Assert.Equal(20, spectrum.Flux[0] * Math.Sqrt(spectrum.InverseVariance[0]), 1e-8);
        // 63 pixels further at 5630 Å the same number of janskys is less.
        Assert.Equal(Math.Pow(5000.0 / 5630, 2), spectrum.Flux[63] / spectrum.Flux[0], 1e-9);
    }

    [Theory]
    [InlineData("1E-17 erg/cm^2/s/Ang")]
    [InlineData("erg s-1 cm-2 Angstrom-1")]
    [InlineData("FLAM")]
    [InlineData("adu")]
    [InlineData("")]
    public void Other_flux_units_stay_as_they_are_written(string unit)
    {
        var spectrum = _bench.One(writer => writer.WriteTable("", LoadBench.Pixels,
            [ColumnDefinition.Doubles("WAVELENGTH", LoadBench.Linear(5000, 10)), ColumnDefinition.Doubles("FLUX", LoadBench.Flux()) with { Unit = unit }])).Spectra[0];
        Assert.Equal(unit, spectrum.FluxUnit);
        Assert.Equal(LoadBench.Flux(), spectrum.Flux);
    }

    [Theory]
    [InlineData("mag")]
    [InlineData("mag/arcsec2")]
    [InlineData("ABmag")]
    [InlineData("mag(ST)")]
    [InlineData("log(erg/s/cm2/Angstrom)")]
    [InlineData("dex")]
    public void Magnitudes_and_logarithms_are_refused(string unit)
    {
        var reject = LoadBench.Refused(_bench.Fits(writer => writer.WriteTable("", LoadBench.Pixels,
            [ColumnDefinition.Doubles("WAVELENGTH", LoadBench.Linear(5000, 10)), ColumnDefinition.Doubles("FLUX", LoadBench.Flux()) with { Unit = unit }])));
        Assert.Equal(("HDU 1 column FLUX", $"values in {unit}"), (reject.Place, reject.Found));
    }

    [Fact]
    public void Normalised_flux_keeps_no_unit_that_its_column_still_carries()
    {
        var spectrum = _bench.One(writer => writer.WriteTable("", LoadBench.Pixels,
            [ColumnDefinition.Doubles("WAVE", LoadBench.Linear(5000, 10)), ColumnDefinition.Doubles("FLUX_NORM", LoadBench.Flux()) with { Unit = "1.E-26 jy" }])).Spectra[0];
        Assert.Equal(LoadBench.Flux(), spectrum.Flux);
        Assert.Equal("", spectrum.FluxUnit);
    }

    private Spectrum Read(string name, double[] wavelengths, string unit) => Assert.Single(Observe(name, wavelengths, unit).Spectra);

    private Observation Observe(string name, double[] wavelengths, string unit) =>
        _bench.One(writer => writer.WriteTable("", LoadBench.Pixels,
        [ColumnDefinition.Doubles(name, wavelengths) with { Unit = unit }, ColumnDefinition.Doubles("FLUX", LoadBench.Flux())], [Card.Of("VACUUM", true)]));
}
