using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Inject;

/// <summary>One of the user's spectra, stripped of its object: what is left is the instrument with its pixels, masks, resolution and noise.</summary>
internal sealed class Giver
{
    /// <summary>Above this signal to noise a pixel, what a model leaves over is the model's own fault more than noise.</summary>
    private const double DominatedByObject = 10;

    /// <summary>Cosmic rays and lines that the model lacks must not be handed on to other objects as noise.</summary>
    private const double GreatestResidual = 6;

    private Giver(Observation observation, GivenNoise[] noise)
    {
        Observation = observation;
        Noise = noise;
    }

    /// <summary>The observation, with only those spectra that have usable pixels.</summary>
    public Observation Observation { get; }

    /// <summary>The noise of each spectrum.</summary>
    public IReadOnlyList<GivenNoise> Noise { get; }

    /// <summary>Takes an observation apart, or returns null where no pixel of it can be used.</summary>
    public static Giver? From(Observation observation, ObservationPipeline pipeline)
    {
        var normalized = Normalizer.Normalize(observation);
        if (normalized.Spectra.Count == 0) return null;
        var curves = pipeline.Analyze(observation).Curves;
        var noise = new GivenNoise[normalized.Spectra.Count];
        for (var s = 0; s < noise.Length; s++)
        {
            var pixels = NativePixels.Of(normalized.Spectra[s], normalized.FluxScale);
            var model = curves.Count > s ? curves[s].Model : pixels.Continuum;
            noise[s] = new(pixels.Sigma, normalized.SnrPixel > DominatedByObject ? null : Residuals(normalized.Spectra[s].Original, model, pixels.Sigma));
        }

        return noise.Any(n => n.Sigma.Any(double.IsFinite)) ? new(observation with { Spectra = [.. normalized.Spectra.Select(s => s.Original)] }, noise) : null;
    }

    /// <summary>Whether residuals of the other giver can stand for noise here: the same pixels at the same wavelengths.</summary>
    public bool SharesPixelsWith(Giver other) => Observation.Spectra.Count == other.Observation.Spectra.Count
        && Observation.Spectra.Zip(other.Observation.Spectra).All(pair => SamePixels(pair.First.Wavelength, pair.Second.Wavelength));

    private static bool SamePixels(double[] first, double[] second)
    {
        const double Share = 1e-4;
        return first.Length == second.Length && Math.Abs(first[0] / second[0] - 1) < Share && Math.Abs(first[^1] / second[^1] - 1) < Share;
    }

    private static float[] Residuals(Spectrum spectrum, double[] model, double[] sigma)
    {
        var residuals = new float[sigma.Length];
        for (var i = 0; i < residuals.Length; i++)
            if (double.IsFinite(sigma[i])) residuals[i] = (float)Math.Clamp((spectrum.Flux[i] - model[i]) / sigma[i], -GreatestResidual, GreatestResidual);
        return residuals;
    }
}

/// <summary>The noise of a spectrum.</summary>
/// <param name="Sigma">1σ of each pixel in the unit of the flux, scaled as its scatter demands; infinite where unusable.</param>
/// <param name="Residuals">What its best model left over, in units of σ; null where the object outshines the noise.</param>
internal sealed record GivenNoise(double[] Sigma, float[]? Residuals);
