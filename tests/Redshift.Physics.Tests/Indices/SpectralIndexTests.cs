using CsCheck;
using Redshift.Physics.Indices;
using Redshift.Physics.Profiles;
using Xunit;

namespace Redshift.Physics.Tests.Indices;

public sealed class SpectralIndexTests
{
    private static readonly double[] Wavelengths = [.. Enumerable.Range(0, 40001).Select(i => 3700 + 0.1 * i)];

    private static SpectralIndex Index(string name) => Assert.Single(SpectralIndices.All, index => index.Name == name);

    // The equivalent width of a Gaussian line is its depth times its full width times sqrt(pi / (4 ln 2)) = 1.0644670.
    [Theory]
    [InlineData("Hbeta", 4861.3, 0.4, 3)]
    [InlineData("NaD", 5892.9, 0.7, 4)]
    [InlineData("Ca4227", 4228, -0.5, 1.5)]
    public void Equivalent_width_of_a_gaussian_is_analytic(string name, double centre, double depth, double fwhm)
    {
        double[] flux = Spectrum(w => 3e-16 * (1 - depth * Math.Exp(-0.5 * Math.Pow((w - centre) / LineWidth.SigmaFromFwhm(fwhm), 2))));
        Assert.Equal(1.0644670 * depth * fwhm, Index(name).Measure(Wavelengths, flux)!.Value, 1e-5);
    }

    [Fact]
    public void Magnitude_of_a_band_at_half_light_is_analytic()
    {
        SpectralIndex index = Index("Mg2");
        double[] flux = Spectrum(w => w >= index.Band.Start && w <= index.Band.End ? 0.5 : 1);
        Assert.Equal(2.5 * Math.Log10(2), index.Measure(Wavelengths, flux)!.Value, 1e-3);
    }

    // A pixel cut by a limit keeps the flux of its middle: 0.05 A of the slope at most.
    [Fact]
    public void Sloping_continuum_has_no_lines()
        => Assert.All(SpectralIndices.Lines, index =>
            Assert.Equal(0, index.Measure(Wavelengths, Spectrum(w => 1 + 2e-4 * (w - 3700)))!.Value, 2e-6));

    // F_nu is constant where F_lambda goes as the inverse square of the wavelength.
    [Fact]
    public void Flat_spectrum_per_frequency_has_no_break()
    {
        double[] flux = Spectrum(w => 1e7 / (w * w));
        Assert.Equal(1, SpectralIndices.Dn4000.Measure(Wavelengths, flux)!.Value, 1e-7);
        Assert.Equal(1, SpectralIndices.D4000.Measure(Wavelengths, flux)!.Value, 1e-7);
    }

    [Fact]
    public void Step_at_4000_angstrom_is_the_break()
    {
        double[] flux = Spectrum(w => (w < 3990 ? 1 : 1.7) * 1e7 / (w * w));
        Assert.Equal(1.7, SpectralIndices.Dn4000.Measure(Wavelengths, flux)!.Value, 1e-6);
    }

    // Constant flux per wavelength: the ratio of the mean squared wavelengths, 4050^2 + 100^2/12 over 3900^2 + 100^2/12.
    [Fact]
    public void Break_of_constant_flux_per_wavelength_is_analytic()
        => Assert.Equal(
            (4050.0 * 4050 + 1e4 / 12) / (3900.0 * 3900 + 1e4 / 12),
            SpectralIndices.Dn4000.Measure(Wavelengths, Spectrum(_ => 1))!.Value,
            1e-9);

    [Fact]
    public void Flux_ratio_compares_the_means()
    {
        double[] flux = Spectrum(w => w is > 7100 and < 7200 ? 0.6 : 1);
        Assert.Equal(0.6, SpectralIndices.TiO5.Measure(Wavelengths, flux)!.Value, 1e-12);
    }

    [Fact]
    public void Indices_do_not_depend_on_the_flux_scale()
        => Gen.Double[1e-18, 1e4].Sample(scale =>
        {
            double one = Index("Mgb").Measure(Wavelengths, Spectrum(Wavy))!.Value;
            double scaled = Index("Mgb").Measure(Wavelengths, Spectrum(w => scale * Wavy(w)))!.Value;
            Assert.Equal(one, scaled, 1e-10);
        }, iter: 20);

    // Coarse pixels cut by the band limits count by the part inside.
    [Fact]
    public void Pixels_at_the_limits_count_in_part()
    {
        double[] coarse = [.. Enumerable.Range(0, 300).Select(i => 4700 + 1.7 * i)];
        double[] flux = [.. coarse.Select(w => 1 + 2e-4 * (w - 4700))];
        Assert.Equal(0, Index("Hbeta").Measure(coarse, flux)!.Value, 2e-3);
    }

    [Fact]
    public void Spectrum_that_ends_early_gives_nothing()
    {
        double[] wavelengths = [.. Enumerable.Range(0, 100).Select(i => 4790 + 1.0 * i)];
        Assert.Null(Index("Hbeta").Measure(wavelengths, new double[100]));
        Assert.Null(Index("Hbeta").Measure([], []));
    }

    [Fact]
    public void Unequal_lengths_are_refused()
        => Assert.Throws<ArgumentException>(() => SpectralIndices.Dn4000.Measure(new double[5], new double[4]));

    [Fact]
    public void Definitions_are_complete_and_ordered()
        => Assert.All(SpectralIndices.All, index =>
        {
            Assert.False(string.IsNullOrWhiteSpace(index.Source));
            Assert.True(index.Band.Width > 0);
            Assert.All(index.SideBands, side => Assert.True(side.Width > 0));
            if (index.Kind is IndexKind.EquivalentWidth or IndexKind.Magnitude)
                Assert.True(index.SideBands[0].Centre < index.Band.Start && index.SideBands[1].Centre > index.Band.End);
        });

    private static double Wavy(double wavelength) => 2 + Math.Sin(wavelength / 7);

    private static double[] Spectrum(Func<double, double> flux) => [.. Wavelengths.Select(flux)];
}
