using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Normalize;

public class SmoothFitTests
{
    private const double Sigma = 0.1;

    private static readonly double[] Ln = LnWavelengths(3700, 9200);

    private static double Smooth(double x) => 2 * Math.Exp(-1.5 * (x - Math.Log(5000))) * (1 + 0.05 * Math.Sin(12 * x));

    [Fact]
    public void A_planted_continuum_is_found_between_lines()
    {
        var continuum = Continuum(Noisy(Ln, x => Smooth(x) * (1 + 6 * Line(x, 6564.6, 300) + 3 * Line(x, 5008.2, 300) - 0.7 * Line(x, 3934.8, 900)), Sigma, 1));
        var off = Ln.Select((x, i) => (continuum[i] - Smooth(x)) / Smooth(x)).ToArray();
        // Noise of 5 % a pixel and some 170 pixels a knot leave 0.5 %; the rest is what the lines' wings leave.
        Assert.InRange(Math.Sqrt(off.Average(d => d * d)), 0, 0.01);
        Assert.All(off, d => Assert.InRange(d, -0.05, 0.05));
    }

    /// <summary>A line twice as high as the continuum. Of the broadest the knots, 12,000 km/s apart, take more than half.</summary>
    [Theory]
    [InlineData(300, 0.03)]
    [InlineData(2000, 0.12)]
    [InlineData(8000, 0.62)]
    public void The_continuum_takes_no_more_than_a_share_of_a_line(double fwhmKmS, double greatestShare)
    {
        double LineAt(double x) => Line(x, 5800, fwhmKmS);
        var continuum = Continuum(Noisy(Ln, x => Smooth(x) * (1 + LineAt(x)), Sigma, 2));
        var eaten = Ln.Select((x, i) => continuum[i] / Smooth(x) - 1).Where((_, i) => LineAt(Ln[i]) > 0.01).Sum() / Ln.Sum(LineAt);
        Assert.InRange(eaten, -0.05, greatestShare);
    }

    [Fact]
    public void A_flux_in_other_units_has_the_same_continuum()
    {
        var flux = Noisy(Ln, Smooth, Sigma, 3);
        var continuum = Continuum(flux);
        var scaled = Continuum(Array.ConvertAll(flux, f => 1e-3 * f), 1e-3 * Sigma);
        Assert.All(continuum.Zip(scaled), pair => Assert.Equal(pair.First, 1e3 * pair.Second, 1e-3 * pair.First));
    }

    [Fact]
    public void The_prior_leaves_straight_lines_alone_and_prices_bends()
    {
        const int Count = 9;
        var matrix = new double[Count * (BandedCholesky.Band + 1)];
        SmoothFit.AddPrior(matrix, 0, Count);
        Assert.Equal(0, Form(matrix, [.. Enumerable.Range(0, Count).Select(i => 1 + 0.5 * i)]), 0.02);
        // One bend: second differences 1, −2, 1, each over its prior σ.
        Assert.Equal(6 / (SmoothFit.Flexibility * SmoothFit.Flexibility), Form(matrix, [0, 0, 0, 0, 1, 0, 0, 0, 0]), 0.01);
    }

    [Fact]
    public void A_short_spline_may_follow_the_blaze_of_a_grating()
    {
        const int Count = 6;
        var matrix = new double[Count * (BandedCholesky.Band + 1)];
        SmoothFit.AddPrior(matrix, 0, Count);
        Assert.Equal(0, Form(matrix, [.. Enumerable.Range(0, Count).Select(i => 1 + 0.5 * i - 0.1 * i * i)]), 0.02);
        Assert.InRange(Form(matrix, [0, 0, 1, 0, 0, 0]), 1000, 10000);
    }

    private static double Form(double[] bands, double[] x)
    {
        double sum = 0;
        for (var i = 0; i < x.Length; i++)
            for (var d = 0; d <= Math.Min(i, BandedCholesky.Band); d++) sum += (d == 0 ? 1 : 2) * bands[i * (BandedCholesky.Band + 1) + d] * x[i] * x[i - d];
        return sum;
    }

    private static float[] Continuum(double[] flux, double sigma = Sigma)
    {
        var values = Array.ConvertAll(flux, f => (float)f);
        float[] weight = [.. Ln.Select(_ => (float)(1 / (sigma * sigma)))];
        return SmoothFit.Continuum(Ln, values, weight, Baseline.Estimate(Ln, values, weight), 0.08);
    }
}
