using Redshift.Physics.Profiles;
using Redshift.Physics.Units;
using Redshift.Pipeline.Numerics;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Normalize;

/// <summary>The normalize stage: usable pixels, one flux scale, checked noise, resolution, continuum.</summary>
internal static class Normalizer
{
    /// <summary>Pixels that a spectrum must have to say anything.</summary>
    public const int FewestPixels = 16;

    /// <summary>Working pixels at most in an observation; finer data are binned, for no line needs millions of pixels.</summary>
    private const int MostPixels = 16000;

    /// <summary>Scatter of a line-blanketed spectrum about its smooth part, as a share.</summary>
    private const double Blanketing = 0.08;

    /// <summary>FWHM in pixels that is taken where a file states no resolution.</summary>
    public const double UnstatedFwhm = 2.5;

    private const double FwhmToSigma = 1 / LineWidth.FwhmPerSigma;

    /// <summary>Prepares an observation.</summary>
    public static NormalizedObservation Normalize(Observation observation)
    {
        var used = observation.Spectra.Select(UsablePixels.Select).Where(s => s.Count >= FewestPixels).ToList();
        if (used.Count > 0) used = Thin(used);
        var scale = FluxScale(used);
        var spectra = used.ConvertAll(s => Normalize(s, scale));
        return new()
        {
            Observation = observation,
            Spectra = spectra,
            FluxScale = scale,
            SnrPixel = SignalToNoise(spectra, perAngstrom: false),
            SnrAngstrom = SignalToNoise(spectra, perAngstrom: true),
            Resolution = Resolution(spectra),
            NoiseScale = spectra.Count == 0 ? 1 : spectra.Sum(s => s.Noise.Scale * s.Count) / spectra.Sum(s => s.Count),
        };
    }

    private static List<UsablePixels> Thin(List<UsablePixels> spectra)
    {
        var total = spectra.Sum(s => s.Count);
        return total <= MostPixels ? spectra : spectra.ConvertAll(s => s.Bin((total + MostPixels - 1) / MostPixels));
    }

    private static NormalizedSpectrum Normalize(UsablePixels pixels, double scale)
    {
        var flux = new float[pixels.Count];
        for (var i = 0; i < flux.Length; i++) flux[i] = (float)(pixels.Flux[i] / scale);
        var (weight, noise) = Weights(pixels, flux, scale);
        var width = PixelWidths(pixels.LnWavelength);
        var baseline = Baseline.Estimate(pixels.LnWavelength, flux, weight);
        OutlierFilter.Apply(flux, weight, baseline);
        var sigma = LineSpread(pixels, width);
        if (!pixels.Original.HasErrors) GreenLine.Mask(pixels.LnWavelength, sigma, weight);
        var continuum = SmoothFit.Continuum(pixels.LnWavelength, flux, weight, baseline, Blanketing);
        if (pixels.Original.HasErrors) SkyRemains.Allow(flux, continuum, weight);
        return new()
        {
            Original = pixels.Original,
            OriginalIndex = pixels.OriginalIndex,
            LnWavelength = pixels.LnWavelength,
            PixelWidth = width,
            Flux = flux,
            Weight = weight,
            SigmaLn = sigma,
            Continuum = continuum,
            Baseline = baseline,
            Noise = noise,
        };
    }

    private static (float[] Weight, NoiseState Noise) Weights(UsablePixels pixels, float[] flux, double scale)
    {
        var weight = new float[pixels.Count];
        if (!pixels.Original.HasErrors) return (WeightsFromScatter(flux), new NoiseState(1, 1));
        var standardised = new double[pixels.Count];
        for (var i = 0; i < weight.Length; i++) standardised[i] = pixels.Flux[i] * Math.Sqrt(pixels.InverseVariance[i]);
        var noise = Trusted(NoiseCheck.Measure(standardised));
        var factor = scale * scale / (noise.Scale * noise.Scale * noise.Correlation);
        for (var i = 0; i < weight.Length; i++) weight[i] = (float)Math.Min(pixels.InverseVariance[i] * factor, 1e12);
        return (weight, noise);
    }

