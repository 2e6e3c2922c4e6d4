using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Tests.Normalize;

/// <summary>Spectra made of a formula and seeded noise, on pixels even in ln λ.</summary>
internal static class SyntheticSpectrum
{
    public const double PixelKmS = 69;

    public static double[] LnWavelengths(double fromA, double toA, double pixelKmS = PixelKmS)
    {
        var step = pixelKmS / Velocity.SpeedOfLightKmS;
        return [.. Enumerable.Range(0, (int)(Math.Log(toA / fromA) / step)).Select(i => Math.Log(fromA) + i * step)];
    }

    /// <summary>A Gaussian of ln λ with a peak of one.</summary>
    public static double Line(double lnWavelength, double centreA, double fwhmKmS)
    {
        var u = (lnWavelength - Math.Log(centreA)) * Velocity.SpeedOfLightKmS / fwhmKmS * 2.3548200450309493;
        return Math.Exp(-0.5 * u * u);
    }

    /// <summary>Adds normal noise to a formula of ln λ.</summary>
    public static double[] Noisy(double[] lnWavelength, Func<double, double> flux, double sigma, ulong seed)
    {
        var random = new RandomSource(seed);
        return Array.ConvertAll(lnWavelength, x => flux(x) + sigma * random.Normal());
    }

    /// <summary>A spectrum with one error for all pixels, or none.</summary>
    public static Spectrum Spectrum(double[] lnWavelength, double[] flux, double? sigma) => new()
    {
        Wavelength = Array.ConvertAll(lnWavelength, Math.Exp),
        Flux = flux,
        InverseVariance = [.. flux.Select(_ => sigma is { } s ? 1 / (s * s) : 1)],
        HasErrors = sigma is not null,
        FwhmKmS = [.. flux.Select(_ => 150f)],
    };

    public static Observation Observation(params Spectrum[] spectra) => new()
    {
        Source = "synthetic",
        Row = 0,
        Medium = WavelengthMedium.Vacuum,
        Spectra = spectra,
    };
}
