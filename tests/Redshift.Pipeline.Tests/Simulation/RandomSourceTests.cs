using Redshift.Physics.Statistics;
using Xunit;

namespace Redshift.Pipeline.Tests.Simulation;

public class RandomSourceTests
{
    [Fact]
    public void SplitMix64_gives_the_published_sequence()
    {
        // Reference sequence of the published algorithm for seed 1234567.
        var state = 1234567UL;
        ulong[] words = [.. Enumerable.Range(0, 5).Select(_ => SplitMix64.Next(ref state))];
        Assert.Equal([6457827717110365317, 3203168211198807973, 9817491932198370423, 4593380528125082431, 16408922859458223821], words);
    }

    [Fact]
    public void Xoshiro_gives_the_published_sequence()
    {
        // Reference sequence of xoshiro256** for the state 1, 2, 3, 4.
        var random = RandomSource.FromState(1, 2, 3, 4);
        ulong[] words = [.. Enumerable.Range(0, 6).Select(_ => random.NextBits())];
        Assert.Equal([11520, 0, 1509978240, 1215971899390074240, 1216172134540287360, 607988272756665600], words);
    }

    [Fact]
    public void Normal_has_the_moments_of_the_normal_law()
    {
        var random = new RandomSource(5);
        double[] values = [.. Enumerable.Range(0, 100_000).Select(_ => random.Normal())];
        // Standard errors: 0.0032 of the mean, 0.0045 of the variance; shares inside 1 and 2 sigma 0.6827 and 0.9545.
        Assert.InRange(values.Average(), -0.013, 0.013);
        Assert.InRange(values.Average(v => v * v), 0.982, 1.018);
        Assert.InRange(values.Count(v => Math.Abs(v) < 1) / 1e5, 0.6768, 0.6886);
        Assert.InRange(values.Count(v => Math.Abs(v) < 2) / 1e5, 0.9518, 0.9571);
    }

    [Fact]
    public void Members_have_unrelated_streams()
    {
        double[] first = [.. Enumerable.Range(0, 2000).Select(i => RandomSource.ForMember(9, (ulong)i).Uniform())];
        double[] second = [.. first.Skip(1), first[0]];
        var correlation = first.Zip(second, (a, b) => (a - 0.5) * (b - 0.5)).Average() * 12;
        Assert.InRange(first.Average(), 0.474, 0.526);
        Assert.InRange(correlation, -0.09, 0.09);
    }
}
