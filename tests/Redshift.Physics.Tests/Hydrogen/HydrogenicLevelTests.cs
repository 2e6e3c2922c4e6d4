using Redshift.Physics.Hydrogen;
using Xunit;

namespace Redshift.Physics.Tests.Hydrogen;

public sealed class HydrogenicLevelTests
{
    // NIST Atomic Spectra Database, H I levels (Kramida 2010, At. Data Nucl. Data Tables 96, 586), cm^-1.
    [Theory]
    [InlineData(2, 1, 1, 82258.9191133)]
    [InlineData(2, 0, 1, 82258.9543992821)]
    [InlineData(2, 1, 3, 82259.2850014)]
    [InlineData(3, 0, 1, 97492.221701)]
    [InlineData(3, 1, 1, 97492.211200)]
    [InlineData(3, 1, 3, 97492.319611)]
    [InlineData(3, 2, 3, 97492.319433)]
    [InlineData(3, 2, 5, 97492.355566)]
    [InlineData(4, 1, 1, 102823.8485825)]
    public void Hydrogen_levels_agree_with_the_measured_ones(int n, int l, int twiceJ, double waveNumber)
        => Assert.Equal(waveNumber, HydrogenicAtom.Hydrogen.Energy(new(n, l, twiceJ)), 1e-4);

    // The same database: limit of H I.
    [Fact]
    public void Ionization_limit_agrees_with_the_measured_one()
        => Assert.Equal(109678.77174307, HydrogenicAtom.Hydrogen.IonizationEnergy, 1e-4);

    // Mean of the database's own n = 2 levels by statistical weight; its entry for the whole shell, 82259.158, is not
    // that mean.
    [Fact]
    public void Term_energy_is_the_mean_by_statistical_weight()
        => Assert.Equal(82259.1109, HydrogenicAtom.Hydrogen.TermEnergy(2), 2e-4);

    // Lamb shift 2s1/2 - 2p1/2: 1057.845 MHz (Lundeen and Pipkin 1981, Phys. Rev. Lett. 46, 232).
    [Fact]
    public void Lamb_shift_of_n_2_is_reproduced_within_the_terms_kept()
    {
        double shift = HydrogenicAtom.Hydrogen.Energy(new(2, 0, 1)) - HydrogenicAtom.Hydrogen.Energy(new(2, 1, 1));
        Assert.Equal(1057.845, shift * 29979.2458, 1.5);
    }
}
