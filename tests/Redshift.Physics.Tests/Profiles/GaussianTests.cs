using CsCheck;
using MathNet.Numerics;
using Redshift.Physics.Profiles;
using Xunit;

namespace Redshift.Physics.Tests.Profiles;

public sealed class GaussianTests
{
    // Shares of the normal distribution inside 1, 2 and 3 standard deviations.
    [Theory]
    [InlineData(1, 0.682689492137086)]
    [InlineData(2, 0.954499736103642)]
    [InlineData(3, 0.997300203936740)]
    public void Area_is_that_of_the_normal_distribution(double sigmas, double area)
        => Assert.Equal(area, Gaussian.Area(-2 * sigmas, 2 * sigmas, 2), 1e-14);

    // Upper tail of the normal distribution between 10 and 11 standard deviations: 7.61985e-24 - 1.91066e-28.
    [Fact]
    public void Far_tail_keeps_its_relative_precision()
        => Assert.Equal(1, Gaussian.Area(10, 11, 1) / 7.61966e-24, 1e-5);

    // The area is half the difference of two error functions, here those of a general library.
    [Fact]
    public void Area_agrees_with_the_error_function()
        => Gen.Select(Gen.Double[-9, 9], Gen.Double[0, 3]).Sample((left, width) =>
        {
            double expected = 0.5 * (SpecialFunctions.Erf((left + width) / Math.Sqrt(2)) - SpecialFunctions.Erf(left / Math.Sqrt(2)));
            Assert.Equal(expected, Gaussian.Area(left, left + width, 1), 3e-16);
        });

    // 0.5 erfc(x / sqrt 2) on all pieces of the approximation, computed with 25 digits.
    [Theory]
    [InlineData(0.1, 0.46017216272297102)]
    [InlineData(0.6, 0.27425311775007358)]
    [InlineData(0.7, 0.24196365222307301)]
    [InlineData(1, 0.15865525393145705)]
    [InlineData(3, 0.0013498980316300945)]
    [InlineData(5, 2.8665157187919391e-7)]
    [InlineData(5.7, 5.9903714010635344e-9)]
    [InlineData(8, 6.2209605742717841e-16)]
    [InlineData(20, 2.7536241186062337e-89)]
    public void Upper_tail_is_precise(double left, double area)
        => Assert.Equal(1, Gaussian.Area(left, 60, 1) / area, 3e-14);

    [Fact]
    public void Area_is_symmetric()
        => Gen.Select(Gen.Double[-5, 5], Gen.Double[0, 5]).Sample((left, width) =>
            Math.Abs(Gaussian.Area(left, left + width, 1) - Gaussian.Area(-left - width, -left, 1)) < 1e-15);

    [Fact]
    public void Pixels_hold_the_whole_area()
    {
        double[] edges = [.. Enumerable.Range(0, 101).Select(i => 5000 + 0.7 * i)];
        double[] pixels = new double[100];
        Gaussian.PixelMeans(edges, 5031.3, 1.1, pixels);
        Assert.Equal(1, pixels.Sum() * 0.7, 1e-13);
        Assert.Equal(Gaussian.Area(edges[44] - 5031.3, edges[45] - 5031.3, 1.1) / 0.7, pixels[44], 1e-12);
    }

    // A pixel adds the variance of its width, d^2/12, to that of the line.
    [Fact]
    public void Pixels_broaden_by_their_width()
    {
        double[] edges = [.. Enumerable.Range(0, 61).Select(i => -30 + 1.0 * i)];
        double[] pixels = new double[60];
        Gaussian.PixelMeans(edges, 0, 1.2, pixels);
        double variance = pixels.Select((value, i) => value * Math.Pow(edges[i] + 0.5, 2)).Sum();
        Assert.Equal(1.2 * 1.2 + 1.0 / 12, variance, 1e-9);
    }

    [Fact]
    public void Edge_count_must_fit()
        => Assert.Throws<ArgumentException>(() => Gaussian.PixelMeans(new double[3], 0, 1, new double[3]));

    [Fact]
    public void Area_constant_is_its_closed_form()
        => Assert.Equal(Gaussian.AreaPerDepthAndFwhm, Math.Sqrt(Math.PI / (4 * Math.Log(2))), 1e-15);
}
