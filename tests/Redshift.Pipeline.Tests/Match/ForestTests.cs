using CsCheck;
using Redshift.Pipeline.Match.Models;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class ForestTests
{
    private static readonly Gen<double> Shifts = Gen.Double[Math.Log(1.5), Math.Log(8)];

    [Fact]
    public void Lines_lie_where_hydrogen_has_them()
    {
        // NIST: Lyman alpha 1215.670 Å, Lyman beta 1025.722 Å, limit 911.753 Å, in vacuum.
        Assert.Equal(1215.670, Math.Exp(Forest.LnLymanAlpha), 1e-3);
        var z = Math.Log(4);
        Assert.InRange(Forest.Transmission(Math.Log(1025.721) + z, z) / Forest.Transmission(Math.Log(1025.723) + z, z), 0, 0.99);
        Assert.InRange(Forest.Transmission(Math.Log(911.752) + z, z) / Forest.Transmission(Math.Log(911.754) + z, z), 0, 0.9);
    }

    [Fact]
    public void Nothing_is_absorbed_redward_of_Lyman_alpha() => Gen.Select(Shifts, Gen.Double[1e-9, 2]).Sample((z, beyond) =>
        Assert.Equal(1, Forest.Transmission(Forest.LnLymanAlpha + z + beyond, z)));

    [Fact]
    public void Farther_gas_absorbs_more() => Gen.Select(Shifts, Shifts).Sample((a, b) =>
    {
        var (near, far) = (Math.Min(a, b), Math.Max(a, b));
        double Below(double z) => Forest.Transmission(Forest.LnLymanAlpha + z - 0.02, z);
        Assert.InRange(Below(far), 0, Below(near));
    });

    [Fact]
    public void The_instrument_rounds_the_step_and_joins_it_smoothly() => Gen.Select(Shifts, Gen.Double[1e-4, 3e-3]).Sample((z, sigma) =>
    {
        var edge = Forest.LnLymanAlpha + z;
        double At(double sigmas) => Forest.Transmission(edge + sigmas * sigma, z, sigma);
        var below = Forest.Transmission(edge - 1e-9, z);
        Assert.Equal(0.5 * (1 + below), At(0), 1e-3);
        Assert.Equal(1, At(3.01));
        Assert.InRange(At(2.99), 0.997, 1);
        // What the transmission itself changes in three σ adds to what the step leaves.
        Assert.Equal(At(-3.01), At(-2.99), 2e-3 + 12 * sigma);
        Assert.All(Enumerable.Range(-29, 58), i => Assert.InRange(At(0.1 * i), At(0.1 * (i - 1)) - 12 * sigma, 1));
    });

    [Fact]
    public void Scatter_is_greatest_half_way_between_dark_and_clear()
    {
        Assert.Equal(0, Forest.Scatter(0));
        Assert.Equal(0, Forest.Scatter(1));
        Assert.All(Enumerable.Range(0, 101), i => Assert.InRange(Forest.Scatter(0.01 * i), 0, Forest.Scatter(0.5)));
    }
}
