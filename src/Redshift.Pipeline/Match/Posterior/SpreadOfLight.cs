using Redshift.Pipeline.Normalize;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>How an instrument spread the light of an object: what it was meant for says something of what it was pointed at.</summary>
/// <param name="Resolution">Resolving power λ/FWHM.</param>
/// <param name="Snr">Signal to noise of a pixel.</param>
/// <param name="Range">Range in ln λ of the longest spectrum, or order.</param>
internal readonly record struct SpreadOfLight(double Resolution, double Snr, double Range)
{
    /// <summary>That of an observation with at least one spectrum.</summary>
    public static SpreadOfLight Of(NormalizedObservation observation) =>
        new(observation.Resolution, observation.SnrPixel, observation.Spectra.Max(s => s.LnWavelength[^1] - s.LnWavelength[0]));
}
