using Redshift.Pipeline.Normalize;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>The pixels of one spectrum, native or binned, in the order of wavelength.</summary>
internal sealed record PixelRun(
    double[] LnWavelength, float[] Width, float[] Flux, float[] Weight, float[] SigmaLn, float[] Continuum, float[] Baseline)
{
    /// <summary>The native pixels.</summary>
    public static PixelRun Native(NormalizedSpectrum s) => new(s.LnWavelength, s.PixelWidth, s.Flux, s.Weight, s.SigmaLn, s.Continuum, s.Baseline);

    /// <summary>Weighted means in cells of a given width; pixels wider than that stay as they are.</summary>
    /// <param name="s">The spectrum.</param>
    /// <param name="cell">Width in ln λ.</param>
    public static PixelRun Binned(NormalizedSpectrum s, double cell)
    {
        var groups = Groups(s, cell);
        if (groups.Count == s.Count) return Native(s);
        var run = new PixelRun(
            new double[groups.Count], new float[groups.Count], new float[groups.Count],
            new float[groups.Count], new float[groups.Count], new float[groups.Count], new float[groups.Count]);
        for (var g = 0; g < groups.Count; g++) run.Average(s, g, groups[g].Start, groups[g].End);
        return run;
    }

    private static List<(int Start, int End)> Groups(NormalizedSpectrum s, double cell)
    {
        var groups = new List<(int, int)>();
        for (int start = 0, i = 1; i <= s.Count; i++)
        {
            if (i < s.Count && s.LnWavelength[i] - s.LnWavelength[start] < cell - 0.5 * s.PixelWidth[i]) continue;
            groups.Add((start, i));
            start = i;
        }

        return groups;
    }

    private void Average(NormalizedSpectrum s, int g, int start, int end)
    {
        double weight = 0, flux = 0, position = 0, continuum = 0, width = 0, spread = 0;
        for (var i = start; i < end; i++)
        {
            var w = Math.Max(s.Weight[i], 1e-20f);
            weight += w;
            flux += (double)w * s.Flux[i];
            position += w * s.LnWavelength[i];
            continuum += (double)w * s.Continuum[i];
            width += s.PixelWidth[i];
            spread += (double)w * s.SigmaLn[i] * s.SigmaLn[i];
        }

        LnWavelength[g] = position / weight;
        Flux[g] = (float)(flux / weight);
        Weight[g] = (float)weight;
        Continuum[g] = (float)(continuum / weight);
        Baseline[g] = s.Baseline[(start + end) / 2];
        Width[g] = (float)width;
        SigmaLn[g] = (float)Math.Sqrt(spread / weight + (width * width - s.PixelWidth[start] * s.PixelWidth[start]) / 12);
    }
}
