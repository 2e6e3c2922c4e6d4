using Redshift.Pipeline.Match;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class PosteriorSumTests
{
    private const double Resolution = 2000;

    [Theory]
    [InlineData(ObjectKind.Star, 2000, 100)]
    [InlineData(ObjectKind.Star, 500, 299.79)]
    [InlineData(ObjectKind.Galaxy, 2000, 1000)]
    [InlineData(ObjectKind.Nebula, 2000, 1000)]
    [InlineData(ObjectKind.Quasar, 2000, 3000)]
    public void Each_kind_has_its_tolerance(ObjectKind kind, double resolution, double kmS) =>
        Assert.Equal(kmS, PosteriorSum.ToleranceKmS(kind, resolution), 0.01);

    [Fact]
    public void Kinds_at_one_redshift_add_up_and_rivals_are_elsewhere()
    {
        var decision = Decide(
            Hypothesis(ObjectKind.Galaxy, 30000, 20), Hypothesis(ObjectKind.Quasar, 30900, 19), Hypothesis(ObjectKind.Galaxy, 31100, 18), Hypothesis(ObjectKind.Galaxy, 90000, 17));
        Assert.Equal(ObjectKind.Galaxy, decision.Answer.Fit.Model.Kind);
        Assert.Equal(LnSum(20, 19) - LnSum(18, 17, 0), decision.LnOdds, 1e-9);
        Assert.Equal(LnSum(20, 19), decision.LnOddsFeatures, 1e-9);
        Assert.Equal(1 / (1 + Math.Exp(-1)), decision.KindShare, 1e-9);
        Assert.Equal(Math.Exp(31100 / 299792.458) - 1, decision.Next!.Z, 1e-9);
    }

    [Fact]
    public void Candidates_are_one_a_kind_and_window_and_their_probabilities_add_up_to_one()
    {
        var decision = Decide(
            Hypothesis(ObjectKind.Galaxy, 30000, 20), Hypothesis(ObjectKind.Galaxy, 30500, 20), Hypothesis(ObjectKind.Quasar, 30000, 20.5), Hypothesis(ObjectKind.Star, 100, 10));
        Assert.Equal([ObjectKind.Galaxy, ObjectKind.Quasar, ObjectKind.Star], decision.Candidates.Select(c => c.Kind));
        Assert.Equal(1, decision.Candidates.Sum(c => c.Probability), 1e-12);
        Assert.Equal(Math.Exp(LnSum(20, 20) - LnSum(20, 20, 20.5, 10)), decision.Candidates[0].Probability, 1e-12);
    }

    [Fact]
    public void A_lone_hypothesis_competes_with_a_featureless_spectrum()
    {
        var decision = Decide(Hypothesis(ObjectKind.Galaxy, 30000, 6));
        Assert.Equal(6, decision.LnOdds, 1e-9);
        Assert.Null(decision.Next);
    }

    [Fact]
    public void A_star_whose_lines_are_not_seen_yields_to_what_is_seen()
    {
        var star = Hypothesis(ObjectKind.Star, 0, 8, lnEvidence: 1);
        var galaxy = Hypothesis(ObjectKind.Galaxy, 30000, 5, lnEvidence: 7);
        Assert.Same(galaxy, Decide(star, galaxy).Answer);
        Assert.Same(star, Decide(star).Answer);
    }

    private static Decision Decide(params Hypothesis[] hypotheses) =>
        PosteriorSum.Decide([.. hypotheses.OrderByDescending(h => h.LnWeight)], Resolution);

    private static Hypothesis Hypothesis(ObjectKind kind, double lnShiftKmS, double lnWeight, double lnEvidence = 30) =>
        new(new Refined(new FitModel { Kind = kind, Name = kind.ToString() }, lnShiftKmS / 299792.458, 1e-4, lnEvidence), lnWeight);

    private static double LnSum(params double[] values) => Math.Log(values.Sum(Math.Exp));
}
