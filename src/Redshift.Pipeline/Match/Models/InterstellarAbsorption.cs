using Redshift.Physics.Units;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// Absorption by the gas of a star-forming galaxy: saturated resonance lines of Morton 2003 (ApJS 149, 205), with the rest equivalent
/// widths that stacks of z ≈ 3 galaxies show (rounded, from memory), outflowing at 150 km/s; and a damped Lyman alpha line.
/// </summary>
internal static class InterstellarAbsorption
{
    private const double SigmaKmS = 230;
    private const double OutflowKmS = -150;
    private const double KmSPerLn = Velocity.SpeedOfLightKmS;

    /// <summary>Rest wavelengths in vacuum, and rest equivalent widths, both in Å.</summary>
    public static IReadOnlyList<(double RestA, double EquivalentWidthA)> Lines { get; } =
    [
        (1025.722, 2.0), (1031.926, 1.0), (1036.337, 1.5), (1190.416, 0.9), (1193.290, 1.0), (1206.500, 1.5),
        (1260.422, 1.6), (1302.169, 1.3), (1304.370, 1.2), (1334.532, 1.7), (1393.760, 1.2), (1402.773, 0.8),
        (1526.707, 1.7), (1547.6, 1.7), (1550.3, 1.3), (1608.451, 0.9), (1670.789, 1.5), (1854.718, 0.7), (1862.791, 0.5),
        (2344.213, 1.8), (2374.460, 1.4), (2382.764, 2.1), (2586.650, 2.0), (2600.173, 2.3), (2796.354, 2.3), (2803.532, 2.1), (2852.964, 0.8),
    ];

    /// <summary>Multiplies a spectrum on the template grid by the gas's transmission.</summary>
    /// <param name="flux">The spectrum, changed in place.</param>
    /// <param name="strength">1 for the listed equivalent widths.</param>
    /// <param name="lymanColumn">Column density of the Lyman alpha absorber in 1e20 cm⁻², 0 for none.</param>
    public static void Apply(float[] flux, double strength, double lymanColumn)
    {
        foreach (var (rest, width) in Lines) Absorb(flux, Math.Log(rest * (1 + OutflowKmS / KmSPerLn)), strength * width / rest);
        if (lymanColumn > 0) Damp(flux, lymanColumn);
    }

    private static void Absorb(float[] flux, double centre, double widthLn)
    {
        const double Sigma = SigmaKmS / KmSPerLn;
        var depth = Math.Min(0.85, widthLn / (Sigma * Math.Sqrt(2 * Math.PI)));
        var reach = (int)(4 * Sigma / TemplateGrid.Step);
        var middle = (int)Math.Round((centre - TemplateGrid.LnStart) / TemplateGrid.Step);
        for (var i = Math.Max(0, middle - reach); i < Math.Min(flux.Length, middle + reach); i++)
        {
            var u = (i - middle) * TemplateGrid.Step / Sigma;
            flux[i] *= (float)(1 - depth * Math.Exp(-0.5 * u * u));
        }
    }

    /// <summary>Damping wings: τ = 4.26·N₂₀·(Δλ/Å)⁻² (from f = 0.4164 and A = 6.265e8 s⁻¹; Draine 2011, Physics of the ISM, §6.4).</summary>
    private static void Damp(float[] flux, double column)
    {
        for (var i = 0; i < flux.Length; i++)
        {
            var wavelength = TemplateGrid.Wavelength(i);
            var distance = wavelength - 1215.67;
            if (Math.Abs(distance) > 120) continue;
            flux[i] *= (float)Math.Exp(-4.26 * column / Math.Max(distance * distance, 0.04));
        }
    }
}
