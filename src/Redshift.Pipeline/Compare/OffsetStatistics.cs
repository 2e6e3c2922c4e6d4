using MathNet.Numerics.Statistics;
using Redshift.Physics.Statistics;

namespace Redshift.Pipeline.Compare;

/// <summary>How far the redshifts of a group of pairs lie apart.</summary>
public sealed class OffsetStatistics
{
    private readonly List<double> _offsets = [];

    /// <summary>Pairs with both redshifts.</summary>
    public int Pairs => _offsets.Count;

    /// <summary>Pairs farther apart than their tolerance.</summary>
    public int Outliers { get; private set; }

    /// <summary>Outliers among a hundred pairs; null without pairs.</summary>
    public double? OutlierPercent => Pairs > 0 ? 100.0 * Outliers / Pairs : null;

    /// <summary>Median offset in km/s; null without pairs.</summary>
    public double? MedianKmS => Pairs > 0 ? ArrayStatistics.MedianInplace(_offsets.ToArray()) : null;

    /// <summary>Normalised median absolute deviation from the median in km/s: the σ of a normal distribution, blind to outliers.</summary>
    public double? NmadKmS => Pairs > 0 ? RobustNoise.SigmaFromMad(_offsets.ToArray()) : null;

    /// <summary>Counts a pair.</summary>
    internal void Add(double offsetKmS, bool isOutlier)
    {
        _offsets.Add(offsetKmS);
        if (isOutlier)
            Outliers++;
    }
}
