using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Tests.Normalize;
using Redshift.Simulation;

namespace Redshift.Pipeline.Tests.Match;

/// <summary>Data for the match stage.</summary>
internal static class Spectra
{
    /// <summary>Pixels about a continuum of one, with seeded noise.</summary>
    public static PixelRun Run(double[] lnWavelength, Func<double, double> flux, double sigma, ulong seed)
    {
        var random = new RandomSource(seed);
        float[] Flat(double value) => [.. lnWavelength.Select(_ => (float)value)];
        return new(
            lnWavelength, Flat(SyntheticSpectrum.PixelKmS / Velocity.SpeedOfLightKmS), Array.ConvertAll(lnWavelength, x => (float)(flux(x) + sigma * random.Normal())),
            Flat(1 / (sigma * sigma)), Flat(70 / Velocity.SpeedOfLightKmS), Flat(1), Flat(1));
    }

    /// <summary>The same for the stages from normalize on.</summary>
    public static NormalizedObservation Normalized(double[] lnWavelength, Func<double, double> flux, double sigma, ulong seed) =>
        Normalizer.Normalize(SyntheticSpectrum.Observation(SyntheticSpectrum.Spectrum(lnWavelength, SyntheticSpectrum.Noisy(lnWavelength, flux, sigma, seed), sigma)));

    public static Observation ToObservation(this SimulatedObservation simulated) => new()
    {
        Source = simulated.Name,
        Row = 0,
        Medium = WavelengthMedium.Vacuum,
        Spectra = [.. simulated.Spectra.Select(ToSpectrum)],
    };

    private static Spectrum ToSpectrum(SimulatedSpectrum simulated) => new()
    {
        Label = simulated.Label,
        Wavelength = simulated.Wavelength,
        Flux = simulated.Flux,
        InverseVariance = simulated.InverseVariance ?? [.. simulated.Flux.Select(_ => 1.0)],
        HasErrors = simulated.InverseVariance is not null,
        FwhmKmS = simulated.FwhmKmS,
    };
}
