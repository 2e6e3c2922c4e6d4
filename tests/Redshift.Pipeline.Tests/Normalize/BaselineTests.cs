using Redshift.Pipeline.Normalize;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Normalize;

public class BaselineTests
{
    private static readonly double[] Ln = LnWavelengths(3700, 9200);

    [Fact]
    public void A_power_law_is_followed_whatever_lines_stand_on_it()
    {
        double PowerLaw(double x) => 2 * Math.Exp(-1.5 * (x - Math.Log(5000)));
        var flux = Noisy(Ln, x => PowerLaw(x) * (1 + 20 * Line(x, 6564.6, 300) - 0.8 * Line(x, 3934.8, 600)), 0.05, 1);
        var baseline = Estimate(flux, 0.05);
        // Blocks of 0.05 in ln λ, joined and smoothed twice, straighten the curve; the outermost are held level.
        for (var i = 250; i < Ln.Length - 250; i++) Assert.Equal(PowerLaw(Ln[i]), baseline[i], 0.03 * PowerLaw(Ln[i]));
    }

    [Fact]
    public void Where_there_is_no_light_the_noise_is_the_level()
    {
        var baseline = Estimate(Noisy(Ln, _ => 0, 0.5, 2), 0.5);
        Assert.All(baseline, level => Assert.InRange(level, 0.15f, 0.2f));
    }

    [Fact]
    public void A_gap_is_bridged()
    {
        var flux = Noisy(Ln, _ => 3, 0.1, 3);
        var weight = Weights(0.1);
        weight.AsSpan(1200, 700).Clear();
        flux.AsSpan(1200, 700).Fill(1000);
        var baseline = Baseline.Estimate(Ln, Array.ConvertAll(flux, f => (float)f), weight);
        Assert.All(baseline, level => Assert.Equal(3, level, 0.03f));
    }

    private static float[] Estimate(double[] flux, double sigma) => Baseline.Estimate(Ln, Array.ConvertAll(flux, f => (float)f), Weights(sigma));

    private static float[] Weights(double sigma) => [.. Ln.Select(_ => (float)(1 / (sigma * sigma)))];
}
