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
            scales[b] = count < FewestSamples ? 1 : UpperQuartile(sample[..count]) * SigmaPerQuartile;
        }

        return new(scales);
    }

    /// <summary>The scale at a cell: the greatest of its block's and the two beside it, for bad stretches end within blocks.</summary>
    public double At(int cell)
    {
        double scale = 1;
        for (var b = Math.Max(0, cell / Block - 1); b <= Math.Min(_scales.Length - 1, cell / Block + 1); b++) scale = Math.Max(scale, _scales[b]);
        return scale;
    }

    private static float UpperQuartile(Span<float> sample)
    {
        sample.Sort();
        return sample[3 * (sample.Length - 1) / 4];
    }
}
