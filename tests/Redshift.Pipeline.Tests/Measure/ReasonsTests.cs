using CsCheck;
using Redshift.Pipeline.Match.Measure;
using Xunit;

namespace Redshift.Pipeline.Tests.Measure;

public sealed class ReasonsTests
{
    private static readonly double[] Axis = [.. Enumerable.Range(0, 400).Select(i => 8.0 + i * 1e-4)];

    [Fact]
    public void Parts_add_up_to_the_whole()
    {
        var window = Gen.Select(Gen.Double[7.99, 8.05], Gen.Double[1e-4, 5e-3], Gen.Double[-2, 2]).Select((centre, sigma, depth) => new LineWindow(centre, sigma, depth));
        Gen.Select(Gen.Double[-5, 20].Array[Axis.Length], window.List[0, 12]).Sample((gains, windows) =>
        {
            var (lines, other) = Reasons.Divide(Axis, gains, windows);
            return Math.Abs(lines.Sum() + other - gains.Sum()) < 1e-8;
        });
    }

    [Fact]
    public void Overlapping_lines_share_by_depth_and_the_rest_is_other()
    {
        double[] gains = [.. Axis.Select(_ => 1.0)];
        var (lines, other) = Reasons.Divide(Axis, gains, [new(8.02, 5.1e-4, -0.6), new(8.02, 5.1e-4, -0.2)]);

        // ±3σ of 5.1e-4 are 31 pixels of 1e-4.
        Assert.Equal(31, lines.Sum(), 1e-9);
        Assert.Equal(3, lines[0] / lines[1], 1e-9);
        Assert.Equal(Axis.Length - lines.Sum(), other, 1e-9);
    }
}
