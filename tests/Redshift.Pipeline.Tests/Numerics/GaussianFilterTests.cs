using Redshift.Physics.Statistics;
using Redshift.Pipeline.Numerics;
using Xunit;

namespace Redshift.Pipeline.Tests.Numerics;

public class GaussianFilterTests
{
    private const int Count = 2001;

    /// <summary>
    /// Below 12 the kernel is summed, cut at 4σ. Above, four running means of whole steps stand for it: their variance is rounded,
    /// and where nothing else smooths, their peak of 2/3 widths is 3.5 % below the 0.691 of a Gaussian.
    /// </summary>
    [Theory]
    [InlineData(5, 1.5, 3e-4)]
    [InlineData(5, 4, 3e-4)]
    [InlineData(12, 12, 3e-4)]
    [InlineData(12, 12.5, 0.015)]
    [InlineData(30, 30, 0.015)]
    [InlineData(10, 100, 0.04)]
    public void A_Gaussian_gains_the_variance_of_the_filter(double width, double sigma, double tolerance)
    {
        var total = Math.Sqrt(width * width + sigma * sigma);
        var filtered = GaussianFilter.Convolve(Gaussian(width), sigma);
        var expected = Gaussian(total);
        var peak = expected.Max();
        Assert.All(filtered.Zip(expected), pair => Assert.InRange(Math.Abs(pair.First - pair.Second), 0, tolerance * peak));
        Assert.Equal(1, filtered.Sum(x => (double)x), 1e-4);
    }

    [Theory]
    [InlineData(3)]
    [InlineData(40)]
    public void The_ends_are_continued(double sigma)
    {
        float[] step = [.. Enumerable.Range(0, 400).Select(i => i < 200 ? 3f : 7f)];
        var filtered = GaussianFilter.Convolve(step, sigma);
        Assert.Equal(3, filtered[0], 1e-4f);
        Assert.Equal(7, filtered[^1], 1e-4f);
        Assert.Equal(10, filtered[150] + filtered[249], 1e-3f);
    }

    [Fact]
    public void Much_less_than_a_step_is_a_copy()
    {
        var random = new RandomSource(2);
        float[] input = [.. Enumerable.Range(0, 50).Select(_ => (float)random.Normal())];
        Assert.Equal(input, GaussianFilter.Convolve(input, 0.29));
    }

    /// <summary>A normalised Gaussian in the middle of the grid.</summary>
    private static float[] Gaussian(double sigma) =>
        [.. Enumerable.Range(-Count / 2, Count).Select(i => (float)(Math.Exp(-0.5 * i * i / (sigma * sigma)) / (sigma * Math.Sqrt(2 * Math.PI))))];
}
