using Redshift.Physics.Stars;
using Redshift.Physics.Units;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// The light of a stellar population as shares of computed stars at 5500 Å: main sequence up to the turn-off of the age and its giants.
/// The greatest redshift is where the Universe is as old as the population (twice that for the oldest, whose spectra change little).
/// Turn-off temperatures follow textbook isochrones; the shares are round numbers (from memory), not fitted to any galaxy.
/// </summary>
internal sealed record StellarMix(string Name, double Metallicity, double GreatestZ, params (double TemperatureK, double LogGravity, double Share)[] Stars)
{
    private const double DispersionKmS = 170;

    public static IReadOnlyList<StellarMix> Ages { get; } =
    [
        new("old", 0.1, 2.0, (5800, 4.4, 0.25), (5000, 4.6, 0.15), (4100, 4.7, 0.05), (4600, 2.5, 0.35), (4000, 1.5, 0.14), (3500, 0.8, 0.06)),
        new("old metal-poor", -0.7, 1.5, (6100, 4.3, 0.35), (5200, 4.6, 0.15), (4900, 2.5, 0.35), (4300, 1.3, 0.15)),
        new("1.5 Gyr", 0, 4.2, (7200, 4.1, 0.60), (6000, 4.4, 0.12), (4800, 2.6, 0.21), (3800, 1.0, 0.07)),
        new("0.6 Gyr", 0, 6.5, (9000, 4.0, 0.74), (7200, 4.2, 0.10), (4800, 2.5, 0.11), (3800, 1.0, 0.05)),
        new("0.2 Gyr", 0, 9, (12500, 4.0, 0.80), (9000, 4.2, 0.10), (4200, 1.5, 0.10)),
        new("0.03 Gyr", 0, 9, (20000, 4.0, 0.80), (10000, 4.2, 0.10), (3800, 0.5, 0.10)),
        new("0.005 Gyr", 0, 9, (35000, 4.0, 0.90), (20000, 4.0, 0.07), (3800, 0.5, 0.03)),
    ];

    /// <summary>F_λ on the template grid, 1 at 5500 Å, broadened by the stars' motions.</summary>
    public float[] Compute(Func<StellarParameters, float[]> star)
    {
        var sum = new float[TemplateGrid.Count];
        foreach (var (temperature, gravity, share) in Stars)
        {
            var flux = star(new StellarParameters(temperature, gravity, Metallicity));
            for (var i = 0; i < sum.Length; i++) sum[i] += (float)share * flux[i];
        }

        return GaussianFilter.Convolve(sum, DispersionKmS / Velocity.SpeedOfLightKmS / TemplateGrid.Step);
    }
}
