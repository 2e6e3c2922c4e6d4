namespace Redshift.Physics.Stars;

/// <summary>Which levels of hydrogen survive the electric fields of the gas.</summary>
internal static class HydrogenLevels
{
    /// <summary>Last separate line of a series: Inglis &amp; Teller 1939, ApJ 90, 439: log N_e = 23.26 − 7.5 log n_max.</summary>
    public static double LastLine(double electronDensity) => Math.Pow(10, (23.26 - Math.Log10(electronDensity)) / 7.5);

    // A smooth step in place of the sharp end, as level dissolution is gradual (Hummer & Mihalas 1988, ApJ 331, 794).
    /// <summary>Share of atoms in which a level (not necessarily whole) still binds its electron.</summary>
    public static double Survival(double level, double electronDensity)
    {
        var ratio = level / LastLine(electronDensity);
        var square = ratio * ratio;
        return 1 / (1 + (square * square * square));
    }
}
