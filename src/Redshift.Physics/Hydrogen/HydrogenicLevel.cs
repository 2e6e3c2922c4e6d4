namespace Redshift.Physics.Hydrogen;

/// <summary>A fine-structure level of a one-electron atom.</summary>
/// <param name="N">Principal quantum number, 1 or more.</param>
/// <param name="L">Orbital quantum number, 0 to <paramref name="N"/> - 1.</param>
/// <param name="TwiceJ">Twice the total angular momentum, 2 <paramref name="L"/> + 1 or 2 <paramref name="L"/> - 1 (positive).</param>
public readonly record struct HydrogenicLevel(int N, int L, int TwiceJ)
{
    /// <summary>The statistical weight 2j + 1.</summary>
    public int Weight => TwiceJ + 1;

    // Dirac's angular quantum number.
    internal int Kappa => TwiceJ > 2 * L ? -(L + 1) : L;

    internal static IEnumerable<HydrogenicLevel> OfShell(int n)
    {
        for (int l = 0; l < n; l++)
        {
            if (l > 0)
                yield return new(n, l, 2 * l - 1);
            yield return new(n, l, 2 * l + 1);
        }
    }
}
