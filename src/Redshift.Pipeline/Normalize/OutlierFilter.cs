using System.Runtime.Intrinsics;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Normalize;

/// <summary>Takes the weight from pixels that no spectrum can have: spikes of one or two pixels, and errors far too small for their surroundings.</summary>
internal static class OutlierFilter
{
    private const int Half = 4;

    /// <summary>A pixel is a spike if it stands off the median of its neighbours by so many of their own deviations.</summary>
    private const double SpikeSigma = 8;

    /// <summary>A stated error below this share of the neighbours' is not believed.</summary>
    private const double SmallestErrorShare = 0.3;

    /// <summary>Light is not negative: a pixel so far below zero is an artefact.</summary>
    private const double NegativeSigma = 6;

    /// <summary>Changes the weights in place.</summary>
    public static void Apply(float[] flux, float[] weight, float[] baseline)
    {
        LimitWeights(weight);
        for (var i = 0; i < flux.Length; i++)
            if (flux[i] < -baseline[i] && flux[i] * Math.Sqrt(weight[i]) < -NegativeSigma) weight[i] = 0;
        foreach (var i in Spikes(flux, weight, baseline)) weight[i] = 0;
    }

    private static List<int> Spikes(float[] flux, float[] weight, float[] baseline)
    {
        var spikes = new List<int>();
        var usable = new List<int>(flux.Length);
        for (var i = 0; i < flux.Length; i++)
            if (weight[i] > 0) usable.Add(i);
        if (usable.Count <= 4 * Half) return spikes;
        var values = new float[usable.Count];
        for (var u = 0; u < values.Length; u++) values[u] = flux[usable[u]];
        for (var u = 0; u < values.Length; u++)
        {
            var from = Math.Clamp(u - Half, 0, values.Length - 2 * Half - 1);
            if (IsSpike(values.AsSpan(from, 2 * Half + 1), u - from, 1 / Math.Sqrt(weight[usable[u]]), baseline[usable[u]])) spikes.Add(usable[u]);
        }

        return spikes;
    }

    /// <summary>Whether one of a few neighbouring values stands out.</summary>
    private static bool IsSpike(ReadOnlySpan<float> near, int own, double noise, double baseline)
    {
        var least = SpikeSigma * noise + 0.3 * baseline;
        // What is near all its neighbours is near their median.
        var off = Vector256.Max(Vector256.Abs(Vector256.Create(near) - Vector256.Create(near[own])), Vector256.Abs(Vector256.Create(near[1..]) - Vector256.Create(near[own])));
        if (!Vector256.GreaterThanAny(off, Vector256.Create((float)(0.999 * least)))) return false;
        Span<float> others = stackalloc float[2 * Half];
        near[..own].CopyTo(others);
        near[(own + 1)..].CopyTo(others[own..]);
        others.Sort();
        var median = 0.5 * (others[Half - 1] + others[Half]);
        // The next-to-extreme neighbours tell how far a real, resolved feature reaches here.
        double spread = others[^2] - others[1];
        return Math.Abs(near[own] - median) > least + 2.5 * spread;
    }

    private static void LimitWeights(float[] weight)
    {
        foreach (var (start, end, median) in TypicalWeight.InBlocks(weight, 64))
        {
            var limit = (float)(median / (SmallestErrorShare * SmallestErrorShare));
            for (var i = start; i < end; i++) weight[i] = Math.Min(weight[i], limit);
        }
    }
}
