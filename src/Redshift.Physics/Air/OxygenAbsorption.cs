namespace Redshift.Physics.Air;

/// <summary>
/// The red bands of molecular oxygen in the Earth's atmosphere, computed line by line: rotational levels of both electronic states, Boltzmann
/// populations, Lorentz lines, the oxygen of one vertical atmosphere. Molecular constants after Huber &amp; Herzberg 1979, Constants of Diatomic
/// Molecules; band strengths and widths of the HITRAN compilation; all from memory, rounded.
/// </summary>
public static class OxygenAbsorption
{
    /// <summary>Rotational constant of the ground state, cm⁻¹.</summary>
    private const double LowerRotation = 1.4377;

    /// <summary>Distance of the two lines of a pair from their middle, cm⁻¹: the spins' coupling to the rotation.</summary>
    private const double HalfSplitting = 0.95;

    /// <summary>Half width at half maximum of the lines at the pressure where most of the air is, cm⁻¹.</summary>
    private const double HalfWidth = 0.03;

    /// <summary>Molecules above a square centimetre at sea level: 0.2095 of an air column of 2.15e25.</summary>
    private const double Column = 4.5e24;

    /// <summary>Temperature of most of the air, K, and hc/k in cm K.</summary>
    private const double TemperatureK = 255;
    private const double SecondRadiation = 1.4388;

    /// <summary>Highest level that counts; only odd levels exist, as both nuclei are alike and have no spin.</summary>
    private const int HighestLevel = 45;

    /// <summary>Beyond this distance from its middle, cm⁻¹, a line is not summed.</summary>
    private const double Reach = 12;

    /// <summary>
    /// The bands γ, B, A and the infrared one: origin in cm⁻¹, rotational constant of the upper state in cm⁻¹, strength of all lines together in
    /// cm a molecule.
    /// </summary>
    private static readonly (double Origin, double UpperRotation, double Strength)[] Bands =
    [
        (15903.7, 1.3545, 8e-25), (14527.0, 1.3730, 1.5e-23), (13122.2, 1.3912, 2.3e-22), (7883.8, 1.4180, 3e-24),
    ];

    /// <summary>The lines, by rising wavenumber in cm⁻¹, with their integrated optical depth in cm⁻¹ at the zenith.</summary>
    public static IReadOnlyList<(double Wavenumber, double Depth)> Lines { get; } = [.. Bands.SelectMany(b => LinesOf(b.Origin, b.UpperRotation, b.Strength)).Order()];

    private static readonly double[] Wavenumbers = [.. Lines.Select(l => l.Wavenumber)];

    /// <summary>Optical depth of the vertical atmosphere.</summary>
    /// <param name="wavenumber">Vacuum wavenumber, cm⁻¹.</param>
    public static double Depth(double wavenumber)
    {
        double depth = 0;
        for (var i = FirstAbove(wavenumber - Reach); i < Lines.Count && Lines[i].Wavenumber < wavenumber + Reach; i++)
        {
            var distance = wavenumber - Lines[i].Wavenumber;
            depth += Lines[i].Depth * HalfWidth / Math.PI / (distance * distance + HalfWidth * HalfWidth);
        }

        return depth;
    }

    private static int FirstAbove(double wavenumber)
    {
        var at = Array.BinarySearch(Wavenumbers, wavenumber);
        return at < 0 ? ~at : at;
    }

    /// <summary>Both branches: the molecule leaves level N for N − 1 or N + 1, each as a pair of lines.</summary>
    private static IEnumerable<(double Wavenumber, double Depth)> LinesOf(double origin, double upperRotation, double strength)
    {
        var levels = Enumerable.Range(0, (HighestLevel + 1) / 2).Select(i => 2 * i + 1).ToList();
        double Population(int n) => (2 * n + 1) * Math.Exp(-SecondRadiation * LowerRotation * n * (n + 1) / TemperatureK);
        var scale = strength * Column / levels.Sum(Population);
        foreach (var n in levels)
        {
            var lower = LowerRotation * n * (n + 1);
            double down = origin + upperRotation * n * (n - 1) - lower, up = origin + upperRotation * (n + 1) * (n + 2) - lower;
            double each = 0.5 * scale * Population(n) / (2 * n + 1);
            foreach (var side in (int[])[-1, 1])
            {
                yield return (down + side * HalfSplitting, each * n);
                yield return (up + side * HalfSplitting, each * (n + 1));
            }
        }
    }
}
