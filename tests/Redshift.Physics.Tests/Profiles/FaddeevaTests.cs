using System.Numerics;
using CsCheck;
using Redshift.Physics.Profiles;
using Xunit;

namespace Redshift.Physics.Tests.Profiles;

public sealed class FaddeevaTests
{
    // The published bound of Humlicek 1982.
    private const double Bound = 1e-4;

    // exp(-z^2) erfc(-iz) evaluated with 30 digits.
    [Theory]
    [InlineData(0, 0.001, 0.9988726200811514, 0.0)]
    [InlineData(0, 0.1, 0.8964569799691266, 0.0)]
    [InlineData(0, 1, 0.427583576155807, 0.0)]
    [InlineData(0.5, 0.01, 0.7723450184100666, 0.4712168856911849)]
    [InlineData(1, 0.001, 0.3679650099410538, 0.6064224679353174)]
    [InlineData(1, 0.1, 0.3731701483112674, 0.5385548078594317)]
    [InlineData(1, 1, 0.3047442052569126, 0.2082189382028316)]
    [InlineData(2, 0.01, 0.02062006544556913, 0.3392813705802113)]
    [InlineData(2, 0.5, 0.1033588237413667, 0.2847858847500937)]
    [InlineData(3, 0.1, 0.00794268099876999, 0.2007423430986774)]
    [InlineData(3, 0.001, 0.0002019724245573203, 0.2011565420455976)]
    [InlineData(5, 0.001, 2.408046396710341e-5, 0.1152459566745037)]
    [InlineData(5, 0.1, 0.002406911716942712, 0.1151944245507277)]
    [InlineData(6, 1, 0.01588512815610902, 0.0926287462995171)]
    [InlineData(10, 0.01, 5.72871162249008e-5, 0.05670533605480961)]
    [InlineData(20, 0.0001, 1.415796586719839e-7, 0.02824487409134613)]
    [InlineData(30, 5, 0.003054452620392765, 0.01830687314347747)]
    public void W_agrees_with_high_precision_values(double x, double y, double real, double imaginary)
    {
        Complex w = Faddeeva.W(x, y);
        Assert.Equal(1, w.Real / real, Bound);
        Assert.Equal(0, (w.Imaginary - imaginary) / Complex.Abs(new Complex(real, imaginary)), Bound);
    }

    // w(-x + iy) is the complex conjugate of w(x + iy).
    [Fact]
    public void W_is_symmetric()
        => Gen.Select(Gen.Double[0, 40], Gen.Double[0, 40]).Sample((x, y) =>
            Complex.Abs(Faddeeva.W(-x, y) - Complex.Conjugate(Faddeeva.W(x, y))) <= 1e-13);

    // Re w(x) = exp(-x^2) on the real axis.
    [Theory]
    [InlineData(0)]
    [InlineData(0.7)]
    [InlineData(3)]
    public void Real_part_on_the_real_axis_is_a_gaussian(double x)
        => Assert.Equal(1, Faddeeva.W(x, 0).Real / Math.Exp(-x * x), Bound);

    // The four regions meet within twice the bound.
    [Fact]
    public void Regions_meet()
        => Gen.Select(Gen.Double[-5.4, 5.4], Gen.OneOf(Gen.Const(5.5), Gen.Const(15.0))).Sample((x, distance) =>
        {
            double y = distance - Math.Abs(x);
            double inside = Faddeeva.W(x, y - 1e-9).Real;
            double outside = Faddeeva.W(x, y + 1e-9).Real;
            return Math.Abs(inside / outside - 1) < 2 * Bound;
        });

    [Fact]
    public void Lower_half_plane_is_refused()
        => Assert.Throws<ArgumentOutOfRangeException>(() => Faddeeva.W(1, -0.1));
}
