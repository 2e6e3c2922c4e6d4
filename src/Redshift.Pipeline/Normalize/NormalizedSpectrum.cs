using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Normalize;

/// <summary>One spectrum made ready for matching: usable pixels only, flux in units of the observation's level, honest weights.</summary>
internal sealed class NormalizedSpectrum
{
    /// <summary>The spectrum as read.</summary>
    public required Spectrum Original { get; init; }

    /// <summary>Index of each kept pixel in <see cref="Original"/>; null where pixels were binned.</summary>
    public required int[]? OriginalIndex { get; init; }

    /// <summary>ln of the vacuum wavelength in Å.</summary>
    public required double[] LnWavelength { get; init; }

    /// <summary>Width of each pixel in ln λ.</summary>
    public required float[] PixelWidth { get; init; }

    /// <summary>Flux in units of <see cref="NormalizedObservation.FluxScale"/>.</summary>
    public required float[] Flux { get; init; }

    /// <summary>Inverse variance of the flux, noise scale and correlation included, without the model error.</summary>
    public required float[] Weight { get; init; }

    /// <summary>σ of the line spread function in ln λ, the pixel included.</summary>
    public required float[] SigmaLn { get; init; }

    /// <summary>Smooth continuum in the unit of the flux.</summary>
    public required float[] Continuum { get; init; }

    /// <summary>Rough positive level, the unit of the smooth nuisance.</summary>
    public required float[] Baseline { get; init; }

    /// <summary>Noise over stated noise and correlation.</summary>
    public required NoiseState Noise { get; init; }

    /// <summary>Number of pixels.</summary>
    public int Count => Flux.Length;

    /// <summary>The pixel nearest in ln λ to each pixel of <see cref="Original"/>.</summary>
    public int[] NearestToOriginal()
    {
        var nearest = new int[Original.Count];
        for (int i = 0, near = 0; i < nearest.Length; i++)
        {
            var x = Math.Log(Original.Wavelength[i]);
            while (near + 1 < Count && Math.Abs(LnWavelength[near + 1] - x) <= Math.Abs(LnWavelength[near] - x)) near++;
            nearest[i] = near;
        }

        return nearest;
    }
}
