using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Stars;

/// <summary>Hydrogen absorption of stars.</summary>
internal static class Balmer
{
    /// <summary>Vacuum wavelengths of the Balmer lines from Hα on, Å.</summary>
    public static IReadOnlyList<double> Wavelengths { get; } = Series(2, 3, 16);

    /// <summary>Vacuum wavelengths of the Paschen lines from Paα on, Å.</summary>
    public static IReadOnlyList<double> PaschenWavelengths { get; } = Series(3, 4, 18);

    /// <summary>Vacuum wavelengths of the Lyman lines from Lyα on, Å.</summary>
    public static IReadOnlyList<double> LymanWavelengths { get; } = Series(1, 2, 12);

    // Equivalent width of Hγ in dwarfs against temperature, from published wide-band widths of library stars with the metal lines taken off.
    private static readonly Curve DwarfWidth = new(
        (3000, 0.2), (4000, 0.5), (4500, 0.8), (5000, 1.3), (5777, 2.6), (6200, 3.8), (6600, 5.5), (7000, 8.5), (7400, 11.5), (8100, 15), (9000, 17),
        (9900, 16.5), (11500, 13.5), (13500, 11), (17000, 8.5), (22000, 6.2), (28000, 4), (33000, 3.2), (45000, 2.2));

    private static readonly double[] RelativeWidth = [0.72, 0.78, 1, 1, 0.9, 0.8, 0.66, 0.5, 0.36, 0.25, 0.17, 0.11, 0.07, 0.05];

    /// <summary>Draws the Balmer and Paschen lines.</summary>
    public static void Absorb(Canvas canvas, StarParameters star, double scale)
    {
        var width = DwarfWidth.At(star.Temperature) * scale * (1 - (star.Temperature > 7500 ? 0.45 * Math.Min(1, star.Giantness) : 0));
        var deepest = star.Temperature > 15000 ? 0.5 : star.Temperature > 6800 ? 0.72 : 0.8;
        for (var i = 0; i < RelativeWidth.Length; i++)
            canvas.Absorb(Wavelengths[i], 120, width * RelativeWidth[i], deepest * Math.Pow(0.96, i), Profile.Stark);
        for (var i = 0; i < RelativeWidth.Length; i++)
            canvas.Absorb(PaschenWavelengths[i], 120, 0.5 * width * RelativeWidth[i], 0.35, Profile.Stark);
    }

    /// <summary>Flux below the Balmer limit relative to that above it.</summary>
    public static double Jump(StarParameters star) =>
        new Curve((5500, 0.97), (6500, 0.8), (7500, 0.55), (9000, 0.4), (10500, 0.42), (13000, 0.58), (18000, 0.75), (25000, 0.88), (35000, 0.97))
            .At(star.Temperature);

    // R_H with CODATA 2018 minus the mean fine-structure shift of 3.2 km/s at the lower levels.
    private static double[] Series(int lower, int first, int last)
    {
        const double Rydberg = 10967758.3402803e-10 * (1 + 1.1e-5);
        return [.. from n in Enumerable.Range(first, last - first + 1) select 1 / (Rydberg * ((1.0 / (lower * lower)) - (1.0 / (n * n))))];
    }
}
