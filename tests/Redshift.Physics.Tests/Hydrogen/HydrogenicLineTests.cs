using Redshift.Physics.Constants;
using Redshift.Physics.Hydrogen;
using Xunit;

namespace Redshift.Physics.Tests.Hydrogen;

public sealed class HydrogenicLineTests
{
    // NIST Atomic Spectra Database, H alpha: vacuum wavelength in nm and A in 1/s. 2e-5 A is 5e-5 cm^-1, half of what
    // the levels are good to.
    [Theory]
    [InlineData(2, 1, 1, 3, 2, 3, 656.4522556, 5.3877e7)]
    [InlineData(2, 0, 1, 3, 1, 3, 656.4537685, 2.2448e7)]
    [InlineData(2, 1, 1, 3, 0, 1, 656.4564672, 2.1046e6)]
    [InlineData(2, 0, 1, 3, 1, 1, 656.4584403, 2.2449e7)]
    [InlineData(2, 1, 3, 3, 2, 5, 656.4664660, 6.4651e7)]
    [InlineData(2, 1, 3, 3, 2, 3, 656.4680232, 1.0775e7)]
    [InlineData(2, 1, 3, 3, 0, 1, 656.4722349, 4.2097e6)]
    public void H_alpha_components_agree_with_the_measured_ones(int n1, int l1, int j1, int n2, int l2, int j2, double nm, double rate)
    {
        FineStructureComponent component = Assert.Single(
            HydrogenicAtom.Hydrogen.FineStructure(3, 2),
            c => c.Lower == new HydrogenicLevel(n1, l1, j1) && c.Upper == new HydrogenicLevel(n2, l2, j2));
        Assert.Equal(10 * nm, component.VacuumAngstrom, 2e-5);
        Assert.Equal(1, component.EinsteinA / rate, 2e-4);
    }

    // Centre of the seven components weighted by gA of the same table.
    [Fact]
    public void H_alpha_is_at_the_centre_of_its_measured_components()
        => Assert.Equal(6564.6081, HydrogenSeries.Balmer.Line(3).VacuumAngstrom, 6e-5);

    // Wiese and Fuhr 2009, J. Phys. Chem. Ref. Data 38, 565: averaged oscillator strengths.
    [Theory]
    [InlineData(2, 1, 0.4164)]
    [InlineData(3, 1, 0.07912)]
    [InlineData(4, 1, 0.02901)]
    [InlineData(5, 1, 0.01394)]
    [InlineData(6, 1, 0.007804)]
    [InlineData(3, 2, 0.64108)]
    [InlineData(4, 2, 0.1194)]
    [InlineData(5, 2, 0.04467)]
    [InlineData(6, 2, 0.02209)]
    [InlineData(7, 2, 0.01271)]
    [InlineData(4, 3, 0.8425)]
    [InlineData(5, 3, 0.1507)]
    [InlineData(6, 3, 0.05587)]
    public void Oscillator_strengths_agree_with_the_tables(int upper, int lower, double strength)
        => Assert.Equal(1, HydrogenicAtom.Hydrogen.Line(upper, lower).OscillatorStrength / strength, 8e-4);

    // NIST Atomic Spectra Database, averaged rates.
    [Theory]
    [InlineData(2, 1, 4.6986e8)]
    [InlineData(3, 2, 4.4101e7)]
    [InlineData(4, 2, 8.4193e6)]
    [InlineData(4, 3, 8.9860e6)]
    public void Einstein_coefficients_agree_with_the_tables(int upper, int lower, double rate)
        => Assert.Equal(1, HydrogenicAtom.Hydrogen.Line(upper, lower).EinsteinA / rate, 2e-4);

    // The rates of a one-electron ion grow as the fourth power of the charge.
    [Fact]
    public void Rates_scale_with_the_charge()
    {
        double ratio = HydrogenicAtom.HeliumPlus.Line(4, 3).EinsteinA / HydrogenicAtom.Hydrogen.Line(4, 3).EinsteinA;
        Assert.Equal(16, ratio, 0.02);
    }

