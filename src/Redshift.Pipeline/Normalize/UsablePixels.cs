using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Normalize;

/// <summary>The pixels of a spectrum that can be used, bad ones left out.</summary>
internal sealed record UsablePixels(
    Spectrum Original, int[]? OriginalIndex, double[] LnWavelength, double[] Flux, double[] InverseVariance, float[]? FwhmKmS)
{
    public int Count => Flux.Length;

    /// <summary>Keeps pixels with weight and without absurd values.</summary>
    public static UsablePixels Select(Spectrum spectrum)
    {
        var kept = new List<int>(spectrum.Count);
        for (var i = 0; i < spectrum.Count; i++)
            if (spectrum.InverseVariance[i] > 0 && double.IsFinite(spectrum.Flux[i]) && spectrum.Wavelength[i] > 0 && !Filled(spectrum, i)) kept.Add(i);
        var index = kept.ToArray();
        return new(
            spectrum,
            index,
            Array.ConvertAll(index, i => Math.Log(spectrum.Wavelength[i])),
            Array.ConvertAll(index, i => spectrum.Flux[i]),
            Array.ConvertAll(index, i => spectrum.InverseVariance[i]),
            spectrum.FwhmKmS is { } fwhm ? Array.ConvertAll(index, i => fwhm[i]) : null);
    }

    /// <summary>Light plus noise is never exactly zero twice running: such pixels were filled in for missing ones.</summary>
    private static bool Filled(Spectrum spectrum, int i)
    {
        bool Zero(int j) => j >= 0 && j < spectrum.Count && spectrum.Flux[j] == 0;
        return Zero(i) && (Zero(i - 1) || Zero(i + 1));
    }

    /// <summary>Weighted means of groups of neighbouring pixels.</summary>
    public UsablePixels Bin(int factor)
    {
        var count = Count / factor;
        double[] ln = new double[count], flux = new double[count], weight = new double[count];
        var fwhm = FwhmKmS is null ? null : new float[count];
        for (var b = 0; b < count; b++)
        {
            for (var i = b * factor; i < (b + 1) * factor; i++)
            {
                ln[b] += LnWavelength[i] / factor;
                flux[b] += InverseVariance[i] * Flux[i];
                weight[b] += InverseVariance[i];
            }

            flux[b] /= weight[b];
            if (fwhm is not null) fwhm[b] = FwhmKmS![b * factor + factor / 2];
        }

        return new(Original, null, ln, flux, weight, fwhm);
    }
}
