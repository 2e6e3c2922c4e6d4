using Redshift.Physics.Recombination;
using Xunit;

namespace Redshift.Physics.Tests.Recombination;

/// <summary>Computes the stored table again, after checking the computation itself.</summary>
public sealed class CaseBCascadeTests
{
    // Osterbrock and Ferland 2006, Astrophysics of Gaseous Nebulae, table 2.1: 1.58e-13, 2.34e-14, 5.35e-14 cm^3/s.
    [Fact]
    public void Captures_at_10000_K_agree_with_the_published_ones()
    {
        var cascade = new CaseBCascade(10000, 2);
        Assert.Equal([1.58e-13], cascade.Capture(1), (e, a) => Math.Abs(a / e - 1) < 0.004);
        Assert.Equal([2.34e-14, 5.35e-14], cascade.Capture(2), (e, a) => Math.Abs(a / e - 1) < 0.004);
    }

    // Emission of H beta, 4 pi j / n_e n_p in 1e-25 erg cm^3/s: the same book, table 4.4.
    [Theory]
    [InlineData(5000, 2.20)]
    [InlineData(10000, 1.24)]
    [InlineData(20000, 0.658)]
    public void Stored_table_is_what_the_cascade_gives(double temperature, double publishedHBeta)
    {
        Func<int, int, double> emission = CaseBCascade.Extrapolated(temperature, 80);
        Assert.Equal(1, 1e25 * emission(4, 2) / publishedHBeta, 0.008);
        for (int lower = 2; lower <= 4; lower++)
        {
            for (int upper = lower + 1; upper <= CaseB.HighestUpper; upper++)
                Assert.Equal(1, CaseB.RelativeIntensity(upper, lower, temperature) * emission(4, 2) / emission(upper, lower), 1e-5);
        }
    }
}
