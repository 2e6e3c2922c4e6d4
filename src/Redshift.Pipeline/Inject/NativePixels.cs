using Redshift.Pipeline.Normalize;

namespace Redshift.Pipeline.Inject;

/// <summary>Continuum and noise of a prepared spectrum at the pixels of its file.</summary>
/// <param name="Continuum">Smooth continuum in the unit of the flux.</param>
/// <param name="Sigma">1σ in the unit of the flux; infinite where unusable.</param>
internal sealed record NativePixels(double[] Continuum, double[] Sigma)
{
    /// <summary>Goes back from working pixels, which may be bins of several.</summary>
    public static NativePixels Of(NormalizedSpectrum spectrum, double fluxScale)
    {
        var original = spectrum.Original;
        var pixels = new NativePixels(new double[original.Count], new double[original.Count]);
        Array.Fill(pixels.Sigma, double.PositiveInfinity);
        var binned = Math.Sqrt(Math.Max(1, original.InverseVariance.Count(w => w > 0) / spectrum.Count));
        var nearest = spectrum.NearestToOriginal();
        for (var i = 0; i < original.Count; i++)
        {
            var near = nearest[i];
            pixels.Continuum[i] = spectrum.Continuum[near] * fluxScale;
            if (original.InverseVariance[i] > 0 && spectrum.Weight[near] > 0) pixels.Sigma[i] = binned * fluxScale / Math.Sqrt(spectrum.Weight[near]);
        }

        return pixels;
    }
}
