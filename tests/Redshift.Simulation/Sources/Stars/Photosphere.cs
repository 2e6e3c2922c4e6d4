using Redshift.Physics.Statistics;
using Redshift.Simulation.Atoms;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Stars;

/// <summary>The spectrum of an ordinary star: continuum, metal lines, strong lines, hydrogen, helium, molecules.</summary>
internal static class Photosphere
{
    // Total widths in dwarfs, index bands widened to the full wings (K18 of library stars: 0.9 at A0, 4.7 at F0, 8.3 at G2).
    private static readonly Curve CalciumK = new(
        (2800, 11), (3500, 13), (4400, 15.5), (5200, 15), (5777, 13.5), (6550, 9), (7200, 6.2), (8100, 3.2), (9700, 0.9), (11500, 0.25), (15000, 0.05), (20000, 0));

    private static readonly Curve SodiumD = new((2800, 11), (3300, 9.5), (3850, 10), (4400, 9), (5100, 3), (5777, 0.5), (6500, 0.2), (8000, 0));

    private static readonly Curve CalciumTriplet = new((2800, 3.6), (3500, 5.5), (4500, 7), (5777, 6.5), (6500, 5.5), (8000, 3), (10000, 1), (13000, 0));

    /// <summary>Draws a star on the rest-frame grid, 1 at 5500 Å in the continuum.</summary>
    public static Canvas Draw(LogGrid grid, StarParameters star, RandomSource random)
    {
        var canvas = new Canvas(grid).Fill(Continuum.Law(star));
        DrawMetals(canvas, star, random);
        DrawStrongLines(canvas, star, random);
        DrawHotLines(canvas, star, random);
        Molecules.Absorb(canvas, star, random);
        Balmer.Absorb(canvas, star, random.Scatter(0.08));
        return canvas;
    }

    private static void DrawMetals(Canvas canvas, StarParameters star, RandomSource random)
    {
        if (star.Temperature > 15000)
            return;
        var strength = new MetalStrength(star, random);
        var width = IntrinsicWidth(star);
        foreach (var line in MetalLine.Between(canvas.Grid.Wavelength[0] * 0.999, canvas.Grid.Wavelength[^1] * 1.001))
            canvas.Absorb(line.Vacuum, width, line.SolarWidth * strength.Of(line.Species) * random.Scatter(0.15));
    }

    private static void DrawHotLines(Canvas canvas, StarParameters star, RandomSource random)
    {
        if (star.Temperature < 6500)
            return;
        var width = Math.Max(25, IntrinsicWidth(star));
        foreach (var line in HotLine.All.Where(line => line.Vacuum > 3000))
            canvas.Absorb(line.Vacuum, width, line.WidthAt(star.Temperature) * random.Scatter(0.2), 0.6);
    }

    private static void DrawStrongLines(Canvas canvas, StarParameters star, RandomSource random)
    {
        var metals = Math.Pow(10, 0.3 * star.Metallicity);
        var k = CalciumK.At(star.Temperature) * metals * random.Scatter(0.08);
        AbsorbWinged(canvas, 3934.777, k, 0.93);
        AbsorbWinged(canvas, 3969.591, 0.75 * k, 0.92);
        var sodium = SodiumD.At(star.Temperature) * metals * (1 - (0.55 * Math.Min(1, star.Giantness))) * random.Scatter(0.15);
        AbsorbWinged(canvas, 5891.583, 0.55 * sodium, 0.85);
        AbsorbWinged(canvas, 5897.558, 0.45 * sodium, 0.85);
        var triplet = CalciumTriplet.At(star.Temperature) * metals * (1 + (0.35 * star.Giantness)) * random.Scatter(0.1);
        foreach (var (wavelength, share) in ((double, double)[])[(8500.355, 0.19), (8544.437, 0.46), (8664.519, 0.35)])
            AbsorbWinged(canvas, wavelength, share * triplet, 0.6);
    }

    private static void AbsorbWinged(Canvas canvas, double wavelength, double equivalentWidth, double deepest)
    {
        canvas.Absorb(wavelength, 20, 0.45 * equivalentWidth, 0.75 * deepest);
        canvas.Absorb(wavelength, 20, 0.55 * equivalentWidth, 0.8 * deepest, Profile.Lorentzian);
    }

    // Thermal and turbulent motion, and rotation as a Gaussian of equal variance.
    private static double IntrinsicWidth(StarParameters star) =>
        Math.Sqrt(16 + (0.22 * star.RotationKmS * star.RotationKmS));
}
