using System.Numerics;

namespace Redshift.Physics.Air;

/// <summary>
/// Conversion between vacuum wavelengths and wavelengths in standard air: dry, 15 degrees Celsius, 101325 Pa,
/// 450 ppm of carbon dioxide. Wavelengths in angstrom throughout.
/// </summary>
/// <remarks>
/// Reference: P. E. Ciddor, Applied Optics 35, 1566 (1996), equation 1; stated for 0.3 to 1.69 micron and continued
/// beyond. Against the other formulas for 15 degrees it differs by less than 6 m/s from 3000 to 20000 A. The formula
/// printed in the FITS spectral standard (Greisen et al. 2006, equation 65) is for air at 0 degrees and would be
/// 4.6 km/s off.
/// By the convention of spectroscopy, wavelengths below 2000 A are vacuum wavelengths whatever a list or a file says:
/// they pass unchanged both ways. A vacuum wavelength of 2000 A is 1999.353 A in air, and from there on values are
/// taken as air.
/// </remarks>
public static class AirRefraction
{
    /// <summary>The shortest vacuum wavelength, in angstrom, that is ever quoted in air.</summary>
    public const double ShortestVacuumAngstrom = 2000;

    private static readonly double ShortestAirAngstrom = ToAir(ShortestVacuumAngstrom);

    /// <summary>The refractivity n - 1 of standard air.</summary>
    /// <param name="vacuumAngstrom">Vacuum wavelength in angstrom, 2000 or longer.</param>
    /// <returns>n - 1, a pure number near 2.8e-4.</returns>
    public static double Refractivity(double vacuumAngstrom)
    {
        double square = 1e8 / (vacuumAngstrom * vacuumAngstrom);
        return 1e-8 * (5792105 / (238.0185 - square) + 167917 / (57.362 - square));
    }

    /// <summary>Converts a vacuum wavelength to standard air.</summary>
    /// <param name="vacuumAngstrom">Vacuum wavelength in angstrom.</param>
    /// <returns>The air wavelength in angstrom; the vacuum wavelength itself below 2000 A.</returns>
    public static double ToAir(double vacuumAngstrom)
        => vacuumAngstrom < ShortestVacuumAngstrom ? vacuumAngstrom : vacuumAngstrom / (1 + Refractivity(vacuumAngstrom));

    /// <summary>Converts a wavelength in standard air to vacuum, the exact inverse of <see cref="ToAir(double)"/>.</summary>
    /// <param name="airAngstrom">Air wavelength in angstrom.</param>
    /// <returns>The vacuum wavelength in angstrom; the given one itself below 1999.353 A.</returns>
    public static double ToVacuum(double airAngstrom)
        => airAngstrom < ShortestAirAngstrom ? airAngstrom : SolveForVacuum(airAngstrom);

    /// <summary>Converts vacuum wavelengths to standard air.</summary>
    /// <param name="vacuumAngstrom">Vacuum wavelengths in angstrom.</param>
    /// <param name="airAngstrom">Receives the air wavelengths; at least as long, and may be the same memory.</param>
    /// <exception cref="ArgumentException">The destination is too short.</exception>
    public static void ToAir(ReadOnlySpan<double> vacuumAngstrom, Span<double> airAngstrom)
    {
        RequireRoom(vacuumAngstrom, airAngstrom);
        for (int i = 0; i < vacuumAngstrom.Length; i++)
            airAngstrom[i] = ToAir(vacuumAngstrom[i]);
    }

    /// <summary>Converts wavelengths in standard air to vacuum.</summary>
    /// <param name="airAngstrom">Air wavelengths in angstrom.</param>
    /// <param name="vacuumAngstrom">Receives the vacuum wavelengths; at least as long, and may be the same memory.</param>
    /// <exception cref="ArgumentException">The destination is too short.</exception>
    public static void ToVacuum(ReadOnlySpan<double> airAngstrom, Span<double> vacuumAngstrom)
    {
        RequireRoom(airAngstrom, vacuumAngstrom);
        int i = 0;
        for (; i <= airAngstrom.Length - Vector<double>.Count; i += Vector<double>.Count)
            ToVacuum(new Vector<double>(airAngstrom[i..])).CopyTo(vacuumAngstrom[i..]);
        for (; i < airAngstrom.Length; i++)
            vacuumAngstrom[i] = ToVacuum(airAngstrom[i]);
    }

    // The refractivity is a function of the vacuum wavelength, the unknown. A round shrinks the error by a factor of
    // 1e4 or more, from 3e-4 at the start to 1e-17 after the last of them.
    private static double SolveForVacuum(double airAngstrom)
    {
        double vacuum = airAngstrom * (1 + Refractivity(airAngstrom));
        vacuum = airAngstrom * (1 + Refractivity(vacuum));
        return airAngstrom * (1 + Refractivity(vacuum));
    }

    // The same operations in the same order as for one value, so that the results agree to the last bit.
    private static Vector<double> ToVacuum(Vector<double> air)
    {
        Vector<double> vacuum = air * (Vector<double>.One + Refractivity(air));
        vacuum = air * (Vector<double>.One + Refractivity(vacuum));
        vacuum = air * (Vector<double>.One + Refractivity(vacuum));
        return Vector.ConditionalSelect(Vector.LessThan(air, new Vector<double>(ShortestAirAngstrom)), air, vacuum);
    }

    private static Vector<double> Refractivity(Vector<double> vacuum)
    {
        Vector<double> square = new Vector<double>(1e8) / (vacuum * vacuum);
        return new Vector<double>(1e-8)
            * (new Vector<double>(5792105) / (new Vector<double>(238.0185) - square)
                + new Vector<double>(167917) / (new Vector<double>(57.362) - square));
    }

    private static void RequireRoom(ReadOnlySpan<double> source, Span<double> destination)
    {
        if (destination.Length < source.Length)
            throw new ArgumentException($"{source.Length} wavelengths do not fit into {destination.Length} places.", nameof(destination));
    }
}
