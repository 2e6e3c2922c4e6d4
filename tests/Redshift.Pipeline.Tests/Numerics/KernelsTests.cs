using CsCheck;
using Redshift.Pipeline.Numerics;
using Xunit;

namespace Redshift.Pipeline.Tests.Numerics;

/// <summary>The lengths run over all remainders that the lanes leave.</summary>
public class KernelsTests
{
    private static readonly Gen<(float[] A, float[] B)> Pairs =
        from length in Gen.Int[0, 70]
        from a in Gen.Single[-10, 10].Array[length]
        from b in Gen.Single[-10, 10].Array[length]
        select (a, b);

    [Fact]
    public void Dot_is_the_plain_sum() => Pairs.Sample(pair =>
    {
        var expected = pair.A.Zip(pair.B, (a, b) => (double)a * b).Sum();
        var size = pair.A.Zip(pair.B, (a, b) => Math.Abs((double)a * b)).Sum();
        Assert.Equal(expected, Kernels.Dot(pair.A, pair.B), 1e-6 * (1 + size));
    });

    [Fact]
    public void Dot_of_doubles_is_the_plain_sum() => Pairs.Sample(pair =>
    {
        var (a, b) = (Array.ConvertAll(pair.A, x => (double)x), Array.ConvertAll(pair.B, x => (double)x));
        Assert.Equal(a.Zip(b, (x, y) => x * y).Sum(), Kernels.Dot(a, b), 1e-10);
    });

    [Fact]
    public void Multiply_is_the_plain_product() => Pairs.Sample(pair =>
    {
        var product = new float[pair.A.Length];
        Kernels.Multiply(pair.A, pair.B, product);
        Assert.Equal(pair.A.Zip(pair.B, (a, b) => a * b), product);
    });
}
