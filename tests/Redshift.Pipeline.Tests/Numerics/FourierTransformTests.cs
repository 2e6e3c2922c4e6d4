using System.Numerics;
using System.Runtime.Intrinsics;
using MathNet.Numerics.IntegralTransforms;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Numerics;
using Xunit;

namespace Redshift.Pipeline.Tests.Numerics;

public class FourierTransformTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(4)]
    [InlineData(8)]
    [InlineData(32)]
    [InlineData(512)]
    public void Forward_is_the_defining_sum(int length)
    {
        var input = Noise(length);
        var expected = Enumerable.Range(0, length).Select(k => Sum(input, k)).ToArray();
        AssertNear(expected, Forward(input), Tolerance(length));
    }

    [Theory]
    [InlineData(2048)]
    [InlineData(4096)]
    public void Forward_agrees_with_an_independent_transform(int length)
    {
        var expected = Noise(length);
        var actual = Forward(expected);
        Fourier.Forward(expected, FourierOptions.NoScaling);
        AssertNear(expected, actual, Tolerance(length));
    }

    [Theory]
    [InlineData(16)]
    [InlineData(8192)]
    public void Inverse_undoes_forward_but_for_the_length(int length)
    {
        var input = Noise(length);
        var (re, im) = Lanes(input);
        var transform = new FourierTransform(length);
        transform.Forward(re, im);
        transform.Inverse(re, im);
        for (var lane = 0; lane < 8; lane++) AssertNear(Rotated(input, lane), Lane(re, im, lane).Select(x => x / length), Tolerance(length) / Math.Sqrt(length));
    }

    [Theory]
    [InlineData(0)]
    [InlineData(3)]
    [InlineData(-4)]
    public void Other_lengths_than_powers_of_two_are_refused(int length) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new FourierTransform(length));

    /// <summary>Rounding grows with the number of stages, of values that are √N in size.</summary>
    private static double Tolerance(int length) => 4e-7 * (1 + Math.Log2(length)) * Math.Sqrt(length);

    private static Complex Sum(Complex[] input, int k) =>
        input.Select((x, j) => x * Complex.FromPolarCoordinates(1, -2 * Math.PI * j * k / input.Length)).Aggregate((a, b) => a + b);

    /// <summary>The transform of the first lane; the other lanes hold the input turned by a phase each, and so must their transforms.</summary>
    private static Complex[] Forward(Complex[] input)
    {
        var (re, im) = Lanes(input);
        new FourierTransform(input.Length).Forward(re, im);
        var first = Lane(re, im, 0);
        for (var lane = 1; lane < 8; lane++) AssertNear(Rotated(first, lane), Lane(re, im, lane), Tolerance(input.Length));
        return first;
    }

    private static Complex[] Noise(int length)
    {
        var random = new RandomSource((ulong)length);
        return [.. Enumerable.Range(0, length).Select(_ => new Complex((float)random.Normal(), (float)random.Normal()))];
    }

    private static Complex[] Rotated(Complex[] values, int lane) => Array.ConvertAll(values, x => x * Complex.FromPolarCoordinates(1, lane));

    private static (Vector256<float>[] Re, Vector256<float>[] Im) Lanes(Complex[] input)
    {
        var lanes = Enumerable.Range(0, 8).Select(lane => Rotated(input, lane)).ToArray();
        Vector256<float>[] Gather(Func<Complex, double> part) =>
            [.. input.Select((_, i) => Vector256.Create([.. lanes.Select(lane => (float)part(lane[i]))]))];
        return (Gather(x => x.Real), Gather(x => x.Imaginary));
    }

    private static Complex[] Lane(Vector256<float>[] re, Vector256<float>[] im, int lane) => [.. re.Zip(im, (r, i) => new Complex(r[lane], i[lane]))];

    private static void AssertNear(IEnumerable<Complex> expected, IEnumerable<Complex> actual, double tolerance) =>
        Assert.All(expected.Zip(actual), pair => Assert.InRange((pair.First - pair.Second).Magnitude, 0, tolerance));
}
