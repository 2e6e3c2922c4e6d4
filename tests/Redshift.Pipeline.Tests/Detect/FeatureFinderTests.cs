using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Detect;
using Xunit;

namespace Redshift.Pipeline.Tests.Detect;

public sealed class FeatureFinderTests
{
    /// <summary>2,000 pixels of 1 Å from 4000 Å, R about 2000.</summary>
    private static Sampled Blank() => new(4000, 1, 2000, 0.1, 70);

    [Fact]
    public void White_noise_has_no_more_features_than_the_stated_rate()
    {
        const int Spectra = 400;
        var withFeatures = Enumerable.Range(0, Spectra).Count(i => Found(Blank().AddNoise(RandomSource.ForMember(11, (ulong)i))).Count > 0);

        Assert.True(withFeatures <= FeatureFinder.FalseRate * Spectra, $"{withFeatures} of {Spectra} blank spectra have features");
    }

    [Fact]
    public void Planted_lines_are_found_and_few_others()
    {
        int planted = 0, hits = 0, all = 0, wrong = 0;
        for (var i = 0; i < 60; i++)
        {
            var random = RandomSource.ForMember(12, (ulong)i);
            var spectrum = Blank();
            var centres = new List<(double Centre, double Sigma)>();
            for (var line = 0; line < 8; line++)
            {
                double centre = 4120 + 240 * line + random.Uniform(-40, 40), sigma = random.LogUniform(1.3, 12);
                // Signal to noise of a matched filter: amplitude √(σ√π / pixel) over the noise.
                var amplitude = 9 * 0.1 / Math.Sqrt(sigma * Math.Sqrt(Math.PI)) * (line % 2 == 0 ? 1 : -1);
                spectrum.Add(centre, sigma, amplitude * sigma * Math.Sqrt(2 * Math.PI));
                centres.Add((centre, sigma));
            }

            var found = Found(spectrum.AddNoise(random));
            planted += centres.Count;
            hits += centres.Count(c => found.Any(f => Math.Abs(Math.Exp(f.LnWavelength) - c.Centre) < 1.5 * c.Sigma));
            all += found.Count;
            wrong += found.Count(f => !centres.Any(c => Math.Abs(Math.Exp(f.LnWavelength) - c.Centre) < 4 * c.Sigma));
        }

        // Nine sigma each; lines cover a quarter of the spectrum and raise the bar for one another.
        Assert.True(hits > 0.9 * planted, $"{hits} of {planted} found");
        Assert.True(wrong <= FeatureFinder.FalseRate * all, $"{wrong} of {all} wrong");
        Assert.True(all < 1.1 * planted, $"{all} features for {planted} lines");
    }

    [Fact]
    public void A_feature_tells_side_place_width_and_signal_to_noise()
    {
        var spectrum = Blank().Add(4800, 8, -40);
        var feature = Assert.Single(Found(spectrum));

        Assert.Equal(4800, Math.Exp(feature.LnWavelength), 0.5);
        Assert.InRange(feature.SigmaLn * 4800, 8 / Math.Sqrt(2), 8 * Math.Sqrt(2));
        // ∫ of the squared profile: A² σ √π per pixel width, over the variance of a pixel.
        var amplitude = -40 / (8 * Math.Sqrt(2 * Math.PI));
        Assert.Equal(amplitude * Math.Sqrt(8 * Math.Sqrt(Math.PI)) / 0.1, feature.SignalToNoise, 2.0);
        Assert.Equal(FeatureOrigin.Object, feature.Origin);
    }

    [Fact]
    public void A_narrow_line_on_a_broad_one_is_a_feature_of_its_own()
    {
        var found = Found(Blank().Add(5000, 30, 200).Add(5010, 1.5, 15));

        Assert.Contains(found, f => Math.Abs(Math.Exp(f.LnWavelength) - 5010) < 1 && f.SigmaLn * 5000 < 3);
        Assert.Contains(found, f => Math.Abs(Math.Exp(f.LnWavelength) - 5000) < 10 && f.SigmaLn * 5000 > 15);
    }

