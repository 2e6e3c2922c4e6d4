namespace Redshift.Pipeline.Report.Plots;

/// <summary>Moves labels apart that would overlap, as little as possible.</summary>
internal static class Spreading
{
    /// <summary>Positions at least <paramref name="gap"/> apart and inside the limits, in the order of the wanted ones.</summary>
    /// <param name="wanted">Wanted positions in rising order.</param>
    /// <param name="gap">Least distance between neighbours.</param>
    /// <param name="low">Lowest position.</param>
    /// <param name="high">Highest position.</param>
    public static float[] Apart(IReadOnlyList<float> wanted, float gap, float low, float high)
    {
        var placed = wanted.ToArray();
        for (var i = 0; i < placed.Length; i++)
            placed[i] = Math.Max(placed[i], i == 0 ? low : placed[i - 1] + gap);
        for (var i = placed.Length - 1; i >= 0; i--)
            placed[i] = Math.Min(placed[i], i == placed.Length - 1 ? high : placed[i + 1] - gap);
        return placed;
    }
}
