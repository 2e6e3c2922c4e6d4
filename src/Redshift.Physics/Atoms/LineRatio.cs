namespace Redshift.Physics.Atoms;

/// <summary>What atomic physics allows for the ratio of two lines, named as in the line list.</summary>
/// <param name="Numerator">Name of the first line.</param>
/// <param name="Denominator">Name of the second line.</param>
/// <param name="Lowest">Smallest ratio of first over second.</param>
/// <param name="Highest">Largest ratio of first over second.</param>
/// <param name="Source">The publication of the limits.</param>
public sealed record LineRatio(string Numerator, string Denominator, double Lowest, double Highest, string Source)
{
    /// <summary>Whether the ratio is the same everywhere.</summary>
    public bool IsFixed => Lowest == Highest;
}
