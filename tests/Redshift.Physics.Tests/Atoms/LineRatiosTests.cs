using Redshift.Physics.Atoms;
using Redshift.Physics.Lines;
using Xunit;

namespace Redshift.Physics.Tests.Atoms;

public sealed class LineRatiosTests
{
    private static IEnumerable<LineRatio> All => [.. LineRatios.Fixed, .. LineRatios.Resonance, .. LineRatios.DensityDependent];

    // Measured in nebulae and active nuclei: Dimitrijevic et al. 2007, Mon. Not. R. Astron. Soc. 374, 1181
    // (2.993 +- 0.014); Dojcinovic et al. 2023, Adv. Space Res. 71, 1219 (3.049 +- 0.021).
    [Theory]
    [InlineData("[O III] 5007", 2.993, 0.014)]
    [InlineData("[N II] 6583", 3.049, 0.021)]
    public void Fixed_ratios_are_as_measured(string stronger, double ratio, double error)
        => Assert.Equal(ratio, Assert.Single(LineRatios.Fixed, r => r.Numerator == stronger).Lowest, error);

    // Two lines of one lower level share their strength by the statistical weights of the upper levels, 4 and 2.
    [Fact]
    public void Resonance_doublets_are_two_to_one_within_three_per_cent()
        => Assert.All(LineRatios.Resonance, ratio => Assert.Equal(2, ratio.Highest, 0.06));

    // At low density every excitation of [O II] is followed by a photon: the weights are 6 and 4.
    [Fact]
    public void Thin_limit_of_O_II_is_the_ratio_of_statistical_weights()
        => Assert.Equal(6.0 / 4, Assert.Single(LineRatios.DensityDependent, r => r.Numerator == "[O II] 3729").Highest, 1e-12);

    [Fact]
    public void Both_lines_are_of_one_ion_and_in_the_list()
        => Assert.All(All, ratio =>
        {
            Assert.Equal(Ion(LineList.Find(ratio.Numerator)), Ion(LineList.Find(ratio.Denominator)));
            Assert.NotEqual(ratio.Numerator, ratio.Denominator);
        });

    [Fact]
    public void Only_the_fixed_ones_are_fixed()
    {
        Assert.All(LineRatios.Fixed, ratio => Assert.True(ratio.IsFixed));
        Assert.All(LineRatios.Resonance.Concat(LineRatios.DensityDependent), ratio => Assert.True(ratio.Lowest < ratio.Highest));
    }

    private static string Ion(SpectralLine line) => line.Name[..line.Name.LastIndexOf(' ')].Trim('[', ']');
}
