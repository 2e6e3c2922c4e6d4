using Redshift.Physics.Stars;
using Xunit;

namespace Redshift.Physics.Tests.Stars;

public sealed class StellarModelTests
{
    private static readonly LogWavelengthGrid Grid = LogWavelengthGrid.Covering(900, 25000, 23);

    [Fact]
    public void Every_standard_star_is_finite_and_positive()
    {
        foreach (var star in StellarModel.StandardGrid)
        {
            var spectrum = StellarModel.Compute(star, Grid);
            Assert.Equal(Grid.Count, spectrum.Relative.Length);
            Assert.Equal(Grid.Count, spectrum.Continuum.Length);
            Assert.True(Array.TrueForAll(spectrum.Relative, f => f is >= 0 and < 300), $"{star}");
            Assert.True(Array.TrueForAll(spectrum.Continuum, f => f > 0 && float.IsFinite(f)), $"{star}");
        }
    }

    [Theory]
    [InlineData(41400, 4.1, "O5V")] // Pecaut & Mamajek 2013, ApJS 208, 9
    [InlineData(9700, 4.4, "A0V")]
    [InlineData(5770, 4.4, "G2V")]
    [InlineData(3850, 4.9, "M0V")]
    [InlineData(3980, 1.5, "K5III")] // van Belle et al. 1999, AJ 117, 521
    public void Types_follow_the_published_temperature_scales(double kelvin, double logGravity, string type) =>
        Assert.Equal(type, StellarModel.Compute(new StellarParameters(kelvin, logGravity, 0), Grid).SpectralType);

    // Ca II K and H, Na I D, Mg I b: NIST levels, vacuum.
    [Theory]
    [InlineData(3934.777)]
    [InlineData(3969.591)]
    [InlineData(5891.583)]
    [InlineData(5185.048)]
    [InlineData(6564.61)]
    public void Strong_solar_lines_stand_at_their_wavelengths(double vacuum)
    {
        var sun = StellarModel.Compute(new StellarParameters(5772, 4.44, 0), Grid).Relative;
        var expected = (int)Math.Round(Grid.Position(vacuum));
        var deepest = Enumerable.Range(expected - 4, 9).MinBy(i => sun[i]);
        Assert.InRange(deepest, expected - 1, expected + 1);
    }

    [Fact]
    public void Balmer_jump_is_large_in_A_stars_and_small_in_O_and_G_stars()
    {
        // D of Chalonge: 0.5 dex at A0, below 0.1 in O stars and near 0.1 or less in G stars (Gray & Corbally 2009); a one-layer
        // continuum is good to 0.12 dex.
        Assert.InRange(Jump(9700, 4.4), 0.38, 0.62);
        Assert.InRange(Jump(42000, 4.1), -0.03, 0.1);
        Assert.InRange(Jump(5772, 4.4), -0.03, 0.12);
    }

    [Fact]
    public void Temperatures_out_of_range_are_refused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => StellarModel.Compute(new StellarParameters(1000, 4, 0), Grid));

    // Continua on both sides are extrapolated to 3700 Å in log F against 1/λ, as Barbier & Chalonge did.
    private static double Jump(double kelvin, double logGravity)
    {
        var c = StellarModel.Compute(new StellarParameters(kelvin, logGravity, 0), Grid).Continuum;
        double Log(double angstrom) => Math.Log10(c[(int)Math.Round(Grid.Position(angstrom))]);
        double Line(double a, double b, double at) => Log(a) + ((Log(b) - Log(a)) * ((1 / at) - (1 / a)) / ((1 / b) - (1 / a)));
        return Line(4200, 4700, 3700) - Line(3300, 3500, 3700);
    }
}
