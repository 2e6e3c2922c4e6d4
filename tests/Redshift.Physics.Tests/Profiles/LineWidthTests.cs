using Redshift.Physics.Profiles;
using Xunit;

namespace Redshift.Physics.Tests.Profiles;

public sealed class LineWidthTests
{
    // c/R and c/(2.35482 R).
    [Theory]
    [InlineData(300, 999.3082, 424.3671)]
    [InlineData(500, 599.5849, 254.6203)]
    [InlineData(1000, 299.7925, 127.3101)]
    [InlineData(2000, 149.8962, 63.6551)]
    [InlineData(5000, 59.9585, 25.4620)]
    [InlineData(10000, 29.9792, 12.7310)]
    [InlineData(20000, 14.9896, 6.3655)]
    public void Resolving_power_is_a_velocity_width(double resolvingPower, double fwhm, double sigma)
    {
        Assert.Equal(fwhm, LineWidth.FwhmKmS(resolvingPower), 6e-5);
        Assert.Equal(sigma, LineWidth.SigmaKmS(resolvingPower), 6e-5);
        Assert.Equal(resolvingPower, LineWidth.ResolvingPower(LineWidth.FwhmKmS(resolvingPower)), 1e-9);
    }

    [Fact]
    public void Half_the_full_width_is_where_the_gaussian_is_half_its_peak()
        => Assert.Equal(0.5, Gaussian.Value(LineWidth.FwhmFromSigma(2) / 2, 2) / Gaussian.Value(0, 2), 1e-14);

    [Fact]
    public void Constant_is_its_closed_form()
        => Assert.Equal(LineWidth.FwhmPerSigma, 2 * Math.Sqrt(2 * Math.Log(2)), 1e-15);

    [Theory]
    [InlineData(5, 3, 4)]
    [InlineData(3, 3, 0)]
    [InlineData(2, 3, 0)]
    public void Instrument_is_taken_out_in_quadrature(double observed, double instrument, double intrinsic)
        => Assert.Equal(intrinsic, LineWidth.Intrinsic(observed, instrument), 1e-14);
}
