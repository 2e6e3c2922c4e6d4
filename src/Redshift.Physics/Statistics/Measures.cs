using MathNet.Numerics.Statistics;

namespace Redshift.Physics.Statistics;

/// <summary>Figures of merit of stated probabilities and errors.</summary>
public static class Measures
{
    /// <summary>Brier score (Brier 1950, Mon. Weather Rev. 78, 1): mean squared difference of probability and outcome.</summary>
    public static double Brier(IReadOnlyList<Forecast> forecasts) =>
        forecasts.Average(f => (f.Probability - Outcome(f)) * (f.Probability - Outcome(f)));

    /// <summary>1 − Brier score over that of always stating the mean frequency; NaN where all outcomes are alike.</summary>
    public static double BrierSkill(IReadOnlyList<Forecast> forecasts)
    {
        var frequency = forecasts.Average(Outcome);
        return frequency is 0 or 1 ? double.NaN : 1 - (Brier(forecasts) / (frequency * (1 - frequency)));
    }

    /// <summary>Logarithmic score: mean of −ln of the probability given to what happened, which is held above <paramref name="least"/>.</summary>
    public static double LogLoss(IReadOnlyList<Forecast> forecasts, double least = 1e-4) =>
        forecasts.Average(f => LogLoss(f, least));

    /// <summary>The same of one forecast.</summary>
    public static double LogLoss(Forecast forecast, double least = 1e-4) =>
        -Math.Log(Math.Max(least, forecast.Right ? forecast.Probability : 1 - forecast.Probability));

    /// <summary>Expected calibration error (Naeini et al. 2015): mean |frequency − probability| over equal bins, weighted by their counts.</summary>
    public static double CalibrationError(IReadOnlyList<Forecast> forecasts, int bins = 10) =>
        forecasts.GroupBy(f => Math.Min(bins - 1, (int)(f.Probability * bins)))
            .Sum(bin => Math.Abs(bin.Average(Outcome) - bin.Average(f => f.Probability)) * bin.Count() / forecasts.Count);

    /// <summary>Median; NaN of nothing.</summary>
    public static double Median(IEnumerable<double> values) => ArrayStatistics.MedianInplace(values.ToArray());

    /// <summary>Robust width: median absolute deviation from the median, scaled to σ of a normal law by 1/Φ⁻¹(3/4).</summary>
    public static double RobustWidth(IReadOnlyCollection<double> values) => RobustNoise.SigmaFromMad(values.ToArray());

    /// <summary>Share of the values inside ±limit.</summary>
    public static double ShareWithin(IReadOnlyCollection<double> values, double limit) =>
        values.Count == 0 ? double.NaN : values.Count(value => Math.Abs(value) <= limit) / (double)values.Count;

    private static double Outcome(Forecast forecast) => forecast.Right ? 1 : 0;
}

/// <summary>A stated probability and what came of it.</summary>
public readonly record struct Forecast(double Probability, bool Right);
