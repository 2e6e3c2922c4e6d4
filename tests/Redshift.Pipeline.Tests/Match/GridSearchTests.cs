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
