using Redshift.Physics.Stars;
using Redshift.Pipeline.Inject;
using Redshift.Pipeline.Observations;
using Xunit;

namespace Redshift.Pipeline.Tests.Inject;

public sealed class ExposureTests
{
    private const double Z = 0.25;
    private const double RestA = 5000;
    private const double FwhmKmS = 300;
    private const double SigmaKmS = 100;
    private const double C = 299792.458;

    private static readonly double[] Wavelengths = [.. Enumerable.Range(0, 500).Select(i => 6000 + 1.0 * i)];

    [Fact]
    public void A_line_keeps_its_flux_and_place_and_gets_the_width_of_the_instrument()
    {
        var light = new RestLight(LogWavelengthGrid.Covering(4700, 5300, 10));
        light.AddLine(RestA, 7, SigmaKmS);
        var spectrum = new Spectrum
        {
            Wavelength = Wavelengths,
            Flux = new double[Wavelengths.Length],
            InverseVariance = new double[Wavelengths.Length],
            HasErrors = true,
            FwhmKmS = [.. Wavelengths.Select(_ => (float)FwhmKmS)],
        };
        var flux = Exposure.Take(spectrum, light, Z);

        var total = flux.Sum();
        var mean = flux.Select((f, i) => f * Wavelengths[i]).Sum() / total;
        var variance = flux.Select((f, i) => f * Math.Pow(Wavelengths[i] - mean, 2)).Sum() / total;
        // Pixels of 1 Å, and the variance of a pixel is 1/12.
        var expected = (SigmaKmS * SigmaKmS + Math.Pow(FwhmKmS / 2.354820045, 2)) * Math.Pow(RestA * (1 + Z) / C, 2) + 1 / 12.0;
        Assert.Equal(7 * (1 + Z), total, 0.02);
        Assert.Equal(RestA * (1 + Z), mean, 0.05);
        Assert.Equal(1, variance / expected, 0.02);
    }

    [Fact]
    public void An_absorption_line_has_its_equivalent_width_and_stays_above_black()
    {
        var light = new RestLight(LogWavelengthGrid.Covering(4700, 5300, 10));
        light.AddPowerLaw(0);
        light.Absorb(RestA, 0.1, 200);
        var step = light.Grid.LnStep;
        Assert.Equal(0.1, light.Flux.Select((f, i) => (1 - f) * light.Grid.Wavelength(i) * step).Sum(), 0.005);

        light.Absorb(RestA, 100, 200);
        Assert.All(light.Flux, flux => Assert.InRange(flux, 0, 1));
    }
}
