using Redshift.Physics.Air;
using Redshift.Physics.Indices;
using Redshift.Physics.Stars;
using Xunit;

namespace Redshift.Physics.Tests.Stars;

/// <summary>
/// Trends of published indices along the sequence of types. The values to meet were measured on the library of Pickles 1998, PASP 110,
/// 863 (5 Å sampling, types mixed by one subclass or so); a one-layer model with no fit to spectra is asked to keep to them within the
/// ranges stated here.
/// </summary>
public sealed class StellarIndexTests
{
    private const double LibraryFwhmKms = 600;
    private static readonly LogWavelengthGrid Grid = LogWavelengthGrid.Covering(3000, 10000, 23);
    private static readonly double[] Air = [.. Enumerable.Range(0, Grid.Count).Select(i => AirRefraction.ToAir(Grid.Wavelength(i)))];

    [Fact]
    public void Balmer_lines_are_strongest_in_A_stars()
    {
        // Wide H beta: 5.4 (B0), 17.4 (A0), 17.1 (A5), 12.8 (F0), 5.7 (F5) Å.
        double[] kelvins = [31400, 20600, 13000, 10700, 9700, 8800, 8080, 7220, 6550];
        var widths = kelvins.ToDictionary(t => t, t => WideHBeta(Flux(t, t > 12000 ? 4.1 : 4.4)));
        Assert.InRange(kelvins.MaxBy(t => widths[t]), 8080, 10700);
        Assert.InRange(widths[31400], 3.5, 7.5);
        Assert.InRange(widths[9700], 14, 22);
        Assert.InRange(widths[8080], 14, 22);
        Assert.InRange(widths[7220], 9, 14.5);
        Assert.InRange(widths[6550], 4, 8.5);
    }

    [Fact]
    public void Magnesium_and_sodium_grow_from_F_to_K()
    {
        double[] kelvins = [6550, 5770, 5270, 4700];
        var magnesium = kelvins.Select(t => Index("Mgb", Flux(t, 4.4))).ToArray();
        var sodium = kelvins.Select(t => Index("NaD", Flux(t, 4.4))).ToArray();
        Assert.Equal(magnesium.Order(), magnesium);
        Assert.Equal(sodium.Order(), sodium);
        Assert.InRange(magnesium[0], 0.7, 1.5); // F5V 1.14 Å
        Assert.InRange(magnesium[1], 2.0, 3.2); // G2V 3.10, G0V 2.22 Å
        Assert.InRange(magnesium[3], 4.2, 6.3); // K2V 4.21, K4V 6.12 Å
        Assert.InRange(sodium[1], 0.7, 1.8); // G2V 1.32 Å
        Assert.InRange(sodium[3], 3.3, 6.8); // K2V 3.27, K4V 6.72 Å
    }

    [Fact]
    public void G_band_appears_in_F_stars_and_stays_strong_in_G_stars()
    {
        Assert.InRange(Index("G4300", Flux(7220, 4.4)), -1.2, 0.6); // F0V −0.73 Å
        Assert.InRange(Index("G4300", Flux(5770, 4.4)), 4.3, 6.0); // G2V 5.29, G5V 4.62 Å
        Assert.InRange(Index("G4300", Flux(5270, 4.4)), 4.0, 6.2); // K0V 4.03, G8V 5.84 Å
    }

    [Theory]
    [InlineData(9700, 4.4, 1.08, 1.25)] // A0V 1.19
    [InlineData(5770, 4.4, 1.45, 1.80)] // G2V 1.73
    [InlineData(4800, 2.6, 1.75, 2.60)] // K0III 2.59
    public void Four_thousand_break_grows_with_type(double kelvin, double logGravity, double low, double high) =>
        Assert.InRange(SpectralIndices.Dn4000.Measure(Air, Flux(kelvin, logGravity))!.Value, low, high);

    // TiO5 by the relation of Reid, Hawley & Gizis 1995, AJ 110, 1838 (type = 8.2 − 10.775 TiO5), and as measured on the library, which
    // differ by more than a type; temperatures of Pecaut & Mamajek 2013, ApJS 208, 9. The model is asked to lie between, within 0.06.
    [Theory]
    [InlineData(3550, 0.575, 0.744)] // M2
    [InlineData(3400, 0.483, 0.573)] // M3
    [InlineData(3200, 0.390, 0.481)] // M4
    [InlineData(3050, 0.297, 0.592)] // M5
    public void TiO5_falls_along_the_M_dwarfs(double kelvin, double relation, double library) =>
        Assert.InRange(SpectralIndices.TiO5.Measure(Air, Flux(kelvin, 4.9))!.Value, relation - 0.06, library + 0.06);

    [Fact]
    public void The_Sun_shows_no_TiO() =>
        Assert.InRange(SpectralIndices.TiO5.Measure(Air, Flux(5770, 4.4))!.Value, 0.95, 1.02);

    private static double Index(string name, double[] flux) => SpectralIndices.Lines.First(i => i.Name == name).Measure(Air, flux)!.Value;

    // The flux at the resolution of the library.
    private static double[] Flux(double kelvin, double logGravity)
    {
        var star = StellarModel.Compute(new StellarParameters(kelvin, logGravity, 0), Grid);
        var sigma = LibraryFwhmKms / 2.3548 / 299792.458 / Grid.LnStep;
        return Smooth([.. star.Relative.Select((r, i) => (double)r * star.Continuum[i])], sigma);
    }

    private static double[] Smooth(double[] values, double sigma)
    {
        var reach = (int)(4 * sigma);
        var kernel = Enumerable.Range(-reach, (2 * reach) + 1).Select(k => Math.Exp(-0.5 * k * k / (sigma * sigma))).ToArray();
        var norm = kernel.Sum();
        double At(int i) => kernel.Select((w, k) => w * values[Math.Clamp(i + k - reach, 0, values.Length - 1)]).Sum() / norm;
        return [.. Enumerable.Range(0, values.Length).Select(At)];
    }

    // Equivalent width over 4790–4935 Å against side bands of 25 Å.
    private static double WideHBeta(double[] flux)
    {
        var (blue, red) = (Mean(flux, 4765, 4790), Mean(flux, 4935, 4960));
        double Continuum(double air) => blue + ((red - blue) * (air - 4777.5) / 170);
        return Pixels(4790, 4935).Sum(i => (1 - (flux[i] / Continuum(Air[i]))) * (Air[i + 1] - Air[i]));
    }

    private static double Mean(double[] flux, double from, double to) => Pixels(from, to).Average(i => flux[i]);

    private static IEnumerable<int> Pixels(double from, double to) =>
        Enumerable.Range(0, Air.Length).Where(i => Air[i] > from && Air[i] < to);
}
