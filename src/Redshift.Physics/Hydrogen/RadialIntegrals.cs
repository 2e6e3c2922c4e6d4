namespace Redshift.Physics.Hydrogen;

/// <summary>
/// Radial dipole integrals between two shells of hydrogen, in Bohr radii of the reduced mass, for nuclear charge 1.
/// </summary>
/// <remarks>
/// Downward recursion in l, stable for all n: L. Infeld and T. E. Hull, Rev. Mod. Phys. 23, 21 (1951); it gives the
/// same numbers as W. Gordon, Ann. Phys. 394, 1031 (1929), without the cancelling sums.
/// </remarks>
internal sealed class RadialIntegrals
{
    private readonly double[] _fromHigherL;
    private readonly double[] _fromLowerL;

    public RadialIntegrals(int upper, int lower)
    {
        _fromHigherL = new double[lower + 1];
        _fromLowerL = new double[lower + 1];
        _fromHigherL[lower] = Circular(upper, lower);
        for (int l = lower - 1; l >= 1; l--)
        {
            double upperStep = Ladder(upper, l + 1);
            double lowerStep = Ladder(lower, l + 1);
            double high = _fromHigherL[l + 1];
            double low = _fromLowerL[l + 1];
            _fromHigherL[l] = ((2 * l + 1) * upperStep * high + lowerStep * low) / (2 * l * Ladder(lower, l));
            _fromLowerL[l] = (upperStep * high + (2 * l + 1) * lowerStep * low) / (2 * l * Ladder(upper, l));
        }
    }

    /// <summary>The integral from (upper, l) to (lower, l - 1), 1 &lt;= l &lt;= lower.</summary>
    public double FromHigherL(int l) => _fromHigherL[l];

    /// <summary>The integral from (upper, l - 1) to (lower, l), 1 &lt;= l &lt; lower; zero for l = lower.</summary>
    public double FromLowerL(int l) => _fromLowerL[l];

    // (upper, l = lower) to the circular state (lower, l = lower - 1), in closed form.
    private static double Circular(int upper, int lower)
    {
        double sum = upper + lower;
        double difference = upper - lower;
        double logarithm = 0.5 * (SumOfLogs(upper - lower, upper + lower) - SumOfLogs(1, 2 * lower - 1))
            + (lower + 2) * Math.Log(4.0 * upper * lower)
            + (difference - 2) * Math.Log(difference)
            - (sum + 2) * Math.Log(sum);
        return Math.Exp(logarithm) / 4;
    }

    // The logarithm of last! / (first - 1)!.
    private static double SumOfLogs(int first, int last)
    {
        double sum = 0;
        for (int i = first; i <= last; i++)
            sum += Math.Log(i);
        return sum;
    }

    private static double Ladder(int n, int l) => Math.Sqrt((double)(n - l) * (n + l)) / ((double)n * l);
}
