namespace Redshift.Physics.Statistics;

/// <summary>Stated against found frequency in one range of probability.</summary>
/// <param name="From">Lower edge.</param>
/// <param name="Count">Forecasts in the range.</param>
/// <param name="Stated">Mean probability.</param>
/// <param name="Found">Share that was right.</param>
/// <param name="Low">Lower edge of the band in which <paramref name="Found"/> lies in 95 % of cases if the probabilities are true.</param>
/// <param name="High">Upper edge of the band.</param>
public sealed record ReliabilityBin(double From, int Count, double Stated, double Found, double Low, double High)
{
    /// <summary>Whether the found frequency contradicts the probabilities.</summary>
    public bool Off => Found < Low || Found > High;
}

/// <summary>The reliability table.</summary>
public static class Reliability
{
    private static readonly double[] Edges = [0, 0.1, 0.3, 0.5, 0.7, 0.9, 0.97, 0.99];

    /// <summary>Sorts forecasts into ranges; empty ranges are left out.</summary>
    /// <param name="forecasts">The forecasts.</param>
    /// <param name="least">Neighbouring ranges are joined until each has so many.</param>
    public static IReadOnlyList<ReliabilityBin> Table(IEnumerable<Forecast> forecasts, int least = 1)
    {
        var bins = forecasts.GroupBy(f => Edges.Last(edge => f.Probability >= edge)).OrderBy(group => group.Key)
            .Select(group => (From: group.Key, Members: group.ToArray()));
        return [.. Neighbours.Join(bins, bin => bin.Members.Length, (a, b) => (a.From, [.. a.Members, .. b.Members]), least).Select(bin => Bin(bin.From, bin.Members))];
    }

    private static ReliabilityBin Bin(double from, Forecast[] members)
    {
        var stated = members.Average(f => f.Probability);
        var variance = members.Sum(f => f.Probability * (1 - f.Probability)) / members.Length / members.Length;
        // Half a count of continuity, so that small bins are not called off for a single miss.
        var half = (1.96 * Math.Sqrt(variance)) + (0.5 / members.Length);
        return new(from, members.Length, stated, members.Count(f => f.Right) / (double)members.Length, Math.Max(0, stated - half), Math.Min(1, stated + half));
    }
}
