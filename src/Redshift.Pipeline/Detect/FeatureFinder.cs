using Redshift.Physics.Units;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Detect;

/// <summary>
/// The detect stage: a blind list of emission and absorption features from half the line spread to broad lines, by matched filters whose
/// widths double, with the share of false ones controlled.
/// </summary>
internal static class FeatureFinder
{
    /// <summary>Greatest expected share of false features.</summary>
    public const double FalseRate = 0.01;

    /// <summary>Widest filter, σ in ln λ: 3000 km/s; wider waves belong to the continuum.</summary>
    private const double WidestSigma = 0.01;

    /// <summary>Maxima below this height are never discoveries among so many tests.</summary>
    private const double LowestHeight = 2.5;

    /// <summary>A real profile is no Gaussian: a share of a feature that leaks into other filters is not a feature of its own.</summary>
    private const double ShapeShare = 0.25;

    /// <summary>Filters narrower than the line spread.</summary>
    private const double NarrowestWidth = 0.5;

    private const int FewestCells = 24;

    /// <summary>Finds the features of an observation.</summary>
    /// <returns>The features by rising wavelength; none without spectra.</returns>
    public static IReadOnlyList<Feature> Find(NormalizedObservation observation)
    {
        if (observation.Spectra.Count == 0) return [];
        var levels = Filter(observation);
        var peaks = new List<Peak>();
        var tests = levels.Sum(level => AddPeaks(level, peaks));
        var merged = Merge(peaks);
        merged.Sort((a, b) => b.OwnHeight.CompareTo(a.OwnHeight));
        var threshold = ChancePeaks.Threshold([.. merged.Select(p => p.OwnHeight)], tests, FalseRate);
        return Describe(merged.FindAll(p => p.OwnHeight >= threshold), levels, observation.Observation.Frame);
    }

    private static List<FilteredResiduals> Filter(NormalizedObservation observation)
    {
        // The line spread changes slowly: one value in sixteen is enough.
        var spread = Selection.Median([.. observation.Spectra.SelectMany(s => s.SigmaLn.Where((_, i) => i % 16 == 0)).Select(v => (double)v)]);
        var cells = ResidualCells.Build(observation.Spectra, NarrowestWidth * spread / FilteredResiduals.SigmaCells);
        var levels = new List<FilteredResiduals> { new(cells, null) };
        while (2 * levels[^1].SigmaLn < WidestSigma && cells.Count > 2 * FewestCells)
            levels.Add(new(cells = cells.Halved(), levels[^1]));
        return levels;
    }

    /// <summary>Adds the maxima on both sides of the continuum that may be features; returns how many there are in all.</summary>
    private static int AddPeaks(FilteredResiduals level, List<Peak> peaks)
    {
        var values = level.SignalToNoise;
        var tests = 0;
        for (var i = 1; i + 1 < values.Length; i++)
        {
            var side = Math.Sign(values[i]);
            if (side == 0 || side * values[i] <= side * values[i - 1] || side * values[i] < side * values[i + 1]) continue;
            tests++;
            if (Math.Abs(values[i]) < LowestHeight) continue;
            var peak = Top(level, i);
            if (peak.Height > LowestHeight) peaks.Add(peak);
        }

        return tests;
    }

    /// <summary>The vertex of the parabola through three cells.</summary>
    private static Peak Top(FilteredResiduals level, int i)
    {
        double left = level.SignalToNoise[i - 1], middle = level.SignalToNoise[i], right = level.SignalToNoise[i + 1];
        var bend = left + right - 2 * middle;
        var offset = bend == 0 ? 0 : 0.5 * (left - right) / bend;
        var value = middle - 0.25 * (left - right) * offset;
        return new(level.LnWavelength(i + offset), level.SigmaLn, value, Math.Abs(value) / level.Scale(i, value > 0));
    }

    /// <summary>
    /// One feature shows in several filters, chance mostly in one: features are made before they are counted against chance.
    /// Takes the strongest first; of weaker ones nearby only what the stronger ones do not explain.
    /// </summary>
    private static List<Peak> Merge(List<Peak> peaks)
    {
        var taken = new List<Peak>();
        foreach (var peak in peaks.OrderByDescending(p => Math.Abs(p.SignalToNoise)))
        {
            double leaked = 0, leak = 0;
            foreach (var strong in taken)
            {
                var share = strong.SeenBy(peak);
                leaked += share;
                leak += Math.Abs(share);
            }

            var own = (peak.SignalToNoise - leaked) * Math.Sign(peak.SignalToNoise);
            if (own >= LowestHeight * peak.Scale && own >= ShapeShare * leak) taken.Add(peak with { Own = own * Math.Sign(peak.SignalToNoise) });
        }

        return taken;
    }

    private static List<Feature> Describe(List<Peak> peaks, List<FilteredResiduals> levels, VelocityFrame frame)
    {
        var spread = levels[0].SigmaLn / NarrowestWidth;
        return
        [
            .. peaks.OrderBy(p => p.LnWavelength).Select(p =>
            {
                var (origin, name) = FeatureOrigins.Of(p.LnWavelength, p.SigmaLn, p.SignalToNoise, levels, spread, frame);
                return new Feature(p.LnWavelength, p.SigmaLn, p.SignalToNoise, origin, name);
            }),
        ];
    }

    private readonly record struct Peak(double LnWavelength, double SigmaLn, double SignalToNoise, double Height)
    {
        public double Scale => Math.Abs(SignalToNoise) / Height;

        /// <summary>The part of the signal to noise that no stronger feature explains.</summary>
        public double Own { get; init; }

        public double OwnHeight => Math.Abs(Own) / Scale;

        /// <summary>Signal to noise that this feature gives to the filter of another, at equal weights.</summary>
        public double SeenBy(Peak other)
        {
            var variance = SigmaLn * SigmaLn + other.SigmaLn * other.SigmaLn;
            var distance = LnWavelength - other.LnWavelength;
            return distance * distance > 40 * variance ? 0
                : Own * Math.Sqrt(2 * SigmaLn * other.SigmaLn / variance) * Math.Exp(-0.5 * distance * distance / variance);
        }
    }
}
