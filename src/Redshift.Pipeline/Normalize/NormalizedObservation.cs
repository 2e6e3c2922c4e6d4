using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Normalize;

/// <summary>What the normalize stage gives: spectra on one flux scale with continuum, checked noise and resolution.</summary>
internal sealed class NormalizedObservation
{
    public required Observation Observation { get; init; }

    /// <summary>The spectra with enough usable pixels.</summary>
    public required IReadOnlyList<NormalizedSpectrum> Spectra { get; init; }

    /// <summary>Flux of 1 in the spectra, in the file's unit.</summary>
    public required double FluxScale { get; init; }

    /// <summary>Median signal to noise a pixel.</summary>
    public required double SnrPixel { get; init; }

    /// <summary>Median signal to noise in 1 Å.</summary>
    public required double SnrAngstrom { get; init; }

    /// <summary>Median resolving power.</summary>
    public required double Resolution { get; init; }

    /// <summary>Noise over stated noise, pixel-weighted over the spectra.</summary>
    public required double NoiseScale { get; init; }

    /// <summary>Whether light of an object is seen at all: the median pixel stands above zero beyond doubt.</summary>
    public bool HasContinuum => SnrPixel * Math.Sqrt(Spectra.Sum(s => s.Count)) > ContinuumSigma;

    /// <summary>Sky subtraction leaves more than noise behind, hence well above the usual five.</summary>
    private const double ContinuumSigma = 12;
}
