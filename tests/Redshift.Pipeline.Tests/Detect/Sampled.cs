using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Tests.Detect;

/// <summary>A flat spectrum of level 1 with white noise and Gaussian lines, normalised by hand so that nothing else is tested.</summary>
internal sealed class Sampled
{
    private readonly double _noise;

    /// <summary>Lays out pixels evenly in wavelength.</summary>
    /// <param name="firstA">First pixel centre, Å.</param>
    /// <param name="stepA">Pixel width, Å.</param>
    /// <param name="count">Number of pixels.</param>
    /// <param name="noise">σ of a pixel.</param>
    /// <param name="instrumentKmS">σ of the line spread, km/s.</param>
    public Sampled(double firstA, double stepA, int count, double noise, double instrumentKmS)
    {
        _noise = noise;
        WavelengthA = [.. Enumerable.Range(0, count).Select(i => firstA + i * stepA)];
        StepA = stepA;
        Flux = Enumerable.Repeat(1.0, count).ToArray();
        InstrumentLn = instrumentKmS / Velocity.SpeedOfLightKmS;
    }

    public double[] WavelengthA { get; }

    public double StepA { get; }

    public double[] Flux { get; }

    public double InstrumentLn { get; }

    /// <summary>Adds a line of a given flux, σ in Å.</summary>
    public Sampled Add(double centreA, double sigmaA, double flux)
    {
        for (var i = 0; i < Flux.Length; i++)
        {
            var t = (WavelengthA[i] - centreA) / sigmaA;
            Flux[i] += flux / (Math.Sqrt(2 * Math.PI) * sigmaA) * Math.Exp(-0.5 * t * t);
        }

        return this;
    }

    public Sampled AddNoise(RandomSource random)
    {
        for (var i = 0; i < Flux.Length; i++) Flux[i] += _noise * random.Normal();
        return this;
    }

    /// <summary>The spectrum as the normalize stage would give it with a perfect continuum.</summary>
    public NormalizedSpectrum Spectrum() => new()
    {
        Original = new() { Wavelength = WavelengthA, Flux = Flux, InverseVariance = [.. Flux.Select(_ => 1 / (_noise * _noise))], HasErrors = true },
        OriginalIndex = null,
        LnWavelength = Array.ConvertAll(WavelengthA, Math.Log),
        PixelWidth = Array.ConvertAll(WavelengthA, w => (float)(StepA / w)),
        Flux = Array.ConvertAll(Flux, f => (float)f),
        Weight = [.. Flux.Select(_ => (float)(1 / (_noise * _noise)))],
        SigmaLn = [.. Flux.Select(_ => (float)InstrumentLn)],
        Continuum = [.. Flux.Select(_ => 1f)],
        Baseline = [.. Flux.Select(_ => 1f)],
        Noise = new(1, 1),
    };

    public NormalizedObservation Observation(VelocityFrame frame = VelocityFrame.Unknown) => new()
    {
        Observation = new() { Source = "planted", Row = 0, Spectra = [], Medium = WavelengthMedium.Vacuum, Frame = frame },
        Spectra = [Spectrum()],
        FluxScale = 1,
        SnrPixel = 1 / _noise,
        SnrAngstrom = 1 / _noise,
        Resolution = 1 / (2.3548 * InstrumentLn),
        NoiseScale = 1,
    };
}
