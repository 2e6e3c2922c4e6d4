using CsCheck;
using Redshift.Physics.Air;
using Redshift.Physics.Stars;
using Xunit;

namespace Redshift.Physics.Tests.Stars;

public sealed class StellarLineTests
{
    private static readonly LogWavelengthGrid Grid = LogWavelengthGrid.Covering(3000, 10000, 20);

    [Fact]
    public void Curve_of_growth_has_its_three_parts()
    {
        // Linear, √π η; flat, 2 √(ln η); damped, π √k (Milne 1921; Gray 2005, chapter 13).
        Assert.Equal(Math.Sqrt(Math.PI) * 1e-4, CurveOfGrowth.Core(1e-4), 1e-7);
        Assert.Equal(2 * Math.Sqrt(Math.Log(1e6)), CurveOfGrowth.Core(1e6), 0.15);
        Assert.Equal(Math.PI * Math.Sqrt(CurveOfGrowth.WingStrength(1e8, 0.01)), CurveOfGrowth.Wings(1e8, 0.01), 0.1);
    }

    [Fact]
    public void Inverted_curve_of_growth_returns_the_width() =>
        Gen.Select(Gen.Double[0.01, 300], Gen.Double[-4, 0]).Sample((width, logDamping) =>
        {
            var damping = Math.Pow(10, logDamping);
            var central = CurveOfGrowth.Invert(width, damping);
            var back = CurveOfGrowth.CoreInsideWings(central, damping) + CurveOfGrowth.Wings(central, damping);
            return Math.Abs(back - width) < 0.005 * width;
        });

    // Moore, Minnaert & Houtgast 1966: widths at the centre of the solar disc, in Å, to which the strengths are calibrated; what the grid
    // holds of an isolated line must be that width.
    [Theory]
    [InlineData(6439.08, 0.165, 1.0)] // Ca I
    [InlineData(8806.76, 0.520, 2.0)] // Mg I
    [InlineData(6230.72, 0.160, 0.9)] // Fe I
    public void Isolated_solar_lines_have_their_measured_widths(double air, double width, double reach)
    {
        var sun = StellarModel.Compute(new StellarParameters(5772, 4.44, 0), Grid).Relative;
        var center = AirRefraction.ToVacuum(air);
        var pixels = Enumerable.Range(0, Grid.Count - 1).Where(i => Math.Abs(Grid.Wavelength(i) - center) < reach);
        var found = pixels.Sum(i => (1 - sun[i]) * (Grid.Wavelength(i + 1) - Grid.Wavelength(i)));
        Assert.InRange(found, 0.85 * width, 1.25 * width);
    }

    // Heads of Pearse & Gaydon 1976, air, strongest of their systems: the flux falls across them in an M star.
    [Theory]
    [InlineData(4954.6)]
    [InlineData(5166.8)]
    [InlineData(6158.5)]
    [InlineData(7054.3)]
    [InlineData(8859.6)]
    public void TiO_bands_begin_at_their_heads(double air)
    {
        var star = StellarModel.Compute(new StellarParameters(3300, 4.9, 0), Grid).Relative;
        var head = Grid.Position(AirRefraction.ToVacuum(air));
        double Drop(int i) => Enumerable.Range(1, 6).Sum(k => star[i - k] - star[i + k]);
        var steepest = Enumerable.Range((int)head - 25, 50).MaxBy(Drop);
        Assert.InRange(steepest, head - 3, head + 6);
    }

    [Fact]
    public void Bands_of_one_upper_level_share_their_strength()
    {
        // Franck-Condon factors from one lower level sum to one; eight upper levels hold nearly all of it for v'' = 0.
        foreach (var system in BandSystem.All)
        {
            var sum = Enumerable.Range(0, 8).Sum(v => system.FranckCondon(v, 0));
            Assert.InRange(sum, 0.98, 1.0001);
        }
    }

    [Fact]
    public void A_band_keeps_its_cross_section()
    {
        var band = new Band(14000, 0.505, 0.534, 0.5, 1e-15);
        var grid = LogWavelengthGrid.Covering(6500, 9500, 20);
        var ratio = new double[grid.Count];
        band.Add(ratio, grid, 3000, 1e18);
        var integral = Enumerable.Range(0, grid.Count).Sum(i => ratio[i] * (grid.EdgeWavenumbers[i] - grid.EdgeWavenumbers[i + 1]));
        Assert.InRange(integral, 0.99e3, 1.001e3);
    }

    [Fact]
    public void White_dwarfs_have_broad_Balmer_lines_and_nothing_else()
    {
        var dwarf = StellarModel.Compute(new StellarParameters(16000, 8, 0, StellarVariant.WhiteDwarfDA), Grid).Relative;
        double At(double vacuum) => dwarf[(int)Math.Round(Grid.Position(vacuum))];
        Assert.InRange(At(4862.7 + 40), 0.5, 0.93);
        Assert.InRange(At(3934.8 - 12), 0.3, 1);
        Assert.True(Math.Abs(At(5891.6) - At(5880)) < 0.003);
    }

    [Fact]
    public void Variants_show_what_they_are_named_for()
    {
        double At(StellarParameters p, double vacuum) => StellarModel.Compute(p, Grid).Relative[(int)Math.Round(Grid.Position(vacuum))];
        Assert.True(At(new StellarParameters(22000, 4, 0, StellarVariant.EmissionLine), 6564.6) > 2);
        Assert.True(At(new StellarParameters(3300, 4.9, 0, StellarVariant.ActiveM), 6564.6) > 1.5);
        Assert.True(At(new StellarParameters(17000, 8, 0, StellarVariant.WhiteDwarfDB), 4472.7) < 0.8);
        Assert.True(At(new StellarParameters(17000, 8, 0, StellarVariant.WhiteDwarfDB), 4862.7) > 0.93);

        // Carbon stars: C2 head at 5165, nothing at the TiO head 7054.
        var carbon = new StellarParameters(3200, 1, 0, StellarVariant.Carbon);
        Assert.True(At(carbon, 5155) < 0.7 * At(carbon, 5175));
        Assert.True(Math.Abs(At(carbon, 7062) - At(carbon, 7048)) < 0.05);
    }
}