    [Theory]
    [InlineData(5578.89, 5, VelocityFrame.Topocentric, nameof(FeatureOrigin.Sky))] // [O I] 5577.338 Å in air
    [InlineData(5578.89, 5, VelocityFrame.Rest, nameof(FeatureOrigin.Object))]
    [InlineData(5930, -12, VelocityFrame.Unknown, nameof(FeatureOrigin.Telluric))] // the water band at 5880 to 5990 Å
    [InlineData(5300, -12, VelocityFrame.Unknown, nameof(FeatureOrigin.Object))]
    public void Sky_and_atmosphere_are_recognised(double centre, double flux, VelocityFrame frame, string expected)
    {
        var feature = Assert.Single(FeatureFinder.Find(new Sampled(4000, 1, 2100, 0.1, 60).Add(centre, flux > 0 ? 1.3 : 3, flux).Observation(frame)));

        Assert.Equal(expected, feature.Origin.ToString());
    }

    [Fact]
    public void A_single_bright_pixel_is_a_cosmic_ray_and_a_line_of_the_instrument_is_not()
    {
        var spectrum = Blank().Add(5300, 1.25, 6);
        spectrum.Flux[600] += 3;
        var found = Found(spectrum);

        Assert.Equal(FeatureOrigin.CosmicRay, found.Single(f => Math.Abs(Math.Exp(f.LnWavelength) - 4600) < 1).Origin);
        Assert.Equal(FeatureOrigin.Object, found.Single(f => Math.Abs(Math.Exp(f.LnWavelength) - 5300) < 1).Origin);
    }

    [Fact]
    public void Bad_sky_raises_the_bar_where_it_is()
    {
        // Noise four times as large as stated beyond 5000 Å: the upside-down spectrum shows it.
        var found = 0;
        for (var i = 0; i < 40; i++)
        {
            var random = RandomSource.ForMember(13, (ulong)i);
            var spectrum = Blank().AddNoise(random);
            for (var p = 1000; p < spectrum.Flux.Length; p++) spectrum.Flux[p] = 1 + 4 * (spectrum.Flux[p] - 1);
            found += Found(spectrum).Count;
        }

        // At 4σ everywhere there would be hundreds; what is left stands at the step itself.
        Assert.True(found <= 6, $"{found} false features in 40 spectra");
    }

    [Fact]
    public void Chance_peaks_of_filtered_noise_have_the_stated_heights()
    {
        var random = new RandomSource(5);
        int maxima = 0, above1 = 0, above2 = 0;
        var noise = Enumerable.Range(0, 1_500_000).Select(_ => random.Normal()).ToArray();
        const double Sigma = 3;
        var kernel = Enumerable.Range(-12, 25).Select(j => Math.Exp(-0.5 * j * j / (Sigma * Sigma))).ToArray();
        var scale = Math.Sqrt(kernel.Sum(k => k * k));
        double before = 0, middle = 0;
        for (var i = 0; i + kernel.Length < noise.Length; i++)
        {
            double value = 0;
            for (var j = 0; j < kernel.Length; j++) value += kernel[j] * noise[i + j];
            if (i > 1 && middle > before && middle > value)
            {
                maxima++;
                if (middle > scale) above1++;
                if (middle > 2 * scale) above2++;
            }

            (before, middle) = (middle, value);
        }

        Assert.Equal(above1 / (double)maxima, ChancePeaks.Probability(1), 0.005); // three standard errors of 98,000 maxima
        Assert.Equal(above2 / (double)maxima, ChancePeaks.Probability(2), 0.003);
    }

    [Fact]
    public void Threshold_is_that_of_the_step_up_rule()
    {
        var random = new RandomSource(6);
        double[] heights = [.. Enumerable.Range(0, 300).Select(i => i < 20 ? random.Uniform(2, 6) : random.Uniform(-1, 3)).OrderDescending()];
        var limit = FalseDiscovery.Threshold([.. heights.Select(ChancePeaks.Probability)], 0.05);

        Assert.Equal(limit, ChancePeaks.Probability(ChancePeaks.Threshold(heights, heights.Length, 0.05)));
    }

    private static IReadOnlyList<Feature> Found(Sampled spectrum) => FeatureFinder.Find(spectrum.Observation());
}
