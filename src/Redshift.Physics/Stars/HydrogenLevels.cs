namespace Redshift.Physics.Stars;

/// <summary>Which levels of hydrogen survive the electric fields of the gas.</summary>
internal static class HydrogenLevels
{
    /// <summary>Level below which none is dissolved, over that of the last line.</summary>
    public const double FirstDissolved = 0.6;

    /// <summary>Last separate line of a series: Inglis &amp; Teller 1939, ApJ 90, 439: log N_e = 23.26 − 7.5 log n_max.</summary>
    public static double LastLine(double electronDensity) => Math.Pow(10, (23.26 - Math.Log10(electronDensity)) / 7.5);

    /// <summary>Share of atoms in which a level (not necessarily whole) still binds its electron.</summary>
    /// <remarks>
    /// Dissolution is gradual (Hummer &amp; Mihalas 1988, ApJ 331, 794): a smooth step from 0.6 to 1.4 of the last line. It ends, as the
    /// tail of dissolved low levels would otherwise outweigh all other opacity in cool stars.
    /// </remarks>
    public static double Survival(double level, double electronDensity)
    {
        var x = Math.Clamp(((level / LastLine(electronDensity)) - FirstDissolved) / 0.8, 0, 1);
        return 1 - (x * x * (3 - (2 * x)));
    }
}
