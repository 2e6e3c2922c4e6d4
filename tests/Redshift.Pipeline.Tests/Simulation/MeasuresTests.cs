using Redshift.Physics.Statistics;
using Xunit;

namespace Redshift.Pipeline.Tests.Simulation;

public class MeasuresTests
{
    private static readonly Forecast[] Six = Forecasts([0.1, 0.3, 0.6, 0.9, 0.8, 0.4], [0, 0, 1, 1, 1, 1]);

    [Fact]
    public void Brier_score_of_a_worked_case() =>
        // (0.01 + 0.09 + 0.16 + 0.01 + 0.04 + 0.36) / 6
        Assert.Equal(0.1116667, Measures.Brier(Six), 7);

    [Fact]
    public void Log_score_of_a_worked_case() =>
        // −(ln 0.9 + ln 0.7 + ln 0.6 + ln 0.9 + ln 0.8 + ln 0.4) / 6
        Assert.Equal(0.3696093, Measures.LogLoss(Six), 7);

    [Fact]
    public void Brier_skill_of_a_worked_case() =>
        // Four of six are right: always saying 2/3 scores 2/9.
        Assert.Equal(1 - (0.1116667 * 9 / 2), Measures.BrierSkill(Six), 6);

    [Fact]
    public void Calibration_error_of_a_worked_case() =>
        // Ten bins, five of them occupied: (2 |1/2 − 0.935| + |1 − 0.85| + |0 − 0.45| + |1 − 0.55| + |0 − 0.15|) / 6.
        Assert.Equal(0.345, Measures.CalibrationError(Forecasts([0.95, 0.85, 0.92, 0.45, 0.55, 0.15], [1, 1, 0, 0, 1, 0])), 12);

    [Fact]
    public void Log_score_limits_the_price_of_certainty() =>
        Assert.Equal(-Math.Log(1e-4), Measures.LogLoss(Forecasts([1], [0])), 12);

    [Fact]
    public void Robust_width_ignores_an_outlier() =>
        // Median 3, absolute deviations 2, 1, 0, 1, 997.
        Assert.Equal(1.4826022185056018, Measures.RobustWidth([1, 2, 3, 4, 1000]), 12);

    [Fact]
    public void Share_within_counts_both_signs() => Assert.Equal(0.5, Measures.ShareWithin([-2, -1, 0.5, 3], 1));

    [Fact]
    public void Reliability_calls_a_lie_off_and_the_truth_not()
    {
        var honest = Forecasts([.. Enumerable.Repeat(0.8, 100)], [.. Enumerable.Range(0, 100).Select(i => i < 79 ? 1 : 0)]);
        var lying = Forecasts([.. Enumerable.Repeat(0.95, 100)], [.. Enumerable.Range(0, 100).Select(i => i < 79 ? 1 : 0)]);
        Assert.False(Assert.Single(Reliability.Table(honest)).Off);
        Assert.True(Assert.Single(Reliability.Table(lying)).Off);
    }

    private static Forecast[] Forecasts(double[] probabilities, int[] outcomes) =>
        [.. probabilities.Zip(outcomes, (p, o) => new Forecast(p, o == 1))];
}
