using Redshift.Physics.Statistics;
using Redshift.Pipeline.Inject;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Inject;

public sealed class RecalibrationTests : IDisposable
{
    private static readonly ConfidenceMap Known = new ConfidenceMaps().Galaxy;
    private static readonly ConfidenceMap Worse = Known with { Offset = Known.Offset - 1.5 };
    private static readonly ConfidenceMap Better = Known with { Offset = Known.Offset + 1.5 };

    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_map_that_is_true_is_nearly_always_kept()
    {
        var maps = Enumerable.Range(0, 20).Select(seed => Recalibrate(CalibrationFitTests.Answers(Known, (ulong)seed, 400))).ToList();
        Assert.All(maps.FindAll(m => m.State == MapState.Kept), m => Assert.Equal(Known, m.Map));
        // Two standard errors are exceeded upwards by chance once in 44.
        Assert.InRange(maps.Count(m => m.State == MapState.Kept), 18, 20);
    }

    [Fact]
    public void A_map_that_promises_too_much_is_refitted()
    {
        var answers = CalibrationFitTests.Answers(Worse, 1, 600);
        var map = Recalibrate(answers);

        Assert.Equal((MapState.Refitted, 600, answers.Count(a => a.Right)), (map.State, map.Count, map.Right));
        Assert.Equal(Measures.LogLoss([.. answers.Select(a => a.Forecast(Known))]), map.Before!.Value, 1e-9);
        Assert.True(map.After < map.Before - 0.02, $"{map.Before} and {map.After}");
        double Mean(ConfidenceMap m) => answers.Average(a => a.Forecast(m).Probability);
        Assert.InRange(Mean(map.Map), Mean(Worse) - 0.04, Mean(Worse) + 0.04);
    }

    [Fact]
    public void Confidences_rise_only_where_it_is_said_what_is_expected()
    {
        var answers = CalibrationFitTests.Answers(Better, 2, 1000);
        Assert.Equal(MapState.Kept, Recalibrate(answers).State);
        Assert.Equal(MapState.Refitted, Recalibrate(answers, onlyLower: false).State);

        Assert.False(new MatchSettings { ZMax = 2 }.StatesKinds);
        Assert.True(new MatchSettings { Expect = ObjectKind.Star }.StatesKinds);
        Assert.True(new MatchSettings { PriorGalaxy = 3 }.StatesKinds);
    }

    [Theory]
    [InlineData(99, 50)]
    [InlineData(400, 9)]
    [InlineData(400, 391)]
    public void Too_few_answers_of_either_sort_change_nothing(int count, int right)
    {
        var map = Recalibrate([.. Enumerable.Range(0, count).Select(i => Case(5, i < right))]);
        Assert.Equal((MapState.TooFew, Known, null, null), (map.State, map.Map, map.Before, map.After));
    }

    [Fact]
    public void No_confidence_is_greater_than_its_sample_supports()
    {
        // 120 right answers with excellent evidence, and answers of middling evidence of which the known map expects far more to be right.
        CalibrationCase[] answers = [.. Enumerable.Range(0, 120).Select(_ => Case(2000, true)), .. Enumerable.Range(0, 200).Select(i => Case(8, i % 4 == 0))];
        var map = Recalibrate(answers);
        Assert.Equal(MapState.Refitted, map.State);
        Assert.Equal(121 / 122.0, map.Map.Greatest, 1e-12);
        Assert.Equal(map.Map.Greatest, map.Map.Confidence(2000, 0, 1));
    }

    [Fact]
    public void The_file_is_part_of_a_pipeline_file_and_says_what_it_rests_on()
    {
        var map = Recalibrate(CalibrationFitTests.Answers(Worse, 1, 600));
        RecalibratedMap[] maps = [map, new(ObjectKind.Star, 40, 39, null, null, new ConfidenceMaps().Other, MapState.TooFew)];
        var path = _folder.File("part.toml");
        using (var file = new CalibrationFile(path))
        {
            Assert.False(File.Exists(path));
            file.Complete(maps, "700 computed objects");
        }

        var text = File.ReadAllText(path);
        Assert.Contains("# 700 computed objects\n", text, StringComparison.Ordinal);
        Assert.Contains(FormattableString.Invariant($"# galaxy: 600 answers, {map.Right} right; log score {map.Before:0.000} before, {map.After:0.000} after"), text, StringComparison.Ordinal);
        Assert.Contains("# other: 40 answers, 39 right; too few", text, StringComparison.Ordinal);
        var read = PipelineFile.Load(path).Match.Confidence;
        Assert.Equal(new ConfidenceMaps(), read with { Galaxy = Known });
        Assert.Equal(Numbers(map.Map), Numbers(read.Galaxy), SameWhenRounded);
        Assert.InRange(map.Map.Greatest - read.Galaxy.Greatest, 0, 1e-4);
    }

    [Fact]
    public void A_file_that_is_not_completed_leaves_nothing_behind()
    {
        new CalibrationFile(_folder.File("none.toml")).Dispose();
        Assert.Empty(Directory.GetFiles(_folder.Path));
    }

    private static RecalibratedMap Recalibrate(IReadOnlyList<CalibrationCase> cases, bool onlyLower = true) => Recalibration.Of(ObjectKind.Galaxy, cases, Known, onlyLower);

    private static double[] Numbers(ConfidenceMap map) => [map.Offset, map.Near, map.Far, map.Misfit];

    private static bool SameWhenRounded(double expected, double actual) => Math.Abs(expected - actual) <= 0.0005001;

    private static CalibrationCase Case(double lnOdds, bool right) => new(ObjectKind.Galaxy, lnOdds, 0, 1, right);
}
