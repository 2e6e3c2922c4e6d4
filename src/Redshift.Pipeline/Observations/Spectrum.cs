namespace Redshift.Pipeline.Observations;

/// <summary>One calibrated 1-D spectrum (an arm, an echelle order, an exposure) of an observation, on its own pixels.</summary>
/// <remarks>All arrays have one element a pixel. Immutable by contract: no stage writes into them.</remarks>
public sealed class Spectrum
{
    /// <summary>Which spectrum of the observation this is, e.g. <c>B</c> or <c>order 31</c>; empty where there is only one.</summary>
    public string Label { get; init; } = "";

    /// <summary>Vacuum wavelength of the pixel centres in Å, finite and strictly increasing, in the observation's frame.</summary>
    public required double[] Wavelength { get; init; }

    /// <summary>Flux density per unit wavelength in <see cref="FluxUnit"/>; finite everywhere, 0 where unusable.</summary>
    public required double[] Flux { get; init; }

    /// <summary>Inverse variance of the flux as the file states it; 0 marks a pixel not to be used. Without errors in the file: 1 or 0.</summary>
    public required double[] InverseVariance { get; init; }

    /// <summary>Whether <see cref="InverseVariance"/> comes from the file; otherwise the noise is estimated from the spectrum.</summary>
    public required bool HasErrors { get; init; }

    /// <summary>Instrumental full width at half maximum in km/s at each pixel, or null where nobody states it.</summary>
    public float[]? FwhmKmS { get; init; }

    /// <summary>Where <see cref="FwhmKmS"/> comes from.</summary>
    public ResolutionSource ResolutionFrom { get; init; }

    /// <summary>Unit of the flux as written in the file, empty where not stated.</summary>
    public string FluxUnit { get; init; } = "";

    /// <summary>Number of pixels.</summary>
    public int Count => Wavelength.Length;
}
