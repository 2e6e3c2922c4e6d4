using System.Runtime.Intrinsics;
using CsCheck;
using Redshift.Pipeline.Numerics;
using Xunit;

namespace Redshift.Pipeline.Tests.Numerics;

public class VectorMathTests
{
    private static readonly Gen<float[]> Eight = Gen.Float[-1, 1].Array[8];

    [Fact]
    public void Exp_is_the_exponential() => Eight.Sample(values =>
    {
        var x = Vector256.Create(values) * 86f;
        var found = VectorMath.Exp(x);
        for (var i = 0; i < 8; i++) Assert.Equal(1, found[i] / Math.Exp(x[i]), 1e-5);
    });

    [Fact]
    public void Ln_is_the_logarithm() => Eight.Sample(values =>
    {
        var x = VectorMath.Exp(Vector256.Create(values) * 80f);
        var found = VectorMath.Ln(x);
        // To 1e-6 and two units in the last place of the result.
        for (var i = 0; i < 8; i++) Assert.Equal(Math.Log(x[i]), found[i], 1e-6 + 2.4e-7 * Math.Abs(Math.Log(x[i])));
    });

    [Fact]
    public void A_Gaussian_is_one_at_its_centre_and_falls_to_next_to_nothing()
    {
        Assert.Equal(Vector256<float>.One, VectorMath.Gaussian(Vector256<float>.Zero));
        Assert.InRange(VectorMath.Gaussian(Vector256.Create(1000f))[0], 0, 1e-37f);
        Eight.Sample(values =>
        {
            var u = Vector256.Create(values) * 4f;
            var found = VectorMath.Gaussian(u);
            for (var i = 0; i < 8; i++) Assert.Equal(1, found[i] / Math.Exp(-0.5 * u[i] * u[i]), 2e-6);
        });
    }
}
