using System.Numerics;
using MathNet.Numerics.IntegralTransforms;
using Redshift.Pipeline.Numerics;
using Redshift.Simulation.Random;
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
    [InlineData(32768)]
    public void Forward_agrees_with_an_independent_transform(int length)
    {
        var expected = Noise(length);
        var actual = Forward(expected);
        Fourier.Forward(expected, FourierOptions.NoScaling);
        AssertNear(expected, actual, Tolerance(length));
    }

    [Theory]
    [InlineData(16)]
    [InlineData(16384)]
    public void Inverse_undoes_forward_but_for_the_length(int length)
    {
        var input = Noise(length);
        var (re, im) = Parts(input);
        var transform = new FourierTransform(length);
        transform.Forward(re, im);
        transform.Inverse(re, im);
        AssertNear(input, Join(re, im).Select(x => x / length), Tolerance(length) / Math.Sqrt(length));
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

    private static Complex[] Forward(Complex[] input)
    {
        var (re, im) = Parts(input);
        new FourierTransform(input.Length).Forward(re, im);
        return Join(re, im);
    }

    private static Complex[] Noise(int length)
    {
        var random = new RandomSource((ulong)length);
        return [.. Enumerable.Range(0, length).Select(_ => new Complex((float)random.Normal(), (float)random.Normal()))];
    }

    private static (float[] Re, float[] Im) Parts(Complex[] values) =>
        (Array.ConvertAll(values, x => (float)x.Real), Array.ConvertAll(values, x => (float)x.Imaginary));

    private static Complex[] Join(float[] re, float[] im) => [.. re.Zip(im, (r, i) => new Complex(r, i))];

    private static void AssertNear(IEnumerable<Complex> expected, IEnumerable<Complex> actual, double tolerance) =>
        Assert.All(expected.Zip(actual), pair => Assert.InRange((pair.First - pair.Second).Magnitude, 0, tolerance));
}
