namespace Redshift.Simulation.Light;

/// <summary>Dimming by dust.</summary>
internal static class Dust
{
    /// <summary>Law of our Galaxy by Cardelli, Clayton and Mathis 1989 (ApJ 345, 245) at R = 3.1: A(λ)/E(B−V), wavelength in Å.</summary>
    public static double Galactic(double wavelength)
    {
        var x = Math.Clamp(1e4 / wavelength, 0.3, 10);
        var (a, b) = x < 1.1 ? Infrared(x) : x < 3.3 ? Optical(x - 1.82) : Ultraviolet(x);
        return (3.1 * a) + b;
    }

    /// <summary>A law without the 2175 Å bump, rising as λ^−1.2 like that of the Small Magellanic Cloud.</summary>
    public static double Steep(double wavelength) => 2.93 * Math.Pow(5500 / wavelength, 1.2);

    /// <summary>Transmission for a law and a colour excess in magnitudes.</summary>
    public static double Transmission(double absorptionPerExcess, double excess) =>
        Math.Exp(-0.4 * 2.302585092994046 * absorptionPerExcess * excess);

    private static (double A, double B) Infrared(double x)
    {
        var power = Math.Pow(x, 1.61);
        return (0.574 * power, -0.527 * power);
    }

    private static (double A, double B) Optical(double y)
    {
        var a = 1 + (y * (0.17699 + (y * (-0.50447 + (y * (-0.02427 + (y * (0.72085 + (y * (0.01979 + (y * (-0.77530 + (y * 0.32999)))))))))))));
        var b = y * (1.41338 + (y * (2.28305 + (y * (1.07233 + (y * (-5.38434 + (y * (-0.62251 + (y * (5.30260 - (y * 2.09002))))))))))));
        return (a, b);
    }

    private static (double A, double B) Ultraviolet(double x)
    {
        var far = Math.Max(0, x - 5.9);
        var fa = (-0.04473 * far * far) - (0.009779 * far * far * far);
        var fb = (0.2130 * far * far) + (0.1207 * far * far * far);
        var a = 1.752 - (0.316 * x) - (0.104 / (((x - 4.67) * (x - 4.67)) + 0.341)) + fa;
        var b = -3.090 + (1.825 * x) + (1.206 / (((x - 4.62) * (x - 4.62)) + 0.263)) + fb;
        return (a, b);
    }
}
