namespace Redshift.Simulation.Sources.Quasars;

/// <summary>A permitted or semi-forbidden line of the broad-line region.</summary>
/// <param name="Vacuum">Vacuum wavelength, Å.</param>
/// <param name="Width">Rest equivalent width of the mean quasar, Å (Vanden Berk et al. 2001, AJ 122, 549; the infrared after Glikman et al. 2006, ApJ 640, 579).</param>
/// <param name="Breadth">Velocity width relative to Hβ.</param>
/// <param name="Ionisation">0 for lines at the systemic velocity, 1 for those blueshifted like C IV.</param>
internal sealed record BroadLine(double Vacuum, double Width, double Breadth, double Ionisation)
{
    public static IReadOnlyList<BroadLine> All { get; } =
    [
        new(977.02, 4, 1.1, 0.7), new(1033.6, 9, 1.1, 0.8), new(1175.7, 1.5, 1.1, 0.3), new(1215.67, 75, 1, 0.4), new(1240.14, 17, 1.15, 0.6),
        new(1262.6, 3, 1, 0.2), new(1304.4, 2.4, 0.9, 0.1), new(1335.3, 0.9, 0.9, 0.1), new(1398.3, 9, 1.15, 0.7), new(1549.06, 28, 1.1, 1),
        new(1640.42, 5, 1.5, 1), new(1663.5, 1.8, 1, 0.5), new(1740, 1, 1.2, 0.3), new(1857.5, 2.5, 1, 0.3), new(1892.03, 3, 0.9, 0.1),
        new(1908.73, 19, 1, 0.2), new(2326.5, 2, 0.9, 0), new(2423.8, 2, 0.8, 0.2), new(2799.1, 31, 0.85, 0),
        new(3890, 1, 1, 0), new(3971.2, 2.5, 1, 0), new(4102.89, 6, 1, 0), new(4341.68, 14, 1, 0), new(4687, 4, 1.5, 0.4), new(4862.68, 45, 1, 0),
        new(5877.2, 6, 1, 0), new(6564.61, 190, 0.9, 0), new(7067.1, 2, 1, 0), new(8448.7, 12, 0.8, 0), new(8570, 8, 1.6, 0), new(9231.5, 4, 0.9, 0), new(9550, 6, 0.9, 0),
        new(10052, 6, 0.9, 0), new(10833, 38, 0.9, 0.1), new(10941, 14, 0.9, 0), new(12821.6, 24, 0.9, 0), new(18756, 35, 0.9, 0),
    ];
}
