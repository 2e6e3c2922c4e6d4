using Redshift.Physics.Constants;

namespace Redshift.Physics.Frames;

/// <summary>
/// Velocities that catalogues and headers quote for a redshift z. This project reports c z only; the others are for
/// reading and comparing. At z = 0.001 they already differ by 150 m/s.
/// </summary>
/// <remarks>
/// Reference: E. W. Greisen et al., Astron. Astrophys. 446, 747 (2006), section 2 (VOPT, VRAD, VELO). None of these
/// velocities may be added; redshifts compose by the product of 1 + z.
/// </remarks>
public static class VelocityConventions
{
    private const double C = Codata2022.SpeedOfLightKmS;

    /// <summary>Optical velocity c z.</summary>
    /// <param name="z">Redshift.</param>
    /// <returns>km/s.</returns>
    public static double Optical(double z) => C * z;

    /// <summary>Radio velocity, linear in frequency: c z / (1 + z).</summary>
    /// <param name="z">Redshift above -1.</param>
    /// <returns>km/s.</returns>
    public static double Radio(double z) => C * z / (1 + z);

    /// <summary>Velocity of a source receding straight in flat space-time: c ((1+z)^2 - 1) / ((1+z)^2 + 1).</summary>
    /// <param name="z">Redshift above -1.</param>
    /// <returns>km/s.</returns>
    public static double Relativistic(double z)
    {
        double square = z * (2 + z);
        return C * square / (square + 2);
    }

    /// <summary>The shift on a logarithmic wavelength axis: c ln(1 + z).</summary>
    /// <param name="z">Redshift above -1.</param>
    /// <returns>km/s.</returns>
    public static double Logarithmic(double z) => C * double.LogP1(z);

    /// <summary>Redshift of an optical velocity.</summary>
    /// <param name="kmS">Velocity in km/s.</param>
    /// <returns>z.</returns>
    public static double FromOptical(double kmS) => kmS / C;

    /// <summary>Redshift of a radio velocity.</summary>
    /// <param name="kmS">Velocity in km/s, below c.</param>
    /// <returns>z.</returns>
    public static double FromRadio(double kmS) => kmS / (C - kmS);

    /// <summary>Redshift of a relativistic velocity.</summary>
    /// <param name="kmS">Velocity in km/s, between -c and c.</param>
    /// <returns>z.</returns>
    public static double FromRelativistic(double kmS) => Math.Sqrt((C + kmS) / (C - kmS)) - 1;

    /// <summary>Redshift of a shift on a logarithmic wavelength axis.</summary>
    /// <param name="kmS">c ln(1 + z) in km/s.</param>
    /// <returns>z.</returns>
    public static double FromLogarithmic(double kmS) => double.ExpM1(kmS / C);

    /// <summary>The redshift of two shifts one after the other: (1+z) = (1+first)(1+second).</summary>
    /// <param name="first">A redshift above -1.</param>
    /// <param name="second">A redshift above -1.</param>
    /// <returns>z.</returns>
    public static double Compose(double first, double second) => first + second + first * second;
}