    /// <summary>A deviation below a fifth is within what the check itself can tell; beyond that the file's errors are rescaled.</summary>
    private static NoiseState Trusted(NoiseState measured) => measured.Scale switch
    {
        > 0.8 and < 1.2 => measured with { Scale = 1 },
        _ => measured with { Scale = Math.Clamp(measured.Scale, 0.05, 50) },
    };

    /// <summary>Where the file states no errors: the scatter in windows of some 100 pixels, smoothed by overlapping them.</summary>
    private static float[] WeightsFromScatter(float[] flux)
    {
        var values = Array.ConvertAll(flux, f => (double)f);
        var weight = new float[flux.Length];
        var half = Math.Clamp(flux.Length / 12, 12, 64);
        var overall = NoiseCheck.Scatter(values, 1);
        for (var start = 0; start < flux.Length; start += half / 2)
        {
            int from = Math.Max(0, start - half), to = Math.Min(flux.Length, start + half);
            var sigma = Math.Max(NoiseCheck.Scatter(values.AsSpan(from, to - from), 1), Math.Max(0.3 * overall, 1e-5));
            weight.AsSpan(start, Math.Min(half / 2, flux.Length - start)).Fill((float)(1 / (sigma * sigma)));
        }

        return weight;
    }

    private static float[] PixelWidths(double[] lnWavelength)
    {
        var widths = new float[lnWavelength.Length];
        for (var i = 0; i < widths.Length; i++)
        {
            double below = i > 0 ? lnWavelength[i] - lnWavelength[i - 1] : double.PositiveInfinity;
            double above = i + 1 < widths.Length ? lnWavelength[i + 1] - lnWavelength[i] : double.PositiveInfinity;
            widths[i] = (float)Math.Min(below, above);
        }

        return widths;
    }

    /// <summary>Instrument and pixel in quadrature: a box of width w has the variance w²/12. An unknown resolution is taken as <see cref="UnstatedFwhm"/>.</summary>
    private static float[] LineSpread(UsablePixels pixels, float[] width)
    {
        var sigma = new float[pixels.Count];
        for (var i = 0; i < sigma.Length; i++)
        {
            var instrument = pixels.FwhmKmS is { } fwhm ? fwhm[i] / Velocity.SpeedOfLightKmS : UnstatedFwhm * width[i];
            sigma[i] = (float)Math.Sqrt(instrument * instrument * FwhmToSigma * FwhmToSigma + width[i] * width[i] / 12);
        }

        return sigma;
    }

    private static double FluxScale(List<UsablePixels> spectra)
    {
        var absolute = Gathered(spectra, s => s.Count, (s, into) => Fill(into, s.Flux, static f => Math.Abs(f)));
        var level = Selection.Median(absolute);
        if (level <= 0) level = absolute.Length > 0 ? absolute.Max() : 1;
        return level > 0 ? level : 1;
    }

    private static double SignalToNoise(List<NormalizedSpectrum> spectra, bool perAngstrom) => Selection.Median(Gathered(spectra, s => s.Count, (s, into) =>
    {
        for (var i = 0; i < into.Length; i++)
            into[i] = s.Flux[i] * Math.Sqrt(s.Weight[i] / (perAngstrom ? s.PixelWidth[i] * Math.Exp(s.LnWavelength[i]) : 1));
    }));

    private static double Resolution(List<NormalizedSpectrum> spectra) =>
        1 / Math.Max(1e-7, Selection.Median(Gathered(spectra, s => s.Count, (s, into) => Fill(into, s.SigmaLn, static v => v / FwhmToSigma))));

    private delegate void Filling<in T>(T spectrum, Span<double> into);

    /// <summary>One value a pixel of all spectra.</summary>
    private static double[] Gathered<T>(List<T> spectra, Func<T, int> count, Filling<T> fill)
    {
        var values = new double[spectra.Sum(count)];
        var at = 0;
        foreach (var spectrum in spectra)
        {
            fill(spectrum, values.AsSpan(at, count(spectrum)));
            at += count(spectrum);
        }

        return values;
    }

    private static void Fill<T>(Span<double> into, T[] values, Func<T, double> function)
    {
        for (var i = 0; i < into.Length; i++) into[i] = function(values[i]);
    }
}
