namespace Redshift.Physics.Hydrogen;

/// <summary>
/// The Bethe logarithm ln k0(n, l) of the leading self energy.
/// Reference: G. W. F. Drake and R. A. Swainson, Phys. Rev. A 41, 1243 (1990).
/// </summary>
internal static class BetheLogarithm
{
    private static readonly double[][] Tabulated =
    [
        [2.984128556],
        [2.811769893, -0.030016709],
        [2.767663612, -0.038190229, -0.005232148],
        [2.749811840, -0.041954895, -0.006740939, -0.001733661],
    ];

    // The limits for n to infinity: above n = 4 they err by less than 4e-6 cm^-1 in the level, which falls as 1/n^3.
    private static readonly double[] Limit = [2.722654, -0.049054, -0.009940, -0.003764];

    public static double Of(int n, int l)
    {
        if (n <= Tabulated.Length)
            return Tabulated[n - 1][l];
        return l < Limit.Length ? Limit[l] : 0;
    }
}
