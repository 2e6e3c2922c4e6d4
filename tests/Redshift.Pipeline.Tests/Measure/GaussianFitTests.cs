using Redshift.Physics.Profiles;
using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Measure;
using Redshift.Pipeline.Tests.Detect;
using Xunit;

namespace Redshift.Pipeline.Tests.Measure;

public sealed class GaussianFitTests
{
    private const double CentreA = 5000.3;
    private const double FwhmA = 4;
    private const double SigmaA = FwhmA / LineWidth.FwhmPerSigma;

    [Theory]
    [InlineData(15)]
    [InlineData(-8)]
    public void Planted_lines_are_recovered_with_pulls_of_unit_width(double peakOverNoise)
    {
        const double Noise = 0.05;
        const int Trials = 400;
        var flux = peakOverNoise * Noise * SigmaA * Math.Sqrt(2 * Math.PI);
        double[] centre = new double[Trials], width = new double[Trials], area = new double[Trials], equivalent = new double[Trials];
        for (var i = 0; i < Trials; i++)
        {
            var line = Fit(Spectrum(Noise).Add(CentreA, SigmaA, flux).AddNoise(RandomSource.ForMember(21, (ulong)i)));
            centre[i] = (Math.Exp(line.Centre) - CentreA) / (line.CentreErr * CentreA);
            width[i] = Math.Log(line.Sigma * CentreA / SigmaA) / line.LnSigmaErr;
            area[i] = (line.Flux - flux) / line.FluxErr;
            equivalent[i] = (line.EquivalentWidth + flux) / line.EquivalentWidthErr;
        }

        AssertUnitPulls(centre);
        AssertUnitPulls(width);
        AssertUnitPulls(area);
        AssertUnitPulls(equivalent);
    }

    [Theory]
    [InlineData(0.8)]
    [InlineData(0.1)]
    [InlineData(-0.5)]
    public void Equivalent_width_of_a_gaussian_is_1_0644670_times_depth_times_width(double depth)
    {
        // √(π / 4 ln 2) = 1.0644670 (any textbook on line profiles).
        var line = Fit(Spectrum(0.01).Add(CentreA, SigmaA, -depth * SigmaA * Math.Sqrt(2 * Math.PI)));

        Assert.Equal(1.0644670 * depth * FwhmA, line.EquivalentWidth, 1e-4 * Math.Abs(depth) * FwhmA);
        Assert.Equal(FwhmA, line.Sigma * LineWidth.FwhmPerSigma * CentreA, 1e-3);
    }

    [Fact]
    public void Error_of_a_weak_lines_equivalent_width_is_that_of_cayrel()
    {
        // Cayrel 1988, IAU Symp. 132, 345: 1.6 √(FWHM δx) / (S/N); 1.5 in Cayrel et al. 2004, the bound for a known continuum
        // (√3 π^¼ / √2.3548). Ours fits the continuum within ±7σ too, which costs a fifth.
        const double Noise = 0.01;
        var line = Fit(Spectrum(Noise).Add(CentreA, SigmaA, -0.25 * SigmaA * Math.Sqrt(2 * Math.PI)));

        Assert.InRange(line.EquivalentWidthErr, 1.5 * Math.Sqrt(FwhmA * 0.5) * Noise, 1.85 * Math.Sqrt(FwhmA * 0.5) * Noise);
    }

    [Fact]
    public void Error_of_the_centre_is_that_of_landman()
    {
        // Landman, Roussel-Dupré & Tanigawa 1982, ApJ 261, 732: 0.6922272 √(δx FWHM) / (S/N × depth), the bound for white noise.
        const double Noise = 0.01, Depth = 0.4;
        var line = Fit(Spectrum(Noise).Add(CentreA, SigmaA, -Depth * SigmaA * Math.Sqrt(2 * Math.PI)));
        var expected = 0.6922272 * Math.Sqrt(0.5 * FwhmA) * Noise / Depth;

        Assert.InRange(line.CentreErr * CentreA, 0.98 * expected, 1.04 * expected);
    }

    [Fact]
    public void A_pair_closer_than_its_width_keeps_its_ratio_when_tied()
    {
        // [O II]: 2.78 Å apart at lines of 4 Å, shifted together by 0.3 Å.
        var spectrum = Spectrum(0.01).Add(CentreA + 0.3, SigmaA, 2).Add(CentreA + 2.78 + 0.3, SigmaA, 3);
        var shape = Shape(spectrum);
        var line = GaussianFit.Fit(spectrum.Spectrum(), spectrum.Spectrum().Flux, shape, [new(Math.Log(CentreA + 2.78), shape.Sigma, true)])!;

        Assert.Equal(2, line.Flux, 0.02);
        Assert.Equal(CentreA + 0.3, Math.Exp(line.Centre), 0.01);
        Assert.Equal(SigmaA, line.Sigma * CentreA, 0.01);
    }

    [Fact]
    public void Noise_alone_leaves_the_line_where_the_answer_puts_it()
    {
        for (var i = 0; i < 100; i++)
        {
            var line = Fit(Spectrum(0.05).AddNoise(RandomSource.ForMember(22, (ulong)i)));
            Assert.InRange(Math.Exp(line.Centre), CentreA - 3 * SigmaA, CentreA + 3 * SigmaA);
            Assert.InRange(Math.Abs(line.Significance), 0, 5);
        }
    }

    [Fact]
    public void A_line_on_unusable_pixels_is_not_measured()
    {
        var spectrum = Spectrum(0.05).Spectrum();
        for (var i = 0; i < spectrum.Count; i++)
            if (Math.Abs(Math.Exp(spectrum.LnWavelength[i]) - CentreA) < 4) spectrum.Weight[i] = 0;

        Assert.Null(GaussianFit.Fit(spectrum, spectrum.Flux, Shape(Spectrum(0.05)), []));
    }

    [Fact]
    public void Misfits_enlarge_the_errors()
    {
        // Ripples of ten times the stated noise.
        var clean = Spectrum(0.01).Add(CentreA, SigmaA, 3);
        var rippled = Spectrum(0.01).Add(CentreA, SigmaA, 3);
        for (var i = 0; i < rippled.Flux.Length; i++) rippled.Flux[i] += 0.1 * (i % 2 == 0 ? 1 : -1);

        Assert.InRange(Fit(rippled).FluxErr / Fit(clean).FluxErr, 8, 12);
    }

    private static Sampled Spectrum(double noise) => new(4800, 0.5, 800, noise, SigmaA / CentreA * Velocity.SpeedOfLightKmS);

    private static LineShape Shape(Sampled spectrum) =>
        new(Math.Log(CentreA), spectrum.InstrumentLn, 1.5 * spectrum.InstrumentLn, 0.5 * spectrum.InstrumentLn);

    private static FittedLine Fit(Sampled spectrum)
    {
        var pixels = spectrum.Spectrum();
        return GaussianFit.Fit(pixels, pixels.Flux, Shape(spectrum), [])!;
    }

    /// <summary>Mean 0 and scatter 1 within three standard errors of a sample of this size.</summary>
    private static void AssertUnitPulls(double[] pulls)
    {
        var mean = pulls.Average();
        var scatter = Math.Sqrt(pulls.Average(p => (p - mean) * (p - mean)));
        Assert.InRange(mean, -3 / Math.Sqrt(pulls.Length), 3 / Math.Sqrt(pulls.Length));
        Assert.InRange(scatter, 1 - 3 / Math.Sqrt(2 * pulls.Length), 1 + 3 / Math.Sqrt(2 * pulls.Length));
    }
}
