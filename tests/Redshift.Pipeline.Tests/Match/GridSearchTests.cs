using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Redshift.Simulation;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class GridSearchTests
{
    private const ulong Seed = 20;

    /// <summary>
    /// Without the truth among the peaks no later stage can find it. Measured over simulated survey spectra, which are not drawn from the
    /// models that are searched, with a signal to noise above 2 a pixel.
    /// </summary>
    [Theory]
    [InlineData("star", 30, 0.95)]
    [InlineData("galaxy", 30, 0.95)]
    [InlineData("quasar", 30, 0.8)]
    public void The_truth_is_among_the_peaks(string objectClass, int count, double recall)
    {
        var mix = SurveyMix.Default.Only(["fibre", "three-arms"], [objectClass]);
        var drawn = SimulatedSurvey.Draw(Seed, 4 * count, mix).Where(s => s.MedianSnr > 2).Take(count).ToList();
        Assert.Equal(count, drawn.Count);
        var found = drawn.Count(Finds);
        Assert.InRange(found, recall * count, count);
    }

    [Fact]
    public void Only_the_expected_kind_is_searched()
    {
        var cells = CellsOf(SimulatedSurvey.Observe(3, "fibre", "galaxy-passive", 0.2, 10));
        var peaks = new GridSearch(cells, new MatchSettings { Expect = ObjectKind.Quasar, ZMin = 0.1, ZMax = 3 }).Peaks();
        Assert.NotEmpty(peaks);
        Assert.All(peaks, p => Assert.Equal(ObjectKind.Quasar, p.Model.Kind));
        Assert.All(peaks, p => Assert.InRange(p.LnShift, Math.Log(1.1) - Cells.Step, Math.Log(4) + Cells.Step));
    }

    /// <summary>One hit of a cosmic ray or a remnant of the sky is claimed by every group of lines; it must not outweigh a galaxy seen by its stars.</summary>
    [Fact]
    public void A_spike_does_not_hide_a_galaxy_without_lines()
    {
        var simulated = SimulatedSurvey.Observe(4, "fibre", "galaxy-passive", 0.3, 8);
        var spectrum = simulated.Spectra[0];
        foreach (var at in new[] { 1500, 2600, 3300 })
            for (var i = at; i < at + 4; i++) spectrum.Flux[i] += 25 / Math.Sqrt(Math.Max(1e-9, spectrum.InverseVariance![i]));
        var best = new GridSearch(CellsOf(simulated), new MatchSettings()).Peaks().Where(p => p.Model.Kind == ObjectKind.Galaxy).MaxBy(p => p.LnEvidence);
        Assert.Equal(Math.Log(1.3), best.LnShift, 0.003);
    }

    private static bool Finds(SimulatedObservation simulated)
    {
        var kind = Enum.Parse<ObjectKind>(simulated.Kind.ToString());
        var observation = Normalizer.Normalize(simulated.ToObservation());
        var reach = PosteriorSum.ToleranceKmS(kind, observation.Resolution) / 299792.458;
        return new GridSearch(Cells.Build(observation.Spectra, ModelError.Uniform), new MatchSettings()).Peaks()
            .Exists(p => p.Model.Kind == kind && Math.Abs(p.LnShift - Math.Log(1 + simulated.Z!.Value)) < reach);
    }

    private static Cells CellsOf(SimulatedObservation simulated) =>
        Cells.Build(Normalizer.Normalize(simulated.ToObservation()).Spectra, ModelError.Uniform);
}
