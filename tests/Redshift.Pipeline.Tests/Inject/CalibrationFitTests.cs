using CsCheck;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Inject;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;
using Xunit;

namespace Redshift.Pipeline.Tests.Inject;

public sealed class CalibrationFitTests
{
    private const int Count = 2000;

    private static readonly ConfidenceMap Known = new ConfidenceMaps().Galaxy;

    // Offsets and slopes as far from the known map as its priors allow in most cases.
    private static readonly Gen<(ConfidenceMap Map, ulong Seed)> Maps = Gen.Select(
        Gen.Double[-2.5, 0.5], Gen.Double[0, 0.5], Gen.Double[0.7, 1.3], Gen.Double[0, 0.4], Gen.ULong,
        (offset, near, far, misfit, seed) => (new ConfidenceMap(offset, near, far, misfit), seed));

    [Fact]
    public void A_known_map_is_recovered_within_its_errors() => Maps.Sample(
        sample =>
        {
            var cases = Answers(sample.Map, sample.Seed);
            var fitted = new CalibrationFit(Known).Fit(cases);

            // Twice the count times the divergence of a map of four fitted numbers from the truth is χ² of 4 degrees of freedom:
            // above 30 in one case of 200,000. Some slack for the pull of the priors.
            var divergence = cases.Average(c => Divergence(c.Forecast(sample.Map).Probability, c.Forecast(fitted).Probability));
            Assert.InRange(2 * Count * divergence, 0, 40);
        },
        iter: 20);

    [Fact]
    public void Few_answers_change_a_map_little()
    {
        var fitted = new CalibrationFit(Known).Fit([.. Answers(Known with { Offset = Known.Offset - 1.5 }, 3).Take(4)]);
        Assert.InRange(fitted.Offset, Known.Offset - 0.7, Known.Offset + 0.7);
    }

    [Fact]
    public void Better_evidence_never_means_less_confidence()
    {
        // Right answers where the odds are bad and wrong ones where they are good.
        CalibrationCase[] odd = [.. Enumerable.Range(0, 400).Select(i => new CalibrationCase(ObjectKind.Galaxy, i % 20, 0, 1, i % 20 < 10))];
        var fitted = new CalibrationFit(Known, latitude: 10).Fit(odd);
        Assert.InRange(fitted.Near, 0, 1e-3);
        Assert.InRange(fitted.Far, 0, 1e-3);
    }

    [Fact]
    public void Left_out_answers_are_judged_by_the_others()
    {
        var cases = Answers(Known, 5);
        var forecasts = new CalibrationFit(Known).CrossValidated(cases);
        Assert.Equal(cases.Select(c => c.Right), forecasts.Select(f => f.Right));
        // Close to the score of the true map, and no better than that of a map that has seen the answers.
        var truth = Measures.LogLoss([.. cases.Select(c => c.Forecast(Known))]);
        var fitted = new CalibrationFit(Known).Fit(cases);
        var seen = Measures.LogLoss([.. cases.Select(c => c.Forecast(fitted))]);
        Assert.InRange(Measures.LogLoss(forecasts), seen, truth + 0.01);
    }

    internal static List<CalibrationCase> Answers(ConfidenceMap truth, ulong seed, int count = Count, ObjectKind kind = ObjectKind.Galaxy)
    {
        var random = RandomSource.ForMember(seed, 0);
        return [.. Enumerable.Range(0, count).Select(_ =>
        {
            double lnOdds = random.Exponential(12) - 2, misfit = Math.Abs(random.Normal(0, 1)), within = random.Uniform(0.9, 1);
            return new CalibrationCase(kind, lnOdds, misfit, within, random.Chance(truth.Confidence(lnOdds, misfit, within)));
        })];
    }

    private static double Divergence(double truth, double stated) =>
        truth * Math.Log(truth / stated) + (1 - truth) * Math.Log((1 - truth) / (1 - stated));
}
