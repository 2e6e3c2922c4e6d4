using Redshift.Physics.Statistics;
using Redshift.Pipeline.Numerics;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Inject;

/// <summary>Puts computed objects into the user's spectra. Each injection has a random stream of its own.</summary>
/// <param name="givers">The user's spectra, at least one.</param>
/// <param name="settings">What is searched.</param>
/// <param name="seed">Another seed, other injections.</param>
internal sealed class Injector(IReadOnlyList<Giver> givers, MatchSettings settings, ulong seed)
{
    /// <summary>Pixels of noise that stay together, so that its correlation survives.</summary>
    private const int Block = 64;

    /// <summary>Median signal to noise a pixel, one rung after the other.</summary>
    public static IReadOnlyList<double> Ladder { get; } = [0.7, 1.5, 3, 6, 12, 25];

    private readonly List<int>[] _donors = [.. givers.Select(own => Enumerable.Range(0, givers.Count)
        .Where(i => givers[i].Noise[0].Residuals is not null && givers[i].SharesPixelsWith(own)).ToList())];

    /// <summary>Makes one injection; the same whatever else is made.</summary>
    public Injected Make(int index)
    {
        var random = RandomSource.ForMember(seed, (ulong)index);
        var place = random.Index(givers.Count);
        var giver = givers[place];
        var target = TargetDraw.Draw(giver.Observation, settings, random);
        var light = new RestLight(Exposure.RestGrid(giver.Observation, target.Z));
        var description = ObjectPainter.Paint(target.Kind, target.Z, light, random);
        var clean = giver.Observation.Spectra.Select(s => Exposure.Take(s, light, target.Z)).ToArray();
        var snr = Ladder[index % Ladder.Count];
        Scale(clean, giver, snr);
        return new(index, giver.Observation, target, description, snr, Observe(place, clean, random));
    }

    private static void Scale(double[][] clean, Giver giver, double snr)
    {
        var ratios = clean.Zip(giver.Noise, (flux, noise) => flux.Zip(noise.Sigma, (f, sigma) => f / sigma).Where((_, i) => double.IsFinite(noise.Sigma[i])))
            .SelectMany(r => r).ToArray();
        var median = Selection.Median(ratios);
        // Where most pixels are dark (a forest), the brightest part has to carry the signal.
        var factor = snr / Math.Max(median, 0.05 * ratios.Max());
        foreach (var flux in clean)
            for (var i = 0; i < flux.Length; i++) flux[i] *= factor;
    }

    private Observation Observe(int place, double[][] clean, RandomSource random)
    {
        var giver = givers[place];
        var spectra = new List<Spectrum>();
        for (var s = 0; s < clean.Length; s++)
        {
            AddNoise(clean[s], place, s, random);
            spectra.Add(Like(giver.Observation.Spectra[s], clean[s], giver.Noise[s].Sigma));
        }

        return giver.Observation with { Spectra = spectra };
    }

    /// <summary>
    /// Blocks of what models left over in spectra with the same pixels, from about the same wavelength and with a random sign, so that
    /// correlation and leftover sky survive; random numbers where all those spectra are dominated by their objects.
    /// </summary>
    private void AddNoise(double[] flux, int place, int spectrum, RandomSource random)
    {
        var sigma = givers[place].Noise[spectrum].Sigma;
        var donors = _donors[place];
        for (var start = 0; start < flux.Length; start += Block)
        {
            var donor = donors.Count > 0 ? givers[donors[random.Index(donors.Count)]].Noise[spectrum].Residuals : null;
            var shift = random.Index(Block) - Block / 2;
            var sign = random.Chance(0.5) ? 1 : -1;
            for (var i = start; i < Math.Min(start + Block, flux.Length); i++)
            {
                var noise = donor is null ? random.Normal() : sign * donor[Math.Clamp(i + shift, 0, donor.Length - 1)];
                flux[i] = double.IsFinite(sigma[i]) ? flux[i] + sigma[i] * noise : 0;
            }
        }
    }

    private static Spectrum Like(Spectrum giver, double[] flux, double[] sigma) => new()
    {
        Label = giver.Label,
        Wavelength = giver.Wavelength,
        Flux = flux,
        InverseVariance = [.. giver.InverseVariance.Select((w, i) => double.IsFinite(sigma[i]) ? w : 0)],
        HasErrors = giver.HasErrors,
        FwhmKmS = giver.FwhmKmS,
        ResolutionFrom = giver.ResolutionFrom,
        FluxUnit = giver.FluxUnit,
    };
}

/// <summary>An object that was put into a spectrum.</summary>
/// <param name="Index">Which injection, from 0.</param>
/// <param name="Giver">The user's observation.</param>
/// <param name="Target">Kind and redshift.</param>
/// <param name="Description">What it is, in a few words.</param>
/// <param name="Snr">Median signal to noise a pixel.</param>
/// <param name="Observation">The spectrum to measure.</param>
internal sealed record Injected(int Index, Observation Giver, TargetDraw Target, string Description, double Snr, Observation Observation);
