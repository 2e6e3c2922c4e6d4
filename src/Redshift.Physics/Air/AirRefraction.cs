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

    // The step shrinks by a factor of some 1e5 a round, so that this is reached after three or four.
    private const double Convergence = 1e-14;

    private static readonly double ShortestAirAngstrom = ToAir(ShortestVacuumAngstrom);

    /// <summary>The refractivity n - 1 of standard air.</summary>
    /// <param name="vacuumAngstrom">Vacuum wavelength in angstrom, 2000 or longer.</param>
    /// <returns>n - 1, a pure number near 2.8e-4.</returns>
    public static double Refractivity(double vacuumAngstrom)
    {
        double waveNumber = 1e4 / vacuumAngstrom;
        double square = waveNumber * waveNumber;
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
        for (int i = 0; i < airAngstrom.Length; i++)
            vacuumAngstrom[i] = ToVacuum(airAngstrom[i]);
    }

    // The refractivity is a function of the vacuum wavelength, the unknown.
    private static double SolveForVacuum(double airAngstrom)
    {
        double vacuum = airAngstrom;
        double previous;
        do
        {
            previous = vacuum;
            vacuum = airAngstrom * (1 + Refractivity(vacuum));
        }
        while (Math.Abs(vacuum - previous) > Convergence * vacuum);
        return vacuum;
    }

    private static void RequireRoom(ReadOnlySpan<double> source, Span<double> destination)
    {
        if (destination.Length < source.Length)
            throw new ArgumentException($"{source.Length} wavelengths do not fit into {destination.Length} places.", nameof(destination));
    }
}
