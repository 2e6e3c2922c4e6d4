using MathNet.Numerics.Integration;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class RedshiftPriorTests
{
    private static readonly SpreadOfLight Survey = new(2000, 5, 1);

    private static readonly MatchSettings Settings = new() { PriorStar = 2, PriorGalaxy = 3, PriorQuasar = 0.5, PriorNebula = 0.25 };

    /// <summary>Over the grid from −0.01 to 7.5 a kind has the weight that the settings give it.</summary>
    [Theory]
    [InlineData(ObjectKind.Star, 2)]
    [InlineData(ObjectKind.Galaxy, 3)]
    [InlineData(ObjectKind.Quasar, 0.5)]
    [InlineData(ObjectKind.Nebula, 0.25)]
    public void The_density_integrates_to_the_weight_of_the_kind(ObjectKind kind, double weight)
    {
        double Density(double lnShift) => Math.Exp(RedshiftPrior.LnDensity(kind, lnShift, Survey, Settings));
        var pieces = new[] { Math.Log(0.99), -0.003, -0.001, -0.0003, 0, 0.0003, 0.001, 0.0025, 0.0035, 0.01, 0.1, Math.Log(8.5) };
        var total = pieces.Zip(pieces.Skip(1), (from, to) => GaussLegendreRule.Integrate(Density, from, to, 64)).Sum();
        Assert.Equal(weight, total, 0.01 * weight);
    }

    [Fact]
    public void Stars_are_slow_and_galaxies_are_not_among_them()
    {
        double Ratio(double kmS) => RedshiftPrior.LnDensity(ObjectKind.Star, kmS / 299792.458, Survey, Settings) - RedshiftPrior.LnDensity(ObjectKind.Galaxy, kmS / 299792.458, Survey, Settings);
        Assert.InRange(Ratio(0), 1000, double.PositiveInfinity);
        Assert.InRange(Ratio(500), 1000, double.PositiveInfinity);
        Assert.InRange(Ratio(2000), double.NegativeInfinity, -10);
    }

    [Fact]
    public void Who_expects_galaxies_gets_them_at_any_velocity()
    {
        var expecting = Settings with { Expect = ObjectKind.Galaxy };
        Assert.Equal(RedshiftPrior.LnDensity(ObjectKind.Galaxy, 0.01, Survey, Settings), RedshiftPrior.LnDensity(ObjectKind.Galaxy, 1e-5, Survey, expecting), 0.02);
    }

    [Fact]
    public void High_resolving_power_is_for_bright_objects()
    {
        static double Galaxy(double resolution, double snr, double range = 1) => RedshiftPrior.LnDensity(ObjectKind.Galaxy, 0.1, new(resolution, snr, range), Settings);
        Assert.Equal(Galaxy(500, 100), Galaxy(4000, 100));
        Assert.InRange(Galaxy(4000, 100) - Galaxy(40000, 100), 50, 70);
        Assert.Equal(0.1 * (Galaxy(4000, 10) - Galaxy(40000, 10)), Galaxy(4000, 1) - Galaxy(40000, 1), 1e-9);
        Assert.Equal(Galaxy(4000, 100), Galaxy(4000, 100, 0.02));
        Assert.InRange(Galaxy(12000, 100) - Galaxy(12000, 100, 0.02), 50, 70);
        Assert.Equal(RedshiftPrior.LnDensity(ObjectKind.Star, 0, new(500, 100, 1), Settings), RedshiftPrior.LnDensity(ObjectKind.Star, 0, new(40000, 100, 0.02), Settings));
    }
}
