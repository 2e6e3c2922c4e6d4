using Redshift.Physics.Constants;
using Xunit;

namespace Redshift.Physics.Tests.Constants;

public sealed class Codata2022Tests
{
    public static TheoryData<PhysicalConstant> Constants => [.. Codata2022.All];

    [Theory]
    [MemberData(nameof(Constants))]
    public void Constant_is_fully_described(PhysicalConstant constant)
    {
        Assert.All(
            new[] { constant.Name, constant.Symbol, constant.Unit, constant.Edition, constant.Source },
            text => Assert.False(string.IsNullOrWhiteSpace(text)));
        Assert.True(double.IsFinite(constant.Value) && constant.Value > 0);
    }

    [Theory]
    [MemberData(nameof(Constants))]
    public void Uncertainty_is_zero_exactly_for_exact_constants(PhysicalConstant constant)
    {
        Assert.Equal(constant.IsExact, constant.StandardUncertainty == 0);
        Assert.True(constant.StandardUncertainty >= 0);
    }

    [Fact]
    public void All_lists_every_constant_once()
    {
        int declared = typeof(Codata2022).GetProperties().Count(p => p.PropertyType == typeof(PhysicalConstant));
        Assert.Equal(declared, Codata2022.All.Distinct().Count());
        Assert.Equal(declared, Codata2022.All.Count);
    }

    [Fact]
    public void Speed_of_light_is_the_same_in_both_units()
        => Assert.Equal(Codata2022.SpeedOfLightKmS, Codata2022.SpeedOfLight.Value / 1000);

    // R_inf = alpha^2 m_e c / 2h ties four of the table's entries together.
    [Fact]
    public void Rydberg_constant_agrees_with_its_definition()
    {
        double alpha = Codata2022.FineStructure.Value;
        double defined = alpha * alpha * Codata2022.ElectronMass.Value * Codata2022.SpeedOfLight.Value / (2 * Codata2022.Planck.Value);
        Assert.Equal(1, defined / Codata2022.Rydberg.Value, 1e-9);
    }

    // a_0 = alpha / (4 pi R_inf).
    [Fact]
    public void Bohr_radius_agrees_with_its_definition()
    {
        double defined = Codata2022.FineStructure.Value / (4 * Math.PI * Codata2022.Rydberg.Value);
        Assert.Equal(1, defined / Codata2022.BohrRadius.Value, 3e-10);
    }

    // The same adjustment lists the inverse ratios: 1836.152673426, 3670.482967655, 7294.29954171.
    [Fact]
    public void Mass_ratios_agree_with_the_listed_inverses()
    {
        Assert.Equal(1836.152673426, 1 / Codata2022.ElectronProtonMassRatio.Value, 1e-9);
        Assert.Equal(3670.482967655, 1 / Codata2022.ElectronDeuteronMassRatio.Value, 2e-9);
        Assert.Equal(7294.29954171, 1 / Codata2022.ElectronAlphaMassRatio.Value, 1e-8);
    }
}
