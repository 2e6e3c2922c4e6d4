using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Stars;

/// <summary>Stellar flux per Å between the lines, 1 at 5500 Å.</summary>
internal static class Continuum
{
    // Strength of the blanketing by the crowd of unresolved ultraviolet lines.
    private static readonly Curve Blanketing = new(
        (3500, 1.6), (4000, 1.3), (4500, 1), (5000, 0.7), (5777, 0.42), (6500, 0.25), (7500, 0.12), (9000, 0.04), (12000, 0.01), (20000, 0));

    /// <summary>The law for a star, wavelength in vacuum Å.</summary>
    public static Func<double, double> Law(StarParameters star)
    {
        var norm = Planck(5500, star.Temperature);
        var jump = Balmer.Jump(star);
        var blanketing = Blanketing.At(star.Temperature) * Math.Pow(10, 0.3 * star.Metallicity);
        return wavelength => Planck(wavelength, star.Temperature) / norm * BelowLimit(wavelength, jump) * Veil(wavelength, blanketing);
    }

    private static double Planck(double wavelength, double temperature) =>
        1 / (Math.Pow(wavelength / 5500, 5) * (Math.Exp(1.438777e8 / (wavelength * temperature)) - 1));

    // The merging lines soften the jump over some 60 A.
    private static double BelowLimit(double wavelength, double jump) =>
        jump + ((1 - jump) / (1 + Math.Exp((3690 - wavelength) / 18)));

    // Besides a smooth rise there are steps at 4000 A (the crowd of iron lines), 2900 and 2640 A (magnesium and iron, neutral and ionised).
    private static double Veil(double wavelength, double strength)
    {
        if (wavelength > 4400 || strength == 0)
            return 1;
        var x = (4400 - wavelength) / 1000;
        var steps = (wavelength < 2640 ? 0.7 : 0) + (wavelength < 2900 ? 0.35 : 0) + (0.28 / (1 + Math.Exp((wavelength - 3985) / 8)));
        return Math.Exp(-strength * ((x * x) + steps));
    }
}
