using Redshift.Physics.Hydrogen;
using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Measure;
using Xunit;

namespace Redshift.Pipeline.Tests.Measure;

public sealed class LadderFitTests
{
    private static readonly double[] Balmer = [.. HydrogenSeries.Balmer.Lines(6).Select(l => l.VacuumAngstrom)];

    [Fact]
    public void Slope_is_one_plus_z_and_intercept_the_zero_point_error()
    {
        var fit = LadderFit.Of([.. Balmer.Select(rest => new Rung(rest, 0.7 + 1.0345 * rest, 0.05))])!;

        Assert.Equal(1.0345, fit.Slope, 1e-10);
        Assert.Equal(0.7, fit.InterceptA, 1e-6);
        Assert.Equal(Velocity.SpeedOfLightKmS * 0.7 / Balmer.Average(rest => 0.7 + 1.0345 * rest), fit.ZeroPointKmS, 1e-4);
    }

    [Fact]
    public void Errors_are_those_of_the_scatter()
    {
        var random = new RandomSource(31);
        double[] errors = [0.05, 0.1, 0.1, 0.2];
        var pulls = Enumerable.Range(0, 2000).Select(_ =>
        {
            var fit = LadderFit.Of([.. Balmer.Select((rest, i) => new Rung(rest, 0.3 + rest + errors[i] * random.Normal(), errors[i]))])!;
            return ((fit.InterceptA - 0.3) / fit.InterceptErrA, (fit.Slope - 1) / fit.SlopeErr);
        }).ToList();

        // With two degrees of freedom the excess factor, at least 1, lowers the pulls by a tenth: √E[1/max(1, χ²/2)] = 0.89.
        Assert.InRange(Math.Sqrt(pulls.Average(p => p.Item1 * p.Item1)), 0.85, 0.94);
        Assert.InRange(Math.Sqrt(pulls.Average(p => p.Item2 * p.Item2)), 0.85, 0.94);
        Assert.InRange(pulls.Average(p => p.Item1), -0.06, 0.06);
    }

    [Fact]
    public void A_misidentified_line_stands_off_the_ladder()
    {
        Rung[] rungs = [.. Balmer.Select((rest, i) => new Rung(rest, 1.01 * rest, 0.05)), new(HydrogenSeries.Paschen.Line(5).VacuumAngstrom, 1.01 * 12821.6 + 20, 5)];
        var fit = LadderFit.Of(rungs)!;

        Assert.Equal(463, fit.ResidualKmS(rungs[^1]), 15.0); // 20 Å of 12950 Å
        Assert.All(rungs.SkipLast(1), r => Assert.InRange(fit.ResidualKmS(r), -10, 10));
    }

    [Fact]
    public void Two_lines_are_no_ladder() => Assert.Null(LadderFit.Of([new(Balmer[0], Balmer[0], 0.1), new(Balmer[1], Balmer[1], 0.1)]));
}
