using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Redshift.Simulation;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

/// <summary>Worker count and order cannot change an answer: the same bits come out whoever computes them, and whatever was computed before.</summary>
public class DeterminismTests
{
    private static readonly Observation[] Observations =
    [
        SimulatedSurvey.Observe(1, "fibre", "galaxy-star-forming", 0.4, 5).ToObservation(),
        SimulatedSurvey.Observe(2, "three-arms", "quasar", 2.1, 3).ToObservation(),
        SimulatedSurvey.Observe(3, "fibre", "star-k", 0.0001, 12).ToObservation(),
    ];

    [Fact]
    public async Task Repetition_and_threads_change_nothing()
    {
        var pipeline = new ObservationPipeline(new PipelineSettings());
        var first = Observations.Select(pipeline.Analyze).ToList();
        var again = Observations.Reverse().Select(pipeline.Analyze).Reverse();
        var threads = await Task.WhenAll(Observations.Select(o => Task.Run(() => new ObservationPipeline(new PipelineSettings()).Analyze(o))));
        Assert.All(first.Zip(again), pair => AssertSame(pair.First, pair.Second));
        Assert.All(first.Zip(threads), pair => AssertSame(pair.First, pair.Second));
    }

    /// <summary>Arrays and lists by their elements, the rest as records compare.</summary>
    private static void AssertSame(ObservationResult expected, ObservationResult actual)
    {
        Assert.Equal(expected.Candidates, actual.Candidates);
        Assert.Equal(expected.Lines, actual.Lines);
        Assert.Equal(expected.Cautions, actual.Cautions);
        Assert.Equal(expected.Curves.SelectMany(c => c.Model), actual.Curves.SelectMany(c => c.Model));
        Assert.Equal(expected.Curves.SelectMany(c => c.Continuum), actual.Curves.SelectMany(c => c.Continuum));
        Assert.Equal(Plain(expected), Plain(actual));
    }

    private static ObservationResult Plain(ObservationResult result) => result with { Candidates = [], Lines = [], Cautions = [], Curves = [] };
}
