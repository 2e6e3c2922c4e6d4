using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Detect;

/// <summary>
/// How large filtered residuals get by chance, along the spectrum: the quartile of the opposite side in blocks, as normal σ, at least 1.
/// </summary>
internal sealed class ChanceScale
{
    private const int Block = 256;

    private const int FewestSamples = 32;

    /// <summary>Normal standard deviation over its quartile.</summary>
    private const float SigmaPerQuartile = 1.4826022f;

    private readonly float[] _upward;
    private readonly float[] _downward;

    /// <summary>Measures both sides.</summary>
    /// <param name="signalToNoise">Filtered residuals, 0 where there are no data.</param>
    public ChanceScale(ReadOnlySpan<float> signalToNoise)
    {
        _upward = new float[(signalToNoise.Length + Block - 1) / Block];
        _downward = new float[_upward.Length];
        Span<float> sample = stackalloc float[Block];
        for (var b = 0; b < _upward.Length; b++)
        {
            var count = 0;
            for (var i = b * Block; i < Math.Min(signalToNoise.Length, (b + 1) * Block); i++)
                if (signalToNoise[i] != 0) sample[count++] = signalToNoise[i];
            (_upward[b], _downward[b]) = Scales(sample[..count]);
        }
    }

    /// <summary>
    /// The scale that a feature at a cell must be held against: the greatest of its block's and the two beside it, for bad stretches end
    /// within blocks. An emission feature is held against the dips, an absorption feature against the bumps.
    /// </summary>
    public double At(int cell, bool emission)
    {
        var scales = emission ? _downward : _upward;
        double scale = 1;
        for (var b = Math.Max(0, cell / Block - 1); b <= Math.Min(scales.Length - 1, cell / Block + 1); b++) scale = Math.Max(scale, scales[b]);
        return scale;
    }

    private static (float Upward, float Downward) Scales(Span<float> sample)
    {
        if (sample.Length < FewestSamples) return (1, 1);
        int low = (sample.Length - 1) / 4, high = 3 * (sample.Length - 1) / 4;
        var upper = Selection.Take(sample, high);
        return (SigmaPerQuartile * upper, -SigmaPerQuartile * Selection.Take(sample[..high], low));
    }
}
