namespace Redshift.Pipeline.Numerics;

/// <summary>exp(−u²/2) for |u| ≤ 4 by linear interpolation in a table; error below 2e-6.</summary>
internal static class GaussianTable
{
    public const double Reach = 4;

    private const int PerUnit = 256;
    private static readonly float[] Values = Tabulate();

    /// <summary>The value at u; 0 beyond the reach.</summary>
    public static float At(double u)
    {
        var x = Math.Abs(u) * PerUnit;
        var i = (int)x;
        return i >= (int)(Reach * PerUnit) ? 0 : Values[i] + (float)(x - i) * (Values[i + 1] - Values[i]);
    }

    private static float[] Tabulate()
    {
        var values = new float[(int)(Reach * PerUnit) + 1];
        for (var i = 0; i < values.Length; i++)
        {
            var u = (double)i / PerUnit;
            values[i] = (float)Math.Exp(-0.5 * u * u);
        }

        return values;
    }
}
