using Redshift.Physics.Stars;
using Xunit;

namespace Redshift.Physics.Tests.Stars;

public sealed class StellarGasTests
{
    // Worked numbers of Carroll & Ostlie 2007, An Introduction to Modern Astrophysics, example 8.1.5: T = 5777 K, P_e = 1.5 N/m², that is
    // 15 dyn/cm². Partition functions: hydrogen 2 and 1; calcium 1.32 and 2.30, the table here having 1.2 and 2.3.
    [Theory]
    [InlineData("H", 7.7e-5, 1)]
    [InlineData("Ca", 918, 1.32 / 1.2)]
    public void Saha_equation_gives_the_worked_numbers(string symbol, double ratio, double partition)
    {
        var found = Gas.SahaRatio(Element.Find(symbol), 0, 5777, 15);
        Assert.InRange(found, 0.98 * ratio * partition, 1.02 * ratio * partition);
    }

    [Fact]
    public void Solar_layer_has_the_pressure_of_model_atmospheres()
    {
        // Vernazza, Avrett & Loeser 1981, ApJS 45, 635, model C at τ = 0.67 or so: log P_gas 5.0 to 5.1, log P_e 1.2 to 1.4.
        var gas = Gas.InBalance(5900, 4.44, new Composition(0), 0.67);
        Assert.InRange(Math.Log10(gas.GasPressure), 4.8, 5.2);
        Assert.InRange(Math.Log10(gas.ElectronPressure), 1.0, 1.6);
    }

    [Theory]
    [InlineData(14.23, 16)] // log N_e = 23.26 − 7.5 log n_max, Inglis & Teller 1939, ApJ 90, 439
    [InlineData(14.66, 14)]
    [InlineData(13.50, 20)]
    public void Last_line_follows_the_electron_density(double logDensity, double last) =>
        Assert.Equal(last, HydrogenLevels.LastLine(Math.Pow(10, logDensity)), 0.1);

    [Fact]
    public void Negative_hydrogen_has_its_minimum_at_16000_A()
    {
        // The classical minimum of the solar opacity where bound-free absorption ends (Gray 2005, figure 8.5).
        var opacity = new ContinuousOpacity(Gas.InBalance(5800, 4.44, new Composition(0), 0.67));
        Assert.InRange(Enumerable.Range(4, 22).MinBy(i => opacity.At(1000 * i)), 15, 17);
        Assert.InRange(opacity.At(8500) / opacity.At(16400), 2, 5);
    }

    [Theory]
    [InlineData(3000)]
    [InlineData(4000)]
    [InlineData(5000)]
    public void Partition_functions_give_the_tabulated_dissociation_of_hydrogen(double kelvin)
    {
        // Tsuji 1973, A&A 23, 411: log K_p = 12.5335 − 4.9252 θ + 0.0562 θ² − 0.0033 θ³ in dyn/cm²; rigid rotator and harmonic oscillator
        // are good to a tenth of a dex for so light a molecule.
        var hydrogen = new Molecule(Element.Hydrogen, Element.Hydrogen, 4.478, 60.853, 4401.2, 0.5);
        Assert.Equal(Math.Log10(Gas.HydrogenMoleculeConstant(kelvin)), Math.Log10(hydrogen.DissociationConstant(kelvin)), 0.12);
    }

    [Fact]
    public void Carbon_monoxide_takes_the_carbon_of_cool_stars_and_leaves_oxygen()
    {
        var gas = Gas.InBalance(3000, 4.9, new Composition(0), 0.1);
        var equilibrium = new MolecularEquilibrium(gas);
        var carbon = gas.AbundanceOf(Element.Find("C"));
        Assert.InRange(equilibrium.Abundance(Molecule.CarbonMonoxide), 0.97 * carbon, 1.001 * carbon);
        Assert.True(equilibrium.Abundance(Molecule.TitaniumMonoxide) > 0.3 * gas.AbundanceOf(Element.Find("Ti")));
        Assert.True(equilibrium.Abundance(Molecule.Carbon2) < 1e-9 * carbon);
    }
}
