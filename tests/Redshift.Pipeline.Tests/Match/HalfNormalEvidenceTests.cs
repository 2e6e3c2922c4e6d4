using System.Runtime.Intrinsics;
using CsCheck;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.Integration;
using Redshift.Pipeline.Match.Models;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class HalfNormalEvidenceTests
{
    private static readonly Gen<(double Gradient, double Curvature, double Mean, double Spread)> Cases =
        from snr in Gen.Double[-8, 25]
        from curvature in Gen.Double[-4, 4]
        from ratio in Gen.Double[0, 4]
        from spread in Gen.Double[0.5, 100]
        let m = Math.Pow(10, curvature) / (spread * spread)
        select (snr * Math.Sqrt(m), m, ratio * spread, spread);

    [Fact]
    public void LnTail_is_the_normal_distribution()
    {
        for (var x = -20.0; x <= 8; x += 0.01) Assert.Equal(Math.Log(Normal.CDF(0, 1, x)), HalfNormalEvidence.LnTail(x), 2e-3);
    }

    [Fact]
    public void Bayes_factor_is_the_integral_of_likelihood_times_prior() => Cases.Sample(c =>
        Assert.Equal(Integral(c.Gradient, c.Curvature, c.Mean, c.Spread), HalfNormalEvidence.LnBayesFactor(c.Gradient, c.Curvature, c.Mean, c.Spread), 4e-3));

    [Fact]
    public void Mixture_weighs_presence_against_absence() => Gen.Select(Cases, Gen.Double[0.02, 0.95]).Sample((c, absent) =>
    {
        var bayes = HalfNormalEvidence.LnBayesFactor(c.Gradient, c.Curvature, c.Mean, c.Spread);
        var mixture = HalfNormalEvidence.LnMixture(c.Gradient, c.Curvature, c.Mean, c.Spread, absent);
        Assert.Equal(Math.Log(absent + (1 - absent) * Math.Exp(Math.Min(bayes, 700))), mixture, bayes < 700 ? 1e-9 : double.PositiveInfinity);
        Assert.InRange(mixture, Math.Log(absent), double.PositiveInfinity);
    });

    [Fact]
    public void Eight_at_once_in_the_search_agree_with_the_formula() => Gen.Select(Cases, Gen.Double[0.02, 0.95], Gen.Double[0.1, 10]).Sample((c, absent, level) =>
    {
        var group = new EmissionGroup { Name = "", Lines = [], Mean = c.Mean, Spread = c.Spread, Absent = absent };
        var (gradient, curvature) = ((float)(c.Gradient / level), (float)(c.Curvature / level / level));
        var expected = HalfNormalEvidence.LnMixture(gradient, curvature, c.Mean * level, c.Spread * level, absent);
        var found = group.Evidence.LnMixture(Vector256.Create(gradient), Vector256.Create(curvature), Vector256.Create((float)level));
        Assert.Equal(expected, found[0], 5e-3 + 1e-6 * Math.Abs(expected));
        Assert.Equal(Vector256.Create(found[0]), found);
    });

    /// <summary>ln of ∫ exp(v·a − M·a²/2) N(a; μ, s²)/Φ(μ/s) da over a ≥ 0, in pieces about the maximum.</summary>
    private static double Integral(double gradient, double curvature, double mean, double spread)
    {
        double Exponent(double a) => gradient * a - 0.5 * curvature * a * a - 0.5 * (a - mean) * (a - mean) / (spread * spread);
        double m = curvature + 1 / (spread * spread), v = gradient + mean / (spread * spread), peak = Math.Max(0, v / m);
        var reach = Math.Min(12 / Math.Sqrt(m), v < 0 ? 40 / -v : double.PositiveInfinity);
        double from = Math.Max(0, peak - reach), width = (peak + reach - from) / 40;
        var sum = Enumerable.Range(0, 40).Sum(i => GaussLegendreRule.Integrate(a => Math.Exp(Exponent(a) - Exponent(peak)), from + i * width, from + (i + 1) * width, 16));
        return Math.Log(sum) + Exponent(peak) - Math.Log(spread * Math.Sqrt(2 * Math.PI) * Normal.CDF(0, 1, mean / spread));
    }
}
