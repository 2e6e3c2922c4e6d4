using Redshift.Physics.Statistics;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Results;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Match;

public class ModelFitTests
{
    private const double LnShift = 0.03;
    private const double Sigma = 0.05;

    /// <summary>Clear of the Earth's bands, which would weigh less.</summary>
    private static readonly double[] Ln = LnWavelengths(4700, 5450);

    /// <summary>Strong lines, certain to be there, so that the cut at zero of their amplitudes plays no part.</summary>
    private static readonly EmissionGroup Oxygen = Group("oxygen", 60, 15, new(5008.24, 1), new(4960.295, 1 / 2.98));

    /// <summary>Overlaps with the weaker line of the first.</summary>
    private static readonly EmissionGroup Blend = Group("blend", 40, 10, new(4963, 1), new(4862.683, 0.7));

    private static readonly Template Stars = new("stars", ObjectKind.Galaxy, Lined(1));
    private static readonly Template Partner = new("partner", ObjectKind.Galaxy, Lined(2));

    private static readonly FitModel Model = new() { Kind = ObjectKind.Galaxy, Name = "test", Template = Stars, Partners = [Partner], Groups = [Oxygen, Blend] };

    private static readonly FitModel LinesOnly = new() { Kind = ObjectKind.Galaxy, Name = "lines", Groups = [Oxygen, Blend] };

    [Fact]
    public void Evidence_model_and_amplitudes_are_those_of_one_dense_solution()
    {
        var pixels = Pixels(Ln, x => Star(x) * (1 + 0.1 * (x - 8.5)) + Emission(x, 60, 40), 1);
        var fit = new ModelFit(pixels);
        var evidence = fit.Fit(Model, LnShift);

        var (stars, partner) = (Rendered(Stars, pixels), Rendered(Partner, pixels));
        var smooth = new DenseFit(pixels, stars).Smooth(pixels);
        // σ of a partner's share 0.5, of the contrast 0.3.
        var dense = new DenseFit(
            pixels, stars,
            new([.. smooth.Select((s, p) => s * (partner[p] - stars[p]))], 0, 0.5), new([.. smooth.Select((s, p) => s * (stars[p] - 1))], 0, 0.3),
            new(Column(pixels, Oxygen), 60, 15), new(Column(pixels, Blend), 40, 10));
        Assert.InRange(evidence, 1000, 1e6);
        Assert.Equal(dense.LnEvidence - Null(pixels), evidence, 2e-4 * evidence);
        Assert.All(fit.Curves().Model.Zip(dense.Model), pair => Assert.Equal(pair.Second, pair.First, 2e-3));
        Assert.Equal([Oxygen, Blend], fit.Amplitudes.Select(a => a.Group));
        Assert.Equal(dense.Amplitude(2), fit.Amplitudes[0].Amplitude, 0.02);
        Assert.Equal(dense.Amplitude(3), fit.Amplitudes[1].Amplitude, 0.02);
    }

    [Fact]
    public void What_is_remembered_is_what_was_fitted()
    {
        var fit = new ModelFit(Pixels(Ln, x => Star(x) + Emission(x, 60, 40), 9));
        double mixed = fit.LnEvidence(Model, LnShift), alone = fit.LnEvidence(Model, LnShift, mixed: false), aside = fit.LnEvidence(Model, LnShift + 1e-3);
        Assert.Equal(3, new HashSet<double> { mixed, alone, aside }.Count);
        Assert.Equal([mixed, alone, aside], [fit.LnEvidence(Model, LnShift), fit.LnEvidence(Model, LnShift, mixed: false), fit.LnEvidence(Model, LnShift + 1e-3)]);
        Assert.Equal([mixed, alone, aside], [fit.Fit(Model, LnShift), fit.Fit(Model, LnShift, mixed: false), fit.Fit(Model, LnShift + 1e-3)]);
    }

