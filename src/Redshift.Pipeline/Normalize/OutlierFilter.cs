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
        Span<float> near = stackalloc float[2 * Half];
        for (var u = 0; u < usable.Count && usable.Count > 4 * Half; u++)
        {
            var from = Math.Clamp(u - Half, 0, usable.Count - 2 * Half - 1);
            for (int v = from, n = 0; v <= from + 2 * Half; v++)
                if (v != u) near[n++] = flux[usable[v]];
            near.Sort();
            var median = 0.5 * (near[Half - 1] + near[Half]);
            // The next-to-extreme neighbours tell how far a real, resolved feature reaches here.
            double spread = near[^2] - near[1], noise = 1 / Math.Sqrt(weight[usable[u]]);
            var allowed = SpikeSigma * noise + 2.5 * spread + 0.3 * baseline[usable[u]];
            if (Math.Abs(flux[usable[u]] - median) > allowed) spikes.Add(usable[u]);
        }

        return spikes;
    }

    private static void LimitWeights(float[] weight)
    {
        const int Window = 64;
        for (var start = 0; start < weight.Length; start += Window)
        {
            var end = Math.Min(weight.Length, start + Window);
            var used = weight[Math.Max(0, end - Window)..end].Where(w => w > 0).Select(w => (double)w).ToArray();
            if (used.Length == 0) continue;
            var limit = (float)(NoiseCheck.Median(used) / (SmallestErrorShare * SmallestErrorShare));
            for (var i = start; i < end; i++) weight[i] = Math.Min(weight[i], limit);
        }
    }
}
