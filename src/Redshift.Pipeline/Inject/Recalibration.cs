using Redshift.Physics.Statistics;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Inject;

/// <summary>What became of the map of one kind of answer.</summary>
public enum MapState
{
    /// <summary>The answers are too few, or nearly all right or nearly all wrong: the map stays as it was.</summary>
    TooFew,

    /// <summary>The map is as good as one that was fitted to the answers: it stays as it was.</summary>
    Kept,

    /// <summary>The answers show that another map is better.</summary>
    Refitted,
}

/// <summary>The map of one kind of answer, held against what was recovered.</summary>
/// <param name="Kind">Galaxy, quasar, or star for all else.</param>
/// <param name="Count">Number of answers.</param>
/// <param name="Right">Right ones among them.</param>
/// <param name="Before">Logarithmic score of the map before, nats an answer; null where there are too few.</param>
/// <param name="After">The same of maps that were fitted to the other answers.</param>
/// <param name="Map">The map that holds from now on.</param>
/// <param name="State">What became of it.</param>
public sealed record RecalibratedMap(ObjectKind Kind, int Count, int Right, double? Before, double? After, ConfidenceMap Map, MapState State);

/// <summary>Fits the maps from evidence to confidence to what was recovered on one instrument, where that supports it.</summary>
public static class Recalibration
{
    /// <summary>Objects without which no kind gets enough answers.</summary>
    public const int LeastObjects = 500;

    /// <summary>Answers of a kind, and right and wrong ones among them, that say something of four numbers with priors.</summary>
    private const int LeastAnswers = 100;
    private const int LeastOfEither = 10;

    /// <summary>Fitted maps have to be better by so many standard errors of the difference.</summary>
    private const double Significant = 2;

    private const double LowestCap = 0.5;

    /// <summary>Answers at and above these confidences are asked how great a confidence can be.</summary>
    private static readonly double[] CapSamples = [0.9, 0.97, 0.99];

    /// <summary>
    /// Holds the maps against what was recovered. How often an answer is right depends on how common each kind is: as long as the user does
    /// not say what is expected, the shares of the injected kinds are arbitrary, and a fit may only lower confidences.
    /// </summary>
    /// <param name="injections">What was recovered.</param>
    /// <param name="settings">What gave the confidences, and what is expected.</param>
    public static IReadOnlyList<RecalibratedMap> Of(IEnumerable<Injection> injections, MatchSettings settings)
    {
        var answers = injections.Select(i => i.Answer).OfType<CalibrationCase>().ToLookup(c => c.MapKind);
        return [.. new[] { ObjectKind.Star, ObjectKind.Galaxy, ObjectKind.Quasar }
            .Select(kind => Of(kind, [.. answers[kind]], settings.Confidence.Of(kind), onlyLower: !settings.StatesKinds))];
    }

    internal static RecalibratedMap Of(ObjectKind kind, IReadOnlyList<CalibrationCase> cases, ConfidenceMap known, bool onlyLower)
    {
        var right = cases.Count(c => c.Right);
        if (cases.Count < LeastAnswers || Math.Min(right, cases.Count - right) < LeastOfEither)
            return new(kind, cases.Count, right, null, null, known, MapState.TooFew);
        var fit = new CalibrationFit(known with { Greatest = onlyLower ? known.Greatest : Calibration.Greatest }, onlyLower: onlyLower);
        double[] before = [.. cases.Select(c => Measures.LogLoss(c.Forecast(known)))], after = [.. fit.CrossValidated(cases).Select(f => Measures.LogLoss(f))];
        var better = IsBetter(before, after);
        return new(kind, cases.Count, right, before.Average(), after.Average(), better ? Capped(fit.Fit(cases), cases) : known, better ? MapState.Refitted : MapState.Kept);
    }

    /// <summary>Every answer is scored twice, so that their differences say how sure the gain is.</summary>
    private static bool IsBetter(double[] before, double[] after)
    {
        double[] gains = [.. before.Zip(after, (b, a) => b - a)];
        var mean = gains.Average();
        return mean > Significant * Math.Sqrt(gains.Average(g => (g - mean) * (g - mean)) / gains.Length);
    }

    /// <summary>
    /// No confidence may be greater than what its best answers support by the rule of succession (Laplace 1774): of n answers without a
    /// mistake, the next is right with a probability of (n + 1)/(n + 2).
    /// </summary>
    private static ConfidenceMap Capped(ConfidenceMap map, IReadOnlyList<CalibrationCase> cases)
    {
        Forecast[] forecasts = [.. cases.Select(c => c.Forecast(map))];
        var supported = CapSamples.Select(least => forecasts.Where(f => f.Probability >= least).ToArray()).Max(f => (f.Count(m => m.Right) + 1.0) / (f.Length + 2));
        return map with { Greatest = Math.Clamp(supported, LowestCap, map.Greatest) };
    }
}
