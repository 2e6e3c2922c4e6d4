using MathNet.Numerics.Integration;
using Redshift.Physics.Profiles;
using Xunit;

namespace Redshift.Physics.Tests.Profiles;

public sealed class VoigtTests
{
    // Full widths of Gaussian and Lorentzian, full width and peak of the convolution found numerically with an exact
    // Faddeeva function.
    [Theory]
    [InlineData(1, 0, 1.00000000, 0.93943728)]
    [InlineData(1, 0.1, 1.05438241, 0.85730839)]
    [InlineData(1, 0.5, 1.29377599, 0.62122125)]
    [InlineData(1, 1, 1.63759536, 0.44911094)]
    [InlineData(1, 2, 2.43573066, 0.27854958)]
    [InlineData(0.1, 1, 1.01068771, 0.63212350)]
    public void Width_and_peak_are_as_computed_numerically(double gaussian, double lorentzian, double fullWidth, double peak)
    {
        Assert.Equal(1, Voigt.FullWidth(gaussian, lorentzian) / fullWidth, 3e-4);
        Assert.Equal(1, Voigt.Value(0, LineWidth.SigmaFromFwhm(gaussian), lorentzian / 2) / peak, 1e-4);
    }

    [Fact]
    public void Profile_is_half_its_peak_at_half_the_width()
    {
        double half = Voigt.Value(1.63759536 / 2, LineWidth.SigmaFromFwhm(1), 0.5);
        Assert.Equal(0.5, half / Voigt.Value(0, LineWidth.SigmaFromFwhm(1), 0.5), 1e-4);
    }

    [Fact]
    public void Without_damping_the_profile_is_gaussian()
    {
        foreach (double offset in new[] { 0, 0.5, 1, 2, 4 })
            Assert.Equal(1, Voigt.Value(offset, 1.3, 0) / Gaussian.Value(offset, 1.3), 1e-4);
    }

    // Beyond the limits of the integral lies the Lorentzian's 2 h / (pi 500) of the area.
    [Fact]
    public void Area_is_one()
    {
        double area = GaussLegendreRule.Integrate(x => Voigt.Value(x, 1, 0.5), -20, 20, 256)
            + 2 * GaussLegendreRule.Integrate(x => Voigt.Value(x, 1, 0.5), 20, 500, 256);
        Assert.Equal(1, area + 2 * 0.5 / (Math.PI * 500), 1e-4);
    }

    [Fact]
    public void Missing_gaussian_is_refused()
        => Assert.Throws<ArgumentOutOfRangeException>(() => Voigt.Value(0, 0, 1));
}
