using Redshift.Pipeline.Normalize;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Normalize;

public class OutlierFilterTests
{
    private const double Sigma = 0.05;

    private static readonly double[] Ln = LnWavelengths(6000, 7000);

    private readonly float[] _weight = [.. Ln.Select(_ => (float)(1 / (Sigma * Sigma)))];
    private readonly float[] _baseline = [.. Ln.Select(_ => 1f)];

    [Fact]
    public void Pure_noise_keeps_its_weight()
    {
        OutlierFilter.Apply(Flux(_ => 1), _weight, _baseline);
        Assert.DoesNotContain(0, _weight);
    }

    /// <summary>From what two pixels resolve to broad, from faint to a thousand times the noise.</summary>
    [Theory]
    [InlineData(160, 3)]
    [InlineData(200, 50)]
    [InlineData(600, 50)]
    public void Resolved_emission_lines_keep_their_weight(double fwhmKmS, double peak)
    {
        OutlierFilter.Apply(Flux(x => 1 + peak * Line(x, 6500, fwhmKmS)), _weight, _baseline);
        Assert.DoesNotContain(0, _weight);
    }

    [Theory]
    [InlineData(5)]
    [InlineData(500)]
    [InlineData(-500)]
    public void A_spike_of_one_pixel_loses_its_weight_and_its_neighbours_keep_theirs(float height)
    {
        var flux = Flux(_ => 1);
        flux[200] += height;
        OutlierFilter.Apply(flux, _weight, _baseline);
        Assert.Equal(0, _weight[200]);
        Assert.Equal(1, _weight.Count(w => w == 0));
    }

    [Fact]
    public void Light_far_below_zero_loses_its_weight_however_wide()
    {
        var flux = Flux(_ => 1);
        flux.AsSpan(100, 20).Fill(-3);
        OutlierFilter.Apply(flux, _weight, _baseline);
        Assert.All(_weight[100..120], w => Assert.Equal(0, w));
    }

    [Fact]
    public void An_error_far_too_small_is_not_believed()
    {
        _weight[150] *= 1e6f;
        OutlierFilter.Apply(Flux(_ => 1), _weight, _baseline);
        Assert.Equal(_weight[149] / 0.09f, _weight[150], 1e-3f * _weight[150]);
    }

    private static float[] Flux(Func<double, double> formula) => Array.ConvertAll(Noisy(Ln, formula, Sigma, 4), f => (float)f);
}
