using Redshift.Physics.Statistics;
using Redshift.Pipeline.Normalize;
using Xunit;

namespace Redshift.Pipeline.Tests.Normalize;

public class NoiseCheckTests
{
    private const int Pixels = 4096;

    [Fact]
    public void White_noise_has_the_stated_scale_and_no_correlation()
    {
        var states = Enumerable.Range(1, 20).Select(seed => NoiseCheck.Measure(White((ulong)seed, 1))).ToList();
        // Second differences and a median leave some 10 % in a window of 128 pixels; of 32 windows the lower quartile is taken.
        Assert.InRange(states.Average(s => s.Scale), 0.95, 1.05);
        Assert.All(states, s => Assert.InRange(s.Scale, 0.92, 1.08));
        Assert.All(states, s => Assert.InRange(s.Correlation, 1, 1.25));
        Assert.InRange(states.Average(s => s.Correlation), 1, 1.08);
    }

    [Theory]
    [InlineData(0.1)]
    [InlineData(1.7)]
    [InlineData(25)]
    public void The_scale_follows_the_noise(double sigma) =>
        Assert.Equal(sigma * NoiseCheck.Measure(White(3, 1)).Scale, NoiseCheck.Measure(White(3, sigma)).Scale, 1e-9 * sigma);

    /// <summary>
    /// Filters of white noise with the variance and the sum of correlations that they leave: half a pixel of linear interpolation,
    /// and the binomial filter, for which the assumed ρ₂ = ρ₁/4 is exact; the measure stops at 2.5. Correlated windows scatter more,
    /// so that their lower quartile lies a tenth below the noise.
    /// </summary>
    [Theory]
    [InlineData(new[] { 0.5, 0.5 }, 2.0, 0.15)]
    [InlineData(new[] { 0.25, 0.5, 0.25 }, 2.667, 0.15)]
    [InlineData(new[] { 0.2, 0.8 }, 1.471, 0.15)]
    public void Resampled_noise_is_recognised(double[] filter, double correlation, double tolerance)
    {
        var noise = Filtered(White(5, 1), filter);
        var state = NoiseCheck.Measure(noise);
        Assert.Equal(Math.Sqrt(filter.Sum(f => f * f)), state.Scale, 0.12 * state.Scale);
        Assert.Equal(correlation, state.Correlation, tolerance * correlation);
    }

    [Fact]
    public void Autoregressive_noise_is_recognised()
    {
        const double Memory = 0.3;
        var noise = White(7, 1);
        for (var i = 1; i < noise.Length; i++) noise[i] += Memory * noise[i - 1];
        var state = NoiseCheck.Measure(noise);
        Assert.Equal(1 / Math.Sqrt(1 - Memory * Memory), state.Scale, 0.08);
        // (1 + φ)/(1 − φ) = 1.857 for all lags together; two of them are seen.
        Assert.Equal((1 + Memory) / (1 - Memory), state.Correlation, 0.35);
    }

    [Fact]
    public void A_slope_changes_nothing_and_a_smooth_wave_next_to_nothing()
    {
        var plain = NoiseCheck.Measure(White(9, 1));
        var sloped = NoiseCheck.Measure([.. White(9, 1).Select((x, i) => x + 0.05 * i - 40)]);
        var waved = NoiseCheck.Measure([.. White(9, 1).Select((x, i) => x + 50 * Math.Sin(i / 300.0))]);
        Assert.Equal(plain.Scale, sloped.Scale, 1e-10);
        Assert.Equal(plain.Correlation, sloped.Correlation, 1e-10);
        Assert.Equal(plain.Scale, waved.Scale, 0.01);
    }

    [Fact]
    public void Lines_in_half_of_the_spectrum_do_not_count_as_noise()
    {
        var random = new RandomSource(13);
        var lined = White(11, 1).Select((x, i) => x + (i < Pixels / 2 ? 8 * random.Normal() : 0)).ToArray();
        Assert.Equal(NoiseCheck.Measure(White(11, 1)).Scale, NoiseCheck.Measure(lined).Scale, 0.08);
    }

    [Fact]
    public void Too_few_pixels_say_nothing() => Assert.Equal(new NoiseState(1, 1), NoiseCheck.Measure(White(1, 4).AsSpan(0, 11)));

    [Fact]
    public void A_short_spectrum_is_measured_as_a_whole() => Assert.Equal(4, NoiseCheck.Measure(White(1, 4).AsSpan(0, 100)).Scale, 1.2);

    private static double[] White(ulong seed, double sigma)
    {
        var random = new RandomSource(seed);
        return [.. Enumerable.Range(0, Pixels).Select(_ => sigma * random.Normal())];
    }

    private static double[] Filtered(double[] noise, double[] filter) =>
        [.. Enumerable.Range(0, noise.Length - filter.Length + 1).Select(i => filter.Select((f, j) => f * noise[i + j]).Sum())];
}
