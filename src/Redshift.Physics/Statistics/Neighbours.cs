namespace Redshift.Physics.Statistics;

/// <summary>Bins of a histogram that hold too little on their own.</summary>
public static class Neighbours
{
    /// <summary>Joins each bin with the next until it holds enough; what is left at the end joins the last one.</summary>
    /// <param name="bins">Bins in their order.</param>
    /// <param name="count">What a bin holds.</param>
    /// <param name="join">Makes one of two neighbours.</param>
    /// <param name="least">What each bin has to hold, unless all together hold less.</param>
    public static IReadOnlyList<T> Join<T>(IEnumerable<T> bins, Func<T, int> count, Func<T, T, T> join, int least)
    {
        var joined = new List<T>();
        foreach (var bin in bins)
        {
            if (joined is [.., var last] && count(last) < least) joined[^1] = join(last, bin);
            else joined.Add(bin);
        }

        if (joined is [.. var before, var previous, var end] && count(end) < least) return [.. before, join(previous, end)];
        return joined;
    }
}
