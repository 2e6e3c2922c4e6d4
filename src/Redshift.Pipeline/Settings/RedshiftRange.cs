namespace Redshift.Pipeline.Settings;

/// <summary>The redshifts that can be asked for.</summary>
public static class RedshiftRange
{
    /// <summary>The most negative redshift, some 3000 km/s of approach: nothing known comes closer to us faster.</summary>
    public const double Lowest = -0.01;

    /// <summary>The highest redshift of the grid.</summary>
    public const double Highest = 7.5;
}
