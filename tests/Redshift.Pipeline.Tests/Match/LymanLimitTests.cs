using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Tests.Normalize;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class LymanLimitTests
{
    private const double Z = 3.6;

    private static readonly double LnShift = Math.Log(1 + Z);

    private static FitModel Quasar { get; } = ModelLibrary.Instance.Quasars[0];

    /// <summary>The cross-section for ionisation falls as λ³ (Osterbrock &amp; Ferland 2006, §2.1): an eighth at half the wavelength.</summary>
    [Fact]
    public void Clouds_grow_clear_as_the_cube_of_the_wavelength()
    {
        var limit = new LymanLimit(Math.Log(4000), 8);
        Assert.Equal(1, limit.Transmission(Math.Log(4001)));
        Assert.Equal(Math.Exp(-8), limit.Transmission(Math.Log(4000) - 1e-12), 1e-6);
        Assert.Equal(Math.Exp(-1), limit.Transmission(Math.Log(2000)), 1e-9);
        Assert.Equal(1, LymanLimit.None.Transmission(Math.Log(500)));
    }

    [Theory]
    [InlineData(3700)]
    [InlineData(3850)]
    [InlineData(4100)]
    public void The_end_of_the_light_is_found(double edge)
    {
        var pixels = Pixels(edge);
        Assert.Contains(pixels.Forest.Limits(LnShift), l => Math.Abs(l.LnEdge - Math.Log(edge)) < 0.003);
    }

    /// <summary>Wherever the light ends, a quasar at its redshift explains the spectrum about as well as one whose light ends at its own limit.</summary>
    [Fact]
    public void Light_below_the_limit_does_not_count_against_a_quasar()
    {
        double Evidence(double edge) => new ModelFit(Pixels(edge)).LnEvidence(Quasar, LnShift);
        var own = Evidence(911.75 * (1 + Z));
        Assert.InRange(Evidence(3850), 0.7 * own, 2 * own);
        Assert.InRange(Evidence(3000), 0.7 * own, 2 * own);
    }

    private static FitPixels Pixels(double edge)
    {
        double Flux(double x)
        {
            var wavelength = Math.Exp(x);
            double Line(double rest, double height) => height * Math.Exp(-0.5 * Math.Pow((wavelength / rest / (1 + Z) - 1) / 0.008, 2));
            var forest = Forest.Transmission(x, LnShift) / LymanLimit.Own(LnShift).Transmission(x);
            return wavelength < edge ? 0 : forest * (1 + Line(1215.67, 3) + Line(1549, 1) + Line(1908, 0.7));
        }

        return FitPixels.Build([Spectra.Run(SyntheticSpectrum.LnWavelengths(3600, 9800), Flux, 0.1, 3)], ModelError.Uniform, Cells.Step);
    }
}
