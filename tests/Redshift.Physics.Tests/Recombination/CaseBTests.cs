using Redshift.Physics.Recombination;
using Xunit;

namespace Redshift.Physics.Tests.Recombination;

public sealed class CaseBTests
{
    // Osterbrock and Ferland 2006, Astrophysics of Gaseous Nebulae, table 4.4, at 100 electrons per cm^3
    // (Storey and Hummer 1995, Mon. Not. R. Astron. Soc. 272, 41).
    [Theory]
    [InlineData(3, 2, 3.041, 2.863, 2.747)]
    [InlineData(5, 2, 0.458, 0.468, 0.475)]
    [InlineData(6, 2, 0.251, 0.259, 0.264)]
    [InlineData(7, 2, 0.154, 0.159, 0.163)]
    [InlineData(8, 2, 0.102, 0.105, 0.107)]
    [InlineData(4, 3, 0.414, 0.339, 0.283)]
    [InlineData(5, 3, 0.184, 0.163, 0.145)]
    [InlineData(6, 3, 0.0988, 0.0904, 0.0821)]
    [InlineData(7, 4, 0.0332, 0.0278, 0.0234)]
    public void Ratios_agree_with_the_published_table(int upper, int lower, double cool, double medium, double hot)
        => AssertRatios(upper, lower, [cool, medium, hot], 0.006);

    // An independent computation by the same physics.
    [Theory]
    [InlineData(3, 2, 3.0506, 2.8661, 2.7448)]
    [InlineData(5, 2, 0.45782, 0.46812, 0.47539)]
    [InlineData(6, 2, 0.25102, 0.25882, 0.26427)]
    [InlineData(7, 2, 0.15375, 0.15895, 0.16252)]
    [InlineData(8, 2, 0.10152, 0.10495, 0.10726)]
    [InlineData(9, 2, 0.070769, 0.073072, 0.074589)]
    [InlineData(10, 2, 0.051413, 0.05299, 0.054005)]
    [InlineData(12, 2, 0.029728, 0.03051, 0.03099)]
    [InlineData(4, 3, 0.41413, 0.33953, 0.28378)]
    [InlineData(5, 3, 0.1849, 0.16372, 0.14522)]
    [InlineData(6, 3, 0.09894, 0.090546, 0.082351)]
    [InlineData(7, 3, 0.059678, 0.055503, 0.051095)]
    [InlineData(8, 3, 0.039003, 0.036583, 0.033889)]
    [InlineData(9, 3, 0.026997, 0.025436, 0.023642)]
    [InlineData(10, 3, 0.019512, 0.018427, 0.017156)]
    [InlineData(5, 4, 0.10574, 0.080417, 0.062416)]
    [InlineData(6, 4, 0.056224, 0.045734, 0.03742)]
    [InlineData(7, 4, 0.033197, 0.027925, 0.023451)]
    public void Ratios_agree_with_an_independent_computation(int upper, int lower, double cool, double medium, double hot)
        => AssertRatios(upper, lower, [cool, medium, hot], 0.01);

    [Fact]
    public void Temperatures_between_the_tabulated_ones_are_interpolated()
    {
        Func<int, int, double> emission = CaseBCascade.Extrapolated(14000, 80);
        Assert.Equal(1, CaseB.RelativeIntensity(3, 2, 14000) * emission(4, 2) / emission(3, 2), 1e-3);
        Assert.Equal(1, CaseB.RelativeIntensity(7, 4, 14000) * emission(4, 2) / emission(7, 4), 1e-3);
    }

    [Theory]
    [InlineData(5000)]
    [InlineData(7300)]
    [InlineData(20000)]
    public void H_beta_is_the_unit(double temperature)
        => Assert.Equal(1, CaseB.RelativeIntensity(4, 2, temperature), 1e-12);

    [Theory]
    [InlineData(2, 1, 10000)]
    [InlineData(6, 5, 10000)]
    [InlineData(2, 2, 10000)]
    [InlineData(26, 2, 10000)]
    [InlineData(3, 2, 4999)]
    [InlineData(3, 2, 20001)]
    [InlineData(3, 2, double.NaN)]
    public void Lines_and_temperatures_outside_the_table_are_refused(int upper, int lower, double temperature)
        => Assert.Throws<ArgumentOutOfRangeException>(() => CaseB.RelativeIntensity(upper, lower, temperature));

    private static void AssertRatios(int upper, int lower, double[] expected, double tolerance)
    {
        Assert.Equal(1, CaseB.RelativeIntensity(upper, lower, 5000) / expected[0], tolerance);
        Assert.Equal(1, CaseB.RelativeIntensity(upper, lower, 10000) / expected[1], tolerance);
        Assert.Equal(1, CaseB.RelativeIntensity(upper, lower, 20000) / expected[2], tolerance);
    }
}
