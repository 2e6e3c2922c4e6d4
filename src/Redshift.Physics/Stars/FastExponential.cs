namespace Redshift.Physics.Stars;

/// <summary>exp(−x) from a table: lines and bands take it millions of times and need no more than six digits.</summary>
internal static class FastExponential
{
    private const double PerUnit = 512;
    private const double Last = 16;
    private static readonly double[] Table = [.. Enumerable.Range(0, (int)(PerUnit * Last) + 2).Select(i => Math.Exp(-i / PerUnit))];

    /// <summary>exp(−x) for x ≥ 0, zero above 16; error below 1e-6.</summary>
    public static double OfMinus(double x)
    {
        if (x >= Last)
            return 0;
        var place = x * PerUnit;
        var cell = (int)place;
        return Table[cell] + ((place - cell) * (Table[cell + 1] - Table[cell]));
    }
}
