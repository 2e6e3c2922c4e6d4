using System.Runtime.Intrinsics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>Eight sequences side by side.</summary>
internal static class Octet
{
    /// <summary>Puts up to eight sequences of one length side by side, zeros in the lanes left over.</summary>
    public static Vector256<float>[] Interleave(float[][] sequences)
    {
        var octet = new Vector256<float>[sequences[0].Length];
        for (var lane = 0; lane < sequences.Length; lane++)
            for (var i = 0; i < octet.Length; i++) octet[i] = octet[i].WithElement(lane, sequences[lane][i]);
        return octet;
    }

    /// <summary>The same, each element the mean of two neighbours.</summary>
    public static Vector256<float>[] Pairs(float[][] sequences)
    {
        var single = Interleave(sequences);
        var pairs = new Vector256<float>[single.Length / 2];
        for (var j = 0; j < pairs.Length; j++) pairs[j] = (single[2 * j] + single[2 * j + 1]) * 0.5f;
        return pairs;
    }
}
