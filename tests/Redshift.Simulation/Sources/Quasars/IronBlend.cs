using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Quasars;

/// <summary>The crowd of Fe II lines that quasars add to their continuum.</summary>
internal static class IronBlend
{
    // Optical multiplets 27, 28, 37, 38, 42, 48, 49, 55, 74 of Fe II, air Å.
    private static readonly double[] Optical =
    [
        4128.7, 4173.5, 4178.9, 4233.2, 4258.2, 4273.3, 4296.6, 4303.2, 4351.8, 4385.4, 4416.8, 4472.9, 4489.2, 4491.4, 4508.3, 4515.3, 4520.2, 4522.6, 4541.5, 4549.5, 4555.9,
        4576.3, 4582.8, 4583.8, 4620.5, 4629.3, 4666.8, 4731.4, 4923.9, 5018.4, 5169, 5197.6, 5234.6, 5254.9, 5264.8, 5276, 5284.1, 5316.6, 5325.6, 5362.9, 5414.1, 5425.3, 5534.8,
        6147.7, 6238.4, 6247.6, 6416.9, 6456.4,
    ];

    // Ranges of the ultraviolet multiplets with their share of the flux, vacuum Å.
    private static readonly (double From, double To, double Share)[] Ultraviolet =
    [
        (1770, 1800, 0.04), (2040, 2110, 0.06), (2220, 2320, 0.1), (2320, 2430, 0.18), (2430, 2560, 0.22), (2560, 2660, 0.16), (2690, 2780, 0.08), (2830, 2900, 0.07), (2920, 3010, 0.06), (3130, 3290, 0.05),
    ];

    private static readonly (double Vacuum, double Share)[] Lines = [.. Draw(new(4923))];

    /// <summary>Adds the blend; the strengths are equivalent widths in Å of all its ultraviolet and all its optical lines.</summary>
    public static void Emit(Canvas canvas, double ultraviolet, double optical, double sigmaKmS)
    {
        // Narrow lines widened all at once: the same as broad ones, at a fraction of the cost.
        var iron = new Canvas(canvas.Grid);
        foreach (var (vacuum, share) in Lines)
            iron.Emit(vacuum, 0, share * (vacuum < 3500 ? ultraviolet : optical) * (canvas.At(vacuum) ?? 0));
        canvas.Add(iron.Broaden(sigmaKmS), 1);
    }

    private static IEnumerable<(double Vacuum, double Share)> Draw(RandomSource nature)
    {
        foreach (var air in Optical)
            yield return (Air.ToVacuum(air), nature.Scatter(0.6) / Optical.Length);
        foreach (var (from, to, share) in Ultraviolet)
        {
            for (var i = 0; i < 12; i++)
                yield return (nature.Uniform(from, to), share * nature.Exponential(1) / 12);
        }
    }
}
