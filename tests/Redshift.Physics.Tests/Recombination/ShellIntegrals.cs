namespace Redshift.Physics.Tests.Recombination;

/// <summary>
/// Radial dipole integrals between a shell n of hydrogen and another shell or the continuum, by downward recursion in l
/// from the circular state: L. Infeld and T. E. Hull, Rev. Mod. Phys. 23, 21 (1951). With n' = i/K the recursion of two
/// shells becomes that of shell and continuum (A. Burgess, Mem. R. Astron. Soc. 69, 1 (1965)).
/// </summary>
internal sealed class ShellIntegrals
{
    private ShellIntegrals(int n, double circular, Func<int, double> other)
    {
        FromHigherL = new double[n + 1];
        FromLowerL = new double[n + 1];
        FromHigherL[n] = circular;
        for (int l = n - 1; l >= 1; l--)
        {
            double high = other(l + 1) * FromHigherL[l + 1];
            double low = Own(n, l + 1) * FromLowerL[l + 1];
            FromHigherL[l] = ((2 * l + 1) * high + low) / (2 * l * Own(n, l));
            FromLowerL[l] = (high + (2 * l + 1) * low) / (2 * l * other(l));
        }
    }

    /// <summary>Element l: from l outside to l - 1 in the shell.</summary>
    public double[] FromHigherL { get; }

    /// <summary>Element l: from l - 1 outside to l in the shell.</summary>
    public double[] FromLowerL { get; }

    public static ShellIntegrals Bound(int upper, int n)
    {
        double logarithm = 0.5 * (LogFactorial(upper + n) - LogFactorial(upper - n - 1) - LogFactorial(2 * n - 1))
            + (n + 2) * Math.Log(4.0 * n * upper)
            + (upper - n - 2) * Math.Log(upper - n)
            - (upper + n + 2) * Math.Log(upper + n);
        return new(n, Math.Exp(logarithm) / 4, l => Own(upper, l));
    }

    /// <summary>Burgess's g(n, l; K, l'), the free electron having K^2 Rydbergs.</summary>
    public static ShellIntegrals Free(double kSquared, int n)
    {
        double k = Math.Sqrt(kSquared);
        double product = Enumerable.Range(0, n + 1).Sum(s => Math.Log(1 + s * s * kSquared));
        double logarithm = 0.5 * (product - LogFactorial(2 * n - 1)) - Math.Log(2 * n)
            - 0.5 * Math.Log(1 - Math.Exp(-2 * Math.PI / k)) - 2 / k * Math.Atan(n * k)
            - (n + 2) * Math.Log(1 + n * n * kSquared)
            + 0.5 * Math.Log(Math.PI / 2) + Math.Log(8 * n) + n * Math.Log(4 * n);
        return new(n, Math.Exp(logarithm), l => Math.Sqrt(1 + l * l * kSquared) / l);
    }

    private static double Own(int n, int l) => Math.Sqrt((n - l) * (n + l)) / (n * l);

    private static double LogFactorial(int n) => MathNet.Numerics.SpecialFunctions.FactorialLn(n);
}
