namespace Redshift.Physics.Recombination;

/// <summary>
/// Strengths of the hydrogen lines of an ionized nebula relative to H beta: recombination at low density, Lyman lines
/// trapped (case B).
/// </summary>
/// <remarks>
/// The numbers follow from hydrogen alone (see <see cref="CaseBTable"/>). At 100 electrons per cm^3 they agree with
/// P. J. Storey and D. G. Hummer, Mon. Not. R. Astron. Soc. 272, 41 (1995), within 0.5 %; at 10000 per cm^3 H alpha is
/// 0.6 % (10000 K) to 1.3 % (5000 K) weaker.
/// </remarks>
public static class CaseB
{
    /// <summary>The lowest electron temperature tabulated, in kelvin.</summary>
    public const double LowestTemperature = 5000;

    /// <summary>The highest electron temperature tabulated, in kelvin.</summary>
    public const double HighestTemperature = 20000;

    /// <summary>The highest upper shell tabulated.</summary>
    public const int HighestUpper = 25;

    /// <summary>Energy in a line over the energy in H beta.</summary>
    /// <param name="upper">Principal quantum number of the upper shell, at most 25.</param>
    /// <param name="lower">Principal quantum number of the lower shell: 2, 3 or 4.</param>
    /// <param name="temperature">Electron temperature in kelvin, 5000 to 20000.</param>
    /// <returns>The ratio, 1 for H beta.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The line or the temperature is outside the table.</exception>
    public static double RelativeIntensity(int upper, int lower, double temperature = 10000)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(lower, 2);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(lower, 4);
        ArgumentOutOfRangeException.ThrowIfLessThanOrEqual(upper, lower);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(upper, HighestUpper);
        if (!(temperature >= LowestTemperature && temperature <= HighestTemperature))
            throw new ArgumentOutOfRangeException(nameof(temperature), temperature, "Case B is tabulated from 5000 to 20000 K.");
        return Interpolate(CaseBTable.Row(upper, lower), Math.Log2(temperature / 10000));
    }

    // The parabola through the three temperatures in the logarithms of both, good to 0.1 %; octaves runs from -1 to 1.
    private static double Interpolate(ReadOnlySpan<double> row, double octaves)
    {
        double cool = Math.Log(row[0] / row[1]);
        double hot = Math.Log(row[2] / row[1]);
        return row[1] * Math.Exp(octaves * ((hot - cool) + octaves * (hot + cool)) / 2);
    }
}
