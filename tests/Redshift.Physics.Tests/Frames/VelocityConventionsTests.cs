using CsCheck;
using Redshift.Physics.Constants;
using Redshift.Physics.Frames;
using Xunit;

namespace Redshift.Physics.Tests.Frames;

public sealed class VelocityConventionsTests
{
    // The definitions of Greisen et al. 2006, Astron. Astrophys. 446, 747, evaluated in an independent program.
    [Theory]
    [InlineData(0.001, 299.792458, 299.642562, 299.492965, 299.642662)]
    [InlineData(0.01, 2997.92458, 2982.935699, 2968.242158, 2983.034144)]
    [InlineData(0.1, 29979.2458, 28487.066145, 27253.859818, 28573.273076)]
    [InlineData(1, 299792.458, 179875.4748, 149896.229, 207800.297016)]
    [InlineData(3, 899377.374, 264522.757059, 224844.3435, 415600.594032)]
    [InlineData(7.5, 2248443.435, 291606.998396, 264522.757059, 641575.695437)]
    public void Velocities_are_as_tabulated(double z, double optical, double relativistic, double radio, double logarithmic)
    {
        Assert.Equal(optical, VelocityConventions.Optical(z), 1e-6);
        Assert.Equal(relativistic, VelocityConventions.Relativistic(z), 1e-6);
        Assert.Equal(radio, VelocityConventions.Radio(z), 1e-6);
        Assert.Equal(logarithmic, VelocityConventions.Logarithmic(z), 1e-6);
    }

    // Greisen et al. 2006, section 10.1: VOPT 9120 km/s is VRAD 8850.75090419 and VELO 8981.34229811 km/s.
    [Fact]
    public void Worked_example_of_the_fits_spectral_paper_is_reproduced()
    {
        double z = VelocityConventions.FromOptical(9120);
        Assert.Equal(0.0304210454820715, z, 1e-15);
        Assert.Equal(8850.75090419305, VelocityConventions.Radio(z), 1e-8);
        Assert.Equal(8981.34229811221, VelocityConventions.Relativistic(z), 1e-8);
    }

    [Fact]
    public void Every_convention_is_inverted()
        => Gen.Double[-0.5, 8].Sample(z =>
        {
            Assert.Equal(z, VelocityConventions.FromOptical(VelocityConventions.Optical(z)), 1e-12);
            Assert.Equal(z, VelocityConventions.FromRadio(VelocityConventions.Radio(z)), 1e-12);
            Assert.Equal(z, VelocityConventions.FromRelativistic(VelocityConventions.Relativistic(z)), 1e-12);
            Assert.Equal(z, VelocityConventions.FromLogarithmic(VelocityConventions.Logarithmic(z)), 1e-12);
        });

    // (1.5)(1 + 25/c) - 1, where adding the velocities would be 12.5 km/s low. Davis and Scrimgeour 2014,
    // Mon. Not. R. Astron. Soc. 442, 1117.
    [Fact]
    public void Redshifts_compose_by_the_product()
        => Assert.Equal(0.500125086536, VelocityConventions.Compose(0.5, 25 / Codata2022.SpeedOfLightKmS), 1e-12);

    [Fact]
    public void Composition_is_associative_and_undone_by_the_inverse_shift()
        => Gen.Select(Gen.Double[-0.3, 5], Gen.Double[-0.3, 5], Gen.Double[-0.3, 5]).Sample((a, b, c) =>
        {
            double left = VelocityConventions.Compose(VelocityConventions.Compose(a, b), c);
            double right = VelocityConventions.Compose(a, VelocityConventions.Compose(b, c));
            Assert.Equal(left, right, 1e-12 * (1 + left));
            Assert.Equal(0, VelocityConventions.Compose(a, -a / (1 + a)), 1e-14);
        });
}
