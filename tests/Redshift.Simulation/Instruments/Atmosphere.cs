using Redshift.Simulation.Light;

namespace Redshift.Simulation.Instruments;

/// <summary>Absorption in the Earth's air.</summary>
internal static class Atmosphere
{
    // Vacuum limits in Å, depth scale at the middle, whether the strength follows the water column.
    private static readonly (double From, double To, double Depth, bool Water)[] Bands =
    [
        (5885, 5995, 0.03, true), (6278, 6322, 0.07, false), (6470, 6605, 0.03, true), (6869, 6947, 0.25, false), (7165, 7345, 0.1, true),
        (7596, 7700, 0.75, false), (8105, 8400, 0.08, true), (8920, 9270, 0.15, true), (9270, 9700, 0.4, true), (9700, 9900, 0.1, true),
        (10800, 11100, 0.08, true), (11100, 11700, 0.5, true), (12600, 12760, 0.25, false), (13000, 13420, 0.25, true), (13420, 14200, 3, true), (14200, 14550, 0.8, true),
        (14550, 15000, 0.35, true), (15650, 16150, 0.08, false), (17400, 17900, 0.5, true), (17900, 19300, 5, true), (19300, 20200, 0.35, false),
        (20450, 20700, 0.25, false), (23200, 25000, 0.6, true),
    ];

    /// <summary>Transmission over the grid.</summary>
    /// <param name="grid">Observed wavelengths.</param>
    /// <param name="water">Water column relative to a dry mountain.</param>
    /// <param name="airmass">Airmass.</param>
    public static Canvas Transmission(LogGrid grid, double water, double airmass)
    {
        var canvas = new Canvas(grid).Fill(_ => 1);
        foreach (var band in Bands)
            Absorb(canvas, band.From, band.To, band.Depth * airmass * (band.Water ? water : 1));
        return canvas;
    }

    private static void Absorb(Canvas canvas, double from, double to, double depth)
    {
        var first = Math.Clamp((int)canvas.Grid.Position(from), 0, canvas.Flux.Length);
        var last = Math.Clamp((int)canvas.Grid.Position(to) + 1, first, canvas.Flux.Length);
        for (var i = first; i < last; i++)
        {
            var x = (canvas.Grid.Wavelength[i] - from) / (to - from);
            canvas.Flux[i] *= Math.Exp(-depth * Envelope(x) * Structure(canvas.Grid.Wavelength[i]));
        }
    }

    private static double Envelope(double x) => x is < 0 or > 1 ? 0 : 1.6 * Math.Pow(x * (1 - x) * 4, 0.5);

    // The same comb of lines on every night: three incommensurable waves, narrow peaks.
    private static double Structure(double wavelength)
    {
        var u = 1e8 / wavelength;
        var waves = (Math.Cos(u / 1.7) * Math.Cos(u / 4.3)) + (0.5 * Math.Cos(u / 11.9));
        return 0.5 * (1.2 + waves) * (1.2 + waves);
    }
}
