using CsCheck;
using MathNet.Numerics.Distributions;
using Redshift.Physics.Statistics;
using Xunit;

namespace Redshift.Physics.Tests.Statistics;

public sealed class StatisticsTests
{
    private static readonly double[] Flux = [100, 102, 99, 101, 98, 103, 100, 97, 101, 99, 100, 104, 96, 100, 101];

    // Stoehr et al. 2008, with their constant 1.482602, evaluated in an independent program.
    [Fact]
    public void Noise_from_second_differences_is_the_worked_value()
        => Assert.Equal(1.8158091958, RobustNoise.FromSecondDifferences(Flux), 5e-7);

    [Fact]
    public void Zeros_are_taken_as_missing()
    {
        double[] withGap = [.. Flux[..7], 0, 0, .. Flux[7..]];
        Assert.Equal(RobustNoise.FromSecondDifferences(Flux), RobustNoise.FromSecondDifferences(withGap));
    }

    [Fact]
    public void Too_few_pixels_give_no_noise()
        => Assert.True(double.IsNaN(RobustNoise.FromSecondDifferences([1, 2, 3, 4])));

    [Fact]
    public void Straight_continuum_does_not_count_as_noise()
        => Gen.Select(Gen.Double[-5, 5], Gen.Double[10, 1000]).Sample((slope, level) =>
        {
            double[] tilted = [.. Flux.Select((value, i) => value + level + slope * i)];
            Assert.Equal(RobustNoise.FromSecondDifferences(Flux), RobustNoise.FromSecondDifferences(tilted), 1e-9);
        });

    // 1 / quantile(0.75) of the normal distribution.
    [Fact]
    public void Mad_constant_is_that_of_the_normal_distribution()
        => Assert.Equal(RobustNoise.SigmaPerMad, 1 / Normal.InvCDF(0, 1, 0.75), 1e-12);

    [Fact]
    public void Mad_ignores_an_outlier()
        => Assert.Equal(RobustNoise.SigmaPerMad, RobustNoise.SigmaFromMad([1, 2, 3, 4, 1e6]), 1e-12);

    // Benjamini and Hochberg 1995, section 4.1: fifteen hypotheses, four rejected at 0.05 where Bonferroni rejects three.
    [Fact]
    public void False_discovery_threshold_reproduces_the_original_example()
    {
        double[] p =
            [0.0001, 0.0004, 0.0019, 0.0095, 0.0201, 0.0278, 0.0298, 0.0344, 0.0459, 0.3240, 0.4262, 0.5719, 0.6528, 0.7590, 1];
        Assert.Equal(0.0095, FalseDiscovery.Threshold(p, 0.05));
        Array.Reverse(p);
        Assert.Equal(0.0095, FalseDiscovery.Threshold(p, 0.05));
    }

    [Fact]
    public void Nothing_significant_gives_no_threshold()
        => Assert.Null(FalseDiscovery.Threshold([0.2, 0.5, 0.9], 0.05));

    // The definitions evaluated in an independent program.
    [Fact]
    public void Scores_are_the_worked_values()
    {
        double[] probabilities = [0.1, 0.3, 0.6, 0.9, 0.8, 0.4];
        bool[] outcomes = [false, false, true, true, true, true];
        Assert.Equal(0.1116667, ProbabilityScores.Brier(probabilities, outcomes), 1e-7);
        Assert.Equal(0.3696093, ProbabilityScores.Logarithmic(probabilities, outcomes), 1e-7);
    }

    [Fact]
    public void Calibration_error_is_the_worked_value()
        => Assert.Equal(
            0.345,
            ProbabilityScores.CalibrationError([0.95, 0.85, 0.92, 0.45, 0.55, 0.15], [true, true, false, false, true, false]),
            1e-12);

    [Fact]
    public void Certainty_that_comes_true_scores_zero()
    {
        double[] probabilities = [1, 0, 1];
        bool[] outcomes = [true, false, true];
        Assert.Equal(0, ProbabilityScores.Brier(probabilities, outcomes));
        Assert.Equal(0, ProbabilityScores.Logarithmic(probabilities, outcomes));
        Assert.Equal(0, ProbabilityScores.CalibrationError(probabilities, outcomes));
    }

    [Fact]
    public void Unpaired_outcomes_are_refused()
        => Assert.Throws<ArgumentException>(() => ProbabilityScores.Brier([0.5], []));
}
