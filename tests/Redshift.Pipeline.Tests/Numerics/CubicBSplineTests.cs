using CsCheck;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Numerics;
using Xunit;

namespace Redshift.Pipeline.Tests.Numerics;

public class CubicBSplineTests
{
    private const double Start = -2;
    private const double End = 8;
    private const double Spacing = 1;

    private static readonly CubicBSpline Spline = new(Start, End, Spacing);

    [Fact]
    public void Basis_is_a_partition_of_unity() => Gen.Double[Start, End].Sample(x =>
    {
        var four = new float[4];
        var first = Spline.Evaluate(x, four);
        Assert.InRange(first, 0, Spline.Count - 4);
        Assert.All(four, value => Assert.InRange(value, -1e-7f, 1));
        Assert.Equal(1, four.Sum(), 1e-6f);
    });

    [Fact]
    public void A_cubic_is_reproduced_exactly()
    {
        // Coefficients by the polar form of x³ − 2x² + 3x − 4 (Marsden's identity; de Boor 1978, chapter IX).
        var coefficients = Enumerable.Range(0, Spline.Count).Select(j => Start + (j - 1) * Spacing)
            .Select(k => k * (k * k - Spacing * Spacing) - 2 * (k * k - Spacing * Spacing / 3) + 3 * k - 4).ToArray();
        Gen.Double[Start, End].Sample(x => Assert.Equal(x * x * x - 2 * x * x + 3 * x - 4, Value(x, coefficients), 2e-4));
    }

    [Fact]
    public void Value_slope_and_curvature_are_continuous_at_the_knots()
    {
        var random = new RandomSource(11);
        var coefficients = Enumerable.Range(0, Spline.Count).Select(_ => random.Normal()).ToArray();
        for (var knot = Start + Spacing; knot < End; knot += Spacing)
        {
            var (value, slope, curvature) = Derivatives(knot, 0.25, coefficients);
            var left = Derivatives(knot, -0.25, coefficients);
            Assert.Equal(value, left.Value, 1e-6);
            Assert.Equal(slope, left.Slope, 1e-5);
            Assert.Equal(curvature, left.Curvature, 1e-4);
        }
    }

    [Theory]
    [InlineData(0, 1, 0.04, 28)]
    [InlineData(0, 0.04, 0.04, 4)]
    [InlineData(0, 0.01, 0.04, 4)]
    [InlineData(0, 0.05, 0.04, 5)]
    public void Knots_are_never_wider_than_asked_for(double start, double end, double spacing, int count) =>
        Assert.Equal(count, new CubicBSpline(start, end, spacing).Count);

    /// <summary>One-sided differences of four points, exact for the cubic between two knots.</summary>
    private static (double Value, double Slope, double Curvature) Derivatives(double x, double h, double[] coefficients)
    {
        double[] f = [.. Enumerable.Range(0, 4).Select(i => Value(x + i * h, coefficients))];
        return (f[0], (-11 * f[0] + 18 * f[1] - 9 * f[2] + 2 * f[3]) / (6 * h), (2 * f[0] - 5 * f[1] + 4 * f[2] - f[3]) / (h * h));
    }

    private static double Value(double x, double[] coefficients)
    {
        var four = new float[4];
        var first = Spline.Evaluate(x, four);
        return four.Select((value, j) => value * coefficients[first + j]).Sum();
    }
}