    [Fact]
    public void A_featureless_model_is_the_null()
    {
        var fit = new ModelFit(Pixels(Ln, _ => 1, 2));
        Assert.Equal(0, fit.LnEvidence(new FitModel { Kind = ObjectKind.Galaxy, Name = "nothing" }, LnShift), 1e-9);
        Assert.Equal(-2, fit.LnEvidence(new FitModel { Kind = ObjectKind.Galaxy, Name = "nothing", LnPrior = -2 }, LnShift), 1e-9);
    }

    [Fact]
    public void Amplitudes_of_planted_lines_are_equivalent_widths_with_honest_errors()
    {
        double[] found = [.. Enumerable.Range(0, 40).Select(seed => Amplitude(Pixels(Ln, x => 1 + Emission(x, 20, 0), (ulong)seed)))];
        var scatter = Math.Sqrt(found.Average(a => (a - found.Average()) * (a - found.Average())));
        // Noise over the root of the lines' own square; the spline and imperfect weights add a little. Forty draws tell the scatter to 11 %.
        var least = Sigma / Math.Sqrt(Ln.Sum(x => Math.Pow(Profile(x, Oxygen), 2)));
        Assert.InRange(scatter, 0.75 * least, 1.5 * least);
        Assert.Equal(20, found.Average(), 4 * scatter / Math.Sqrt(found.Length));
    }

    [Fact]
    public void Absorption_is_no_emission_line()
    {
        var fit = new ModelFit(Pixels(Ln, x => 1 - Emission(x, 8, 0), 3));
        var perhaps = LinesOnly with { Groups = [new EmissionGroup { Name = "perhaps", Lines = Oxygen.Lines, Mean = 0, Spread = 30, Absent = 0.5 }] };
        Assert.InRange(fit.Fit(perhaps, LnShift), Math.Log(0.5) - 1e-6, 0);
        Assert.Equal(0, Assert.Single(fit.Amplitudes).Amplitude);
    }

    [Fact]
    public void The_unit_of_the_flux_does_not_matter()
    {
        var run = Spectra.Run(Ln, x => Star(x) + Emission(x, 60, 40), Sigma, 4);
        float[] Times(float[] values, float factor) => Array.ConvertAll(values, v => v * factor);
        var bright = run with { Flux = Times(run.Flux, 8), Weight = Times(run.Weight, 1 / 64f), Continuum = Times(run.Continuum, 8), Baseline = Times(run.Baseline, 8) };
        Assert.Equal(Evidence(run), Evidence(bright), 1e-3);
    }

    [Fact]
    public void Only_the_difference_of_wavelength_and_shift_matters()
    {
        const double Farther = -0.1;
        var fit = Evidence(Spectra.Run(Ln, x => 1 + Emission(x, 60, 40), Sigma, 5));
        var moved = Spectra.Run(Ln, x => 1 + Emission(x, 60, 40), Sigma, 5) with { LnWavelength = Array.ConvertAll(Ln, x => x + Farther) };
        Assert.Equal(fit, new ModelFit(Pixels(moved)).LnEvidence(Model, LnShift + Farther), 1e-2);
    }

    [Fact]
    public void Pixels_without_weight_and_spectra_without_lines_say_nothing()
    {
        var run = Spectra.Run(Ln, x => 1 + Emission(x, 60, 40), Sigma, 6);
        run.Weight.AsSpan(50, 30).Clear();
        var masked = run with { Flux = [.. run.Flux.Select((f, i) => i is >= 50 and < 80 ? 1e4f : f)] };
        Assert.Equal(Lines(run), Lines(masked), 1e-6);
        var elsewhere = Spectra.Run(LnWavelengths(5450, 5850), _ => 1, Sigma, 7);
        Assert.Equal(Lines(run), Lines(run, elsewhere), 1e-6);

        static double Lines(params PixelRun[] runs) => new ModelFit(Pixels(runs)).LnEvidence(LinesOnly, LnShift);
    }

