using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Normalize;

/// <summary>What the weights of a spectrum are like, block by block: what single pixels are held against.</summary>
internal static class TypicalWeight
{
    /// <summary>The median of the weights above zero in each block of pixels; blocks without any are left out.</summary>
    /// <param name="weight">Inverse variances.</param>
    /// <param name="block">Pixels of a block; the last one, which may be shorter, is judged with pixels before it.</param>
    public static IEnumerable<(int Start, int End, double Median)> InBlocks(float[] weight, int block)
    {
        var used = new double[block];
        for (var start = 0; start < weight.Length; start += block)
        {
            var end = Math.Min(weight.Length, start + block);
            var count = 0;
            for (var i = Math.Max(0, end - block); i < end; i++)
                if (weight[i] > 0) used[count++] = weight[i];
            if (count > 0) yield return (start, end, Selection.Median(used.AsSpan(0, count)));
        }
    }
}
