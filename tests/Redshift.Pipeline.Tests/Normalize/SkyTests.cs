using Redshift.Physics.Air;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Normalize;
using Xunit;

namespace Redshift.Pipeline.Tests.Normalize;

public class SkyTests
{
    private const int Pixels = 4000;

    /// <summary>NIST has the green line of oxygen at 5577.339 Å in air.</summary>
    [Theory]
    [InlineData(5000, 6000)]
    [InlineData(5570, 5590)]
    public void The_green_line_loses_its_weight_and_nothing_else_does(double from, double to)
    {
        var axis = SyntheticSpectrum.LnWavelengths(from, to, 40);
        var weight = axis.Select(_ => 1f).ToArray();
        const float Sigma = 5e-4f;
        GreenLine.Mask(axis, [.. axis.Select(_ => Sigma)], weight);
        var line = Math.Log(AirRefraction.ToVacuum(5577.339));
        Assert.Contains(0, weight);
        for (var i = 0; i < axis.Length; i++) Assert.Equal(Math.Abs(axis[i] - line) < 2.5 * Sigma + 1e-4 ? 0 : 1, weight[i]);
    }

    [Fact]
    public void Spectra_without_the_green_line_are_left_alone()
    {
        foreach (var axis in new[] { SyntheticSpectrum.LnWavelengths(4000, 5500), SyntheticSpectrum.LnWavelengths(5700, 9000) })
        {
            var weight = axis.Select(_ => 1f).ToArray();
            GreenLine.Mask(axis, [.. axis.Select(_ => 5e-4f)], weight);
            Assert.DoesNotContain(0, weight);
        }
    }

    [Theory]
    [InlineData(1, 1)]
    [InlineData(2, 4)]
    [InlineData(4, 16)]
    public void Errors_in_the_lines_of_the_sky_grow_to_what_its_remains_scatter(double tooSmall, double expected)
    {
        var random = new RandomSource(7);
        var (flux, continuum, weight) = (new float[Pixels], new float[Pixels], new float[Pixels]);
        for (var i = 0; i < Pixels; i++)
        {
            var sky = i % 20 < 4;
            weight[i] = sky ? 1f / 9 : 1;
            flux[i] = (float)(random.Normal() * (sky ? 3 * tooSmall : 1));
        }

        SkyRemains.Allow(flux, continuum, weight);
        Assert.Equal(1, weight[10]);
        Assert.InRange(1f / 9 / weight[0], 0.85 * expected, 1.2 * expected);
    }
}
