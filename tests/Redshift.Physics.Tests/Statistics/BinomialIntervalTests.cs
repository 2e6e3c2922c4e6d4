using CsCheck;
using Redshift.Physics.Statistics;
using Xunit;

namespace Redshift.Physics.Tests.Statistics;

public sealed class BinomialIntervalTests
{
    // R. G. Newcombe, Statist. Med. 17, 857 (1998), table I, method 3, printed with four decimals.
    [Theory]
    [InlineData(81, 263, 0.2553, 0.3662)]
    [InlineData(15, 148, 0.0624, 0.1605)]
    [InlineData(0, 20, 0, 0.1611)]
    [InlineData(1, 29, 0.0061, 0.1718)]
    public void Wilson_agrees_with_published_intervals(int successes, int trials, double low, double high)
    {
        var interval = BinomialInterval.Wilson(successes, trials, 1.959964);
        Assert.Equal(low, interval.Low, 5e-5);
        Assert.Equal(high, interval.High, 5e-5);
    }

    [Fact]
    public void The_ends_are_the_shares_that_lie_so_many_sigmas_from_what_was_seen() =>
        Gen.Select(Gen.Int[1, 500], Gen.Double[0, 1], Gen.Double[0.5, 3]).Sample((trials, part, sigmas) =>
        {
            var successes = (int)(part * trials);
            var (low, high) = BinomialInterval.Wilson(successes, trials, sigmas);
            foreach (var share in new[] { low, high }.Where(s => s is > 1e-9 and < 1 - 1e-9))
                Assert.Equal(sigmas, Math.Abs((double)successes / trials - share) / Math.Sqrt(share * (1 - share) / trials), 1e-6);
        });
}
