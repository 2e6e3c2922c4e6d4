using System.Globalization;
using Redshift.Physics.Air;

namespace Redshift.Physics.Hydrogen;

/// <summary>The names astronomers give to the lines of hydrogen and ionized helium.</summary>
internal static class HydrogenicNames
{
    private static readonly string[] Prefixes = ["Ly", "H", "Pa", "Br", "Pf", "Hu"];
    private static readonly string[] Greek = ["alpha", "beta", "gamma", "delta", "epsilon"];

    // From the sixth line on a series counts by the upper level: H8 follows H epsilon (7-2).
    public static string OfHydrogen(int upper, int lower)
    {
        if (lower > Prefixes.Length)
            return string.Create(CultureInfo.InvariantCulture, $"H I {upper}-{lower}");
        string prefix = Prefixes[lower - 1];
        int order = upper - lower;
        return order <= Greek.Length
            ? $"{prefix} {Greek[order - 1]}"
            : string.Create(CultureInfo.InvariantCulture, $"{prefix}{upper}");
    }

    public static string ByWavelength(string ion, double vacuumAngstrom)
        => string.Create(CultureInfo.InvariantCulture, $"{ion} {AirRefraction.ToAir(vacuumAngstrom):F0}");
}
