using Redshift.Physics.Lines;
using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Xunit;

namespace Redshift.Pipeline.Tests.Measure;

/// <summary>A galaxy of planted emission lines on a flat continuum, through the whole pipeline.</summary>
public sealed class MeasurementTests
{
    private const double Z = 0.08;
    private const double Noise = 0.05;
    private const double StepA = 1.2;
    private const double FwhmKmS = 200;

    /// <summary>Observed fluxes with the continuum at 1: Case B, [O III] 2.98, [N II] 3.05.</summary>
    private static readonly Dictionary<string, double> Planted = new()
    {
        ["[O II] 3726"] = 6,
        ["[O II] 3729"] = 8,
        ["H gamma"] = 4.7,
        ["H beta"] = 10,
        ["[O III] 4959"] = 10.07,
        ["[O III] 5007"] = 30,
        ["[N II] 6548"] = 3.28,
        ["H alpha"] = 28.6,
        ["[N II] 6583"] = 10,
        ["[S II] 6716"] = 6,
        ["[S II] 6731"] = 4.5,
    };

    private static readonly ObservationResult Result = new ObservationPipeline(new PipelineSettings()).Analyze(Galaxy(masked: null));

    [Fact]
    public void The_account_closes()
    {
        var counted = Result.Lines.Sum(l => l.LnLikelihoodGain ?? 0) + Result.OtherFeaturesLnGain + Result.PriorAndVolumeLnGain;

        Assert.Equal(Result.Candidates[0].LnEvidence, counted!.Value, 1e-6);
        Assert.True(Result.Lines.Sum(l => l.LnLikelihoodGain ?? 0) > 0.5 * Result.Candidates[0].LnEvidence);
    }

    [Fact]
    public void Planted_lines_are_matched_with_their_fluxes()
    {
        Assert.Equal(Z, Result.ZFile!.Value, 1e-4);
        foreach (var (name, flux) in Planted)
        {
            var line = Line(name);
            Assert.Equal(LineState.Matched, line.State);
            Assert.InRange((line.Flux!.Value - flux) / line.FluxErr!.Value, -4, 4);
            Assert.InRange(line.OffsetKmS!.Value / line.OffsetErrKmS!.Value, -4.5, 4.5);
        }
    }

    [Fact]
    public void Strong_lines_have_the_planted_width_and_equivalent_width()
    {
        var line = Line("[O III] 5007");

        // FWHM 200 km/s of the line, 150 of the instrument; the continuum is 1, so W = -F / (1+z).
        Assert.Equal(250, line.FwhmObservedKmS!.Value, 12.0);
        Assert.Equal(FwhmKmS, line.FwhmIntrinsicKmS!.Value, 15.0);
        Assert.InRange((line.EquivalentWidthRestA!.Value + 30 / (1 + Z)) / line.EquivalentWidthErrA!.Value, -4, 4);
    }

    [Fact]
    public void Counts_ladder_and_cautions_follow()
    {
        Assert.InRange(Result.LinesMatched, 9, Result.LinesExpected);
        Assert.InRange(Result.ZeroPointKmS!.Value / Result.ZeroPointErrKmS!.Value, -4, 4);
        Assert.DoesNotContain("one-line-only", Result.Cautions);
        Assert.DoesNotContain("covers-few-lines", Result.Cautions);
    }

    [Fact]
    public void A_line_on_unusable_pixels_is_masked_and_a_missing_one_has_a_limit()
    {
        var result = new ObservationPipeline(new PipelineSettings()).Analyze(Galaxy(masked: "H alpha", without: "H beta"));

        Assert.Equal(Z, result.ZFile!.Value, 1e-4);
        Assert.Equal(LineState.Masked, result.Lines.Single(l => l.Line == "H alpha").State);
        Assert.DoesNotContain(result.Lines, l => l.Line == "H beta" && l.State == LineState.Matched);
    }

    [Fact]
    public void A_strange_feature_is_reported_unexplained()
    {
        var result = new ObservationPipeline(new PipelineSettings()).Analyze(Galaxy(masked: null, strangeA: 6100));
        var line = result.Lines.Single(l => l.State == LineState.Unexplained);

        Assert.Equal(6100, line.ObservedVacuumA!.Value, 1.0);
        Assert.Null(line.RestVacuumA);
        Assert.InRange((line.Flux!.Value - 6) / line.FluxErr!.Value, -4, 4);
    }

    private static LineMeasurement Line(string name) => Result.Lines.Single(l => l.Line == name);

    private static Observation Galaxy(string? masked, string? without = null, double strangeA = 0)
    {
        var random = new RandomSource(41);
        double[] wavelength = [.. Enumerable.Range(0, 3200).Select(i => 3800 + i * StepA)];
        double[] flux = [.. wavelength.Select(_ => 1 + Noise * random.Normal())], weight = [.. wavelength.Select(_ => 1 / (Noise * Noise))];
        foreach (var (name, strength) in Planted)
        {
            var centre = LineList.Find(name).VacuumAngstrom * (1 + Z);
            if (name != without) AddLine(wavelength, flux, centre, strength);
            for (var i = 0; i < weight.Length; i++)
                if (name == masked && Math.Abs(wavelength[i] - centre) < 12) weight[i] = 0;
        }

        if (strangeA > 0) AddLine(wavelength, flux, strangeA, 6);
        return new()
        {
            Source = "planted",
            Row = 0,
            Medium = WavelengthMedium.Vacuum,
            Frame = VelocityFrame.Barycentric,
            Spectra =
            [
                new()
                {
                    Wavelength = wavelength, Flux = flux, InverseVariance = weight, HasErrors = true, ResolutionFrom = ResolutionSource.File,
                    FwhmKmS = [.. wavelength.Select(_ => 150f)],
                },
            ],
        };
    }

    private static void AddLine(double[] wavelength, double[] flux, double centre, double strength)
    {
        var sigma = centre * Math.Sqrt(FwhmKmS * FwhmKmS + 150 * 150) / 2.3548200450309493 / Velocity.SpeedOfLightKmS;
        for (var i = 0; i < flux.Length; i++)
            flux[i] += strength / (Math.Sqrt(2 * Math.PI) * sigma) * Math.Exp(-0.5 * Math.Pow((wavelength[i] - centre) / sigma, 2));
    }
}
