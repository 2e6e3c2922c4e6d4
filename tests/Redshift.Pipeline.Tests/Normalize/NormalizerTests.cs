using Redshift.Physics.Statistics;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Observations;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Normalize;

public class NormalizerTests
{
    private const double Sigma = 0.1;

    private static readonly double[] Ln = LnWavelengths(3700, 9200);

    private readonly double[] _flux = Noisy(Ln, x => 2 * Math.Exp(-(x - Math.Log(5000))), Sigma, 1);

    [Fact]
    public void Unusable_pixels_are_left_out()
    {
        var spectrum = Spectrum(Ln, _flux, Sigma);
        spectrum.InverseVariance[17] = 0;
        spectrum.InverseVariance.AsSpan(1000, 300).Clear();
        spectrum.Flux.AsSpan(1000, 300).Fill(1e6);
        var normalized = One(spectrum);
        Assert.Equal(Ln.Length - 301, normalized.Count);
        Assert.DoesNotContain(17, normalized.OriginalIndex!);
        Assert.DoesNotContain(1150, normalized.OriginalIndex!);
        // The pixels beside the gap are as wide as any other.
        Assert.All(normalized.PixelWidth, width => Assert.Equal(PixelKmS / 299792.458, width, 1e-9));
        Assert.All(normalized.Continuum, level => Assert.InRange(level, 0.3f, 3));
    }

    [Theory]
    [InlineData(0.5)]
    [InlineData(1.1)]
    [InlineData(2)]
    public void Errors_wrong_by_more_than_a_fifth_are_rescaled(double trueOverStated)
    {
        var observation = Normalizer.Normalize(Observation(Spectrum(Ln, _flux, Sigma / trueOverStated)));
        var expected = trueOverStated is > 0.8 and < 1.2 ? 1 : trueOverStated;
        Assert.Equal(expected, observation.NoiseScale, 0.06 * expected);
        // Honest weights: the pulls of pure noise about its continuum have the width of the unrescaled part.
        var spectrum = observation.Spectra[0];
        var pulls = spectrum.Flux.Select((f, i) => (f - spectrum.Continuum[i]) * Math.Sqrt(spectrum.Weight[i]));
        Assert.Equal(trueOverStated / expected, Math.Sqrt(pulls.Average(p => p * p)), 0.07);
    }

    [Fact]
    public void Noise_that_no_file_states_is_measured_where_it_is()
    {
        var random = new RandomSource(2);
        var flux = Ln.Select((_, i) => 2 + (i < Ln.Length / 2 ? 0.05 : 0.2) * random.Normal()).ToArray();
        var observation = Normalizer.Normalize(Observation(Spectrum(Ln, flux, null)));
        foreach (var (at, sigma) in new[] { (Ln.Length / 4, 0.05), (3 * Ln.Length / 4, 0.2) })
            Assert.Equal(sigma, observation.FluxScale / Math.Sqrt(observation.Spectra[0].Weight[at]), 0.25 * sigma);
    }

    [Fact]
    public void The_unit_of_the_flux_does_not_matter()
    {
        var first = Normalizer.Normalize(Observation(Spectrum(Ln, _flux, Sigma)));
        var second = Normalizer.Normalize(Observation(Spectrum(Ln, Array.ConvertAll(_flux, f => 1e-17 * f), 1e-17 * Sigma)));
        Assert.Equal(1e-17 * first.FluxScale, second.FluxScale, 1e-24);
        Assert.Equal(first.SnrPixel, second.SnrPixel, 1e-4);
        foreach (var (a, b) in new[] { (first.Spectra[0].Flux, second.Spectra[0].Flux), (first.Spectra[0].Continuum, second.Spectra[0].Continuum) })
            Assert.All(a.Zip(b), pair => Assert.Equal(pair.First, pair.Second, 1e-4f));
        Assert.All(first.Spectra[0].Weight.Zip(second.Spectra[0].Weight), pair => Assert.Equal(pair.First, pair.Second, 1e-3f * pair.First));
    }

    [Fact]
    public void Signal_to_noise_is_that_of_the_middle_pixel()
    {
        var flux = Noisy(Ln, _ => 2, Sigma, 3);
        var observation = Normalizer.Normalize(Observation(Spectrum(Ln, flux, Sigma)));
        Assert.Equal(20, observation.SnrPixel, 0.3);
        // The middle pixel in ln λ, at 5834 Å, is 1.343 Å wide.
        Assert.Equal(20 / Math.Sqrt(1.343), observation.SnrAngstrom, 0.3);
    }

    [Fact]
    public void The_line_spread_holds_instrument_and_pixel()
    {
        var spectrum = One(Spectrum(Ln, _flux, Sigma));
        var expected = Math.Sqrt(Math.Pow(150 / 2.35482, 2) + PixelKmS * PixelKmS / 12) / 299792.458;
        Assert.All(spectrum.SigmaLn, sigma => Assert.Equal(expected, sigma, 1e-8));
    }

    [Fact]
    public void A_spectrum_of_a_few_pixels_is_left_out_and_the_rest_stays()
    {
        var few = Spectrum(Ln[..15], _flux[..15], Sigma);
        Assert.Empty(Normalizer.Normalize(Observation(few)).Spectra);
        Assert.Single(Normalizer.Normalize(Observation(few, Spectrum(Ln, _flux, Sigma))).Spectra);
    }

    [Fact]
    public void Far_more_pixels_than_lines_need_are_binned_and_lose_no_light()
    {
        var fine = LnWavelengths(3700, 9200, 6);
        var spectrum = One(Spectrum(fine, Noisy(fine, _ => 2, Sigma, 5), Sigma));
        Assert.InRange(spectrum.Count, 8000, 16000);
        Assert.Null(spectrum.OriginalIndex);
        Assert.Equal(1, spectrum.Flux.Average(), 0.01);
        // Binning keeps the information: the sum of the weights, flux scale 2.
        Assert.Equal(fine.Length * 4 / (Sigma * Sigma), spectrum.Weight.Sum(w => (double)w), 0.06 * fine.Length * 4 / (Sigma * Sigma));
    }

    private static NormalizedSpectrum One(Spectrum spectrum) => Assert.Single(Normalizer.Normalize(Observation(spectrum)).Spectra);
}
