namespace Redshift.Physics.Stars;

/// <summary>The stars of the standard grid.</summary>
internal static class StandardStars
{
    private static readonly double[] Dwarfs =
    [
        48000, 42000, 36500, 33000, 30000, 27000, 24000, 21000, 18500, 16500, 14500, 13000, 11800, 10700, 9800, 9200, 8700, 8200, 7800,
        7400, 7050, 6700, 6400, 6150, 5900, 5700, 5450, 5200, 4950, 4700, 4450, 4250, 4050, 3900, 3750, 3600, 3450, 3300, 3150, 3000, 2850,
        2650, 2450,
    ];

    private static readonly double[] Giants =
        [20000, 13000, 9500, 7500, 6500, 5600, 5200, 4900, 4600, 4300, 4000, 3800, 3600, 3400, 3200, 2950];

    private static readonly double[] PoorDwarfs = [8000, 7000, 6400, 6000, 5600, 5200];
    private static readonly double[] PoorGiants = [5400, 4900, 4500];
    private static readonly double[] HydrogenDwarfs = [60000, 40000, 30000, 24000, 19000, 15000, 12000, 10000, 8500, 7200];

    public static IReadOnlyList<StellarParameters> List() =>
    [
        .. Dwarfs.Select(t => new StellarParameters(t, t > 12000 ? 4.1 : t > 4000 ? 4.4 : 4.9, 0)),
        .. Giants.Select(t => new StellarParameters(t, GiantGravity(t), 0)),
        .. PoorDwarfs.Select(t => new StellarParameters(t, 4.3, -1.3)),
        .. PoorGiants.Select(t => new StellarParameters(t, GiantGravity(t), -1.3)),
        .. HydrogenDwarfs.Select(t => new StellarParameters(t, 8, 0, StellarVariant.WhiteDwarfDA)),
        .. ((double[])[25000, 17000]).Select(t => new StellarParameters(t, 8, 0, StellarVariant.WhiteDwarfDB)),
        .. ((double[])[22000, 13000]).Select(t => new StellarParameters(t, 4, 0, StellarVariant.EmissionLine)),
        .. ((double[])[3400, 3000]).Select(t => new StellarParameters(t, 4.9, 0, StellarVariant.ActiveM)),
        .. ((double[])[4200, 3000]).Select(t => new StellarParameters(t, 1, 0, StellarVariant.Carbon)),
    ];

    // Red giants climb in luminosity as they cool; hotter stars of low gravity are supergiants.
    private static double GiantGravity(double kelvin) => kelvin > 6000 ? 2.0 : Math.Clamp(2.8 + ((kelvin - 5000) / 700), 0.3, 3.0);
}
