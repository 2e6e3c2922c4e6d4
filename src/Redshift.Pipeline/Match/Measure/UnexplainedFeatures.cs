using Redshift.Pipeline.Detect;
using Redshift.Pipeline.Match.Fit;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>Features that are still there when the answer's model is taken out.</summary>
internal static class UnexplainedFeatures
{
    /// <summary>Signal to noise, model error included, that must be left.</summary>
    private const double LeastLeft = 5;

    /// <summary>Share of the feature that must be left.</summary>
    private const double LeastShare = 0.5;

    /// <summary>More of them tell a reader nothing new.</summary>
    private const int Most = 20;

    /// <summary>Selects them, the strongest of the blind list first chosen, by rising wavelength.</summary>
    /// <param name="features">The blind list.</param>
    /// <param name="native">The answer's model.</param>
    /// <param name="lines">The matched lines, which explain what the model may lack.</param>
    public static List<Feature> Select(IReadOnlyList<Feature> features, NativeModel native, IReadOnlyList<FittedLine> lines) =>
        [.. features.Where(f => !lines.Any(l => Covers(l, f)) && IsLeft(f, native)).OrderByDescending(f => Math.Abs(f.SignalToNoise)).Take(Most).OrderBy(f => f.LnWavelength)];

    private static bool Covers(FittedLine line, Feature feature) =>
        Math.Sign(line.Amplitude) == Math.Sign(feature.SignalToNoise)
        && Math.Abs(line.Centre - feature.LnWavelength) < 1.5 * (line.Sigma + feature.SigmaLn);

    private static bool IsLeft(Feature feature, NativeModel native)
    {
        double before = 0, after = 0, curvature = 0;
        var pixels = native.Pixels;
        for (var s = 0; s + 1 < pixels.Starts.Length; s++)
            for (var p = First(pixels, s, feature.LnWavelength - 4 * feature.SigmaLn); p < pixels.Starts[s + 1]; p++)
            {
                var t = (pixels.LnWavelength[p] - feature.LnWavelength) / feature.SigmaLn;
                if (t > 4) break;
                var profile = Math.Exp(-0.5 * t * t);
                before += pixels.Weight[p] * profile * (pixels.Flux[p] - native.Smooth[p]);
                after += pixels.Weight[p] * profile * (pixels.Flux[p] - native.Model[p]);
                curvature += pixels.Weight[p] * profile * profile;
            }

        var side = Math.Sign(feature.SignalToNoise);
        return curvature > 0 && side * after / Math.Sqrt(curvature) >= LeastLeft && side * after >= LeastShare * side * before;
    }

    private static int First(FitPixels pixels, int spectrum, double lnWavelength)
    {
        var found = Array.BinarySearch(pixels.LnWavelength, pixels.Starts[spectrum], pixels.Starts[spectrum + 1] - pixels.Starts[spectrum], lnWavelength);
        return found >= 0 ? found : ~found;
    }
}
