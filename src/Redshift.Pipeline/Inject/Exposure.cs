using Redshift.Physics.Profiles;
using Redshift.Physics.Stars;
using Redshift.Physics.Units;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Inject;

/// <summary>Light as a spectrograph shows it: shifted, smeared by the line spread of each pixel, integrated over the pixel.</summary>
internal static class Exposure
{
    private const double FwhmToSigma = 1 / LineWidth.FwhmPerSigma;
    private const double CoarsestKmS = 20;
    private const double FinestKmS = 2;
    private const double ShortestA = 880;
    private const double LongestA = 25000;

    /// <summary>The grid at rest that an observation of an object at <paramref name="z"/> sees, with room for the line spread.</summary>
    public static LogWavelengthGrid RestGrid(Observation observation, double z)
    {
        var first = Math.Clamp(observation.Spectra.Min(s => s.Wavelength[0]) / (1 + z) * 0.98, ShortestA, LongestA * 0.9);
        var last = Math.Clamp(observation.Spectra.Max(s => s.Wavelength[^1]) / (1 + z) * 1.02, first * 1.05, LongestA);
        var step = observation.Spectra.Min(s => Sigma(s, s.Count / 2)) * Velocity.SpeedOfLightKmS / 2;
        return LogWavelengthGrid.Covering(first, last, Math.Clamp(step, FinestKmS, CoarsestKmS));
    }

    /// <summary>F_λ at every pixel of a spectrum.</summary>
    public static double[] Take(Spectrum spectrum, RestLight light, double z)
    {
        var flux = new double[spectrum.Count];
        for (var i = 0; i < flux.Length; i++)
            flux[i] = Mean(light, light.Grid.Position(spectrum.Wavelength[i] / (1 + z)), Sigma(spectrum, i) / light.Grid.LnStep);
        return flux;
    }

    private static double Mean(RestLight light, double centre, double sigma)
    {
        sigma = Math.Max(sigma, 0.5);
        double sum = 0, weights = 0;
        for (var k = (int)Math.Ceiling(centre - 4 * sigma); k <= centre + 4 * sigma; k++)
        {
            var u = (k - centre) / sigma;
            var weight = Math.Exp(-0.5 * u * u);
            // Below the grid no light comes through the Lyman limit; above it the last value has to do.
            sum += k < 0 ? 0 : weight * light.Flux[Math.Min(k, light.Flux.Length - 1)];
            weights += weight;
        }

        return sum / weights;
    }

    /// <summary>σ of a pixel in ln λ: instrument and pixel in quadrature, a box of width w having the variance w²/12.</summary>
    private static double Sigma(Spectrum spectrum, int pixel)
    {
        var near = Math.Clamp(pixel, 1, spectrum.Count - 1);
        var width = Math.Log(spectrum.Wavelength[near] / spectrum.Wavelength[near - 1]);
        var fwhm = spectrum.FwhmKmS is { } stated ? stated[pixel] / Velocity.SpeedOfLightKmS : Normalizer.UnstatedFwhm * width;
        return Math.Sqrt(fwhm * fwhm * FwhmToSigma * FwhmToSigma + width * width / 12);
    }
}