    // The isotope shift follows from the masses alone and is the same for every line.
    [Theory]
    [InlineData(2, 1, 1215.33935)]
    [InlineData(3, 1, 1025.44319)]
    [InlineData(3, 2, 6562.82237)]
    [InlineData(4, 2, 4861.36016)]
    [InlineData(5, 2, 4340.50266)]
    public void Deuterium_lies_81_km_per_second_to_the_blue(int upper, int lower, double vacuum)
    {
        double deuterium = HydrogenicAtom.Deuterium.Wavelength(upper, lower);
        double hydrogen = HydrogenicAtom.Hydrogen.Wavelength(upper, lower);
        Assert.Equal(vacuum, deuterium, 2e-5);
        Assert.Equal(-81.551, Codata2022.SpeedOfLightKmS * (deuterium / hydrogen - 1), 0.002);
    }

    // Kramida 2010 for the Lyman limit, the others from an independent computation.
    [Theory]
    [InlineData(1, 911.7535)]
    [InlineData(2, 3647.0181)]
    [InlineData(3, 8205.8264)]
    public void Series_limits_are_where_the_tables_say(int lower, double vacuum)
        => Assert.Equal(vacuum, HydrogenicAtom.Hydrogen.SeriesLimit(lower), 6e-5);

    [Theory]
    [InlineData(2, 1, "Ly alpha")]
    [InlineData(7, 1, "Ly7")]
    [InlineData(3, 2, "H alpha")]
    [InlineData(7, 2, "H epsilon")]
    [InlineData(8, 2, "H8")]
    [InlineData(9, 3, "Pa9")]
    [InlineData(7, 4, "Br gamma")]
    [InlineData(6, 5, "Pf alpha")]
    [InlineData(7, 6, "Hu alpha")]
    [InlineData(9, 7, "H I 9-7")]
    public void Hydrogen_lines_carry_their_usual_names(int upper, int lower, string name)
        => Assert.Equal(name, HydrogenicAtom.Hydrogen.Line(upper, lower).Name);

    [Theory]
    [InlineData(4, 3, "He II 4686")]
    [InlineData(3, 2, "He II 1640")]
    [InlineData(11, 4, "He II 4200")]
    public void Helium_lines_are_named_by_wavelength(int upper, int lower, string name)
        => Assert.Equal(name, HydrogenicAtom.HeliumPlus.Line(upper, lower).Name);

    [Fact]
    public void Deuterium_is_not_named_like_hydrogen()
        => Assert.Equal("D I 6561", HydrogenicAtom.Deuterium.Line(3, 2).Name);

    [Fact]
    public void Series_run_to_their_limit()
    {
        foreach (HydrogenSeries series in HydrogenSeries.All)
        {
            double[] wavelengths = [.. series.Lines(60).Select(line => line.VacuumAngstrom)];
            Assert.Equal(60 - series.Lower, wavelengths.Length);
            Assert.Equal(wavelengths.OrderDescending(), wavelengths);
            Assert.InRange(wavelengths[^1], series.Limit, 1.011 * series.Limit);
        }
    }

    // Beyond the precomputed table a line is computed when asked for, by the same formulas.
    [Fact]
    public void Lines_beyond_the_table_follow_on_smoothly()
    {
        double last = Energy(40) - Energy(39);
        double next = Energy(41) - Energy(40);
        Assert.Equal(Math.Pow(40.0 / 41, 3), next / last, 0.003);

        static double Energy(int n) => HydrogenicAtom.Hydrogen.Line(n, 2).UpperTermEnergy;
    }

    [Theory]
    [InlineData(2, 2)]
    [InlineData(1, 2)]
    [InlineData(2, 0)]
    public void Impossible_transitions_are_refused(int upper, int lower)
        => Assert.Throws<ArgumentOutOfRangeException>(() => HydrogenicAtom.Hydrogen.Line(upper, lower));
}