    [Fact]
    public void A_population_older_than_the_Universe_is_impossible() =>
        Assert.Equal(double.NegativeInfinity, new ModelFit(Pixels(Ln, _ => 1, 8)).LnEvidence(Model with { GreatestLnShift = 0.02 }, LnShift));

    private static double Amplitude(FitPixels pixels)
    {
        var wide = new EmissionGroup { Name = "wide", Lines = Oxygen.Lines, Mean = 0, Spread = 1000, Absent = 1e-3 };
        var fit = new ModelFit(pixels);
        fit.Fit(LinesOnly with { Groups = [wide] }, LnShift);
        return fit.Amplitudes[0].Amplitude;
    }

    private static double Evidence(PixelRun run) => new ModelFit(Pixels(run)).LnEvidence(Model, LnShift);

    private static double Null(FitPixels pixels) => new DenseFit(pixels, [.. pixels.Flux.Take(pixels.Count).Select(_ => 1f)]).LnEvidence;

    private static FitPixels Pixels(double[] ln, Func<double, double> flux, ulong seed) => Pixels(Spectra.Run(ln, flux, Sigma, seed));

    private static FitPixels Pixels(params PixelRun[] runs) => FitPixels.Build(runs, ModelError.Uniform, Cells.Step);

    private static EmissionGroup Group(string name, double mean, double spread, params GroupLine[] lines) =>
        new() { Name = name, Lines = lines, Mean = mean, Spread = spread, Absent = 0 };

    private static double Emission(double ln, double oxygen, double blend) => oxygen * Profile(ln, Oxygen) + blend * Profile(ln, Blend);

    /// <summary>Lines of 90 km/s behind an instrument of 70 km/s, as flux for a rest equivalent width of 1 Å, cut at 4σ.</summary>
    private static double Profile(double ln, EmissionGroup group)
    {
        var sigma = Math.Sqrt(90 * 90 + 70 * 70) / 299792.458;
        return group.Lines.Sum(line => (ln - Math.Log(line.RestA) - LnShift) / sigma is var u && Math.Abs(u) > 4 ? 0
            : line.Share / line.RestA * Math.Exp(-0.5 * u * u) / (sigma * Math.Sqrt(2 * Math.PI)));
    }

    private static float[] Column(FitPixels pixels, EmissionGroup group) => [.. pixels.LnWavelength.Take(pixels.Count).Select(x => (float)Profile(x, group))];

    private static double Star(double ln) => Interpolated(Stars.Broadened(LineSpreadLevels.Nearest(70 / 299792.458), Stretch.Whole), ln);

    private static float[] Rendered(Template template, FitPixels pixels) =>
        [.. pixels.LnWavelength.Take(pixels.Count).Select((x, p) => (float)Interpolated(template.Broadened(LineSpreadLevels.Nearest(pixels.SigmaLn[p]), Stretch.Whole), x))];

    private static double Interpolated(float[] rest, double ln)
    {
        var at = (ln - LnShift - TemplateGrid.LnStart) / TemplateGrid.Step;
        var i = (int)at;
        return rest[i] + (at - i) * (rest[i + 1] - rest[i]);
    }

    /// <summary>Twenty seeded absorption lines within the data.</summary>
    private static float[] Lined(ulong seed)
    {
        var random = new RandomSource(seed);
        var flux = Enumerable.Repeat(1f, TemplateGrid.Count).ToArray();
        for (var line = 0; line < 20; line++)
        {
            var at = (random.Uniform(Math.Log(4650), Math.Log(5300)) - TemplateGrid.LnStart) / TemplateGrid.Step;
            var depth = random.Uniform(0.1, 0.5);
            for (var i = (int)at - 40; i < at + 40; i++) flux[i] *= (float)(1 - depth * Math.Exp(-0.5 * Math.Pow((i - at) / 8, 2)));
        }

        return flux;
    }
}
