namespace Redshift.Pipeline.Detect;

/// <summary>
/// How large filtered residuals get by chance, along the spectrum: the lower quartile of the opposite side in blocks, as normal σ, at least 1.
/// </summary>
internal sealed class ChanceScale
{
    private const int Block = 256;
    private const int FewestSamples = 32;

    /// <summary>Normal standard deviation over its quartile.</summary>
    private const float SigmaPerQuartile = 1.4826022f;

    private readonly float[] _scales;

    private ChanceScale(float[] scales) => _scales = scales;

    /// <summary>Measures one side.</summary>
    /// <param name="signalToNoise">Filtered residuals, 0 where there are no data.</param>
    /// <param name="side">1 for the positive residuals, −1 for the negative ones.</param>
    public static ChanceScale Measure(ReadOnlySpan<float> signalToNoise, int side)
    {
        var scales = new float[(signalToNoise.Length + Block - 1) / Block];
        Span<float> sample = stackalloc float[Block];
        for (var b = 0; b < scales.Length; b++)
        {
            var count = 0;
            foreach (var value in signalToNoise[(b * Block)..Math.Min(signalToNoise.Length, (b + 1) * Block)])
                if (value != 0) sample[count++] = side * value;
            scales[b] = count < FewestSamples ? float.NaN : UpperQuartile(sample[..count]) * SigmaPerQuartile;
        }

        return new(Smooth(scales));
    }

    /// <summary>The scale at a cell: the greater one of the two blocks whose middles it lies between.</summary>
    public double At(int cell)
    {
        var x = Math.Clamp((cell + 0.5) / Block - 0.5, 0, _scales.Length - 1);
        var b = (int)x;
        return Math.Max(_scales[b], _scales[Math.Min(b + 1, _scales.Length - 1)]);
    }

    private static float UpperQuartile(Span<float> sample)
    {
        sample.Sort();
        return sample[3 * (sample.Length - 1) / 4];
    }

    /// <summary>The greater of a block's own scale and its mean with its neighbours; blocks without data take theirs.</summary>
    private static float[] Smooth(float[] scales)
    {
        var smooth = new float[scales.Length];
        for (var b = 0; b < scales.Length; b++)
        {
            float sum = 0, weight = 0;
            for (var n = Math.Max(0, b - 1); n <= Math.Min(scales.Length - 1, b + 1); n++)
            {
                if (float.IsNaN(scales[n])) continue;
                var share = n == b ? 2 : 1;
                sum += share * scales[n];
                weight += share;
            }

            smooth[b] = Math.Max(1, Math.Max(weight > 0 ? sum / weight : 1, float.IsNaN(scales[b]) ? 1 : scales[b]));
        }

        return smooth;
    }
}
