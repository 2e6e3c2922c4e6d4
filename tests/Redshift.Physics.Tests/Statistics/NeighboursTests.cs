using CsCheck;
using Redshift.Physics.Statistics;
using Xunit;

namespace Redshift.Physics.Tests.Statistics;

public sealed class NeighboursTests
{
    [Theory]
    [InlineData("5 5 5 5 5 5", "10 10 10")]
    [InlineData("10 3 20 1", "10 24")]
    [InlineData("3 3", "6")]
    [InlineData("", "")]
    public void Bins_are_joined_until_they_hold_enough(string bins, string joined) =>
        Assert.Equal(joined, string.Join(' ', Join([.. bins.Split(' ', StringSplitOptions.RemoveEmptyEntries).Select(int.Parse)], 10)));

    [Fact]
    public void Nothing_is_lost_and_nothing_stays_below_the_least() =>
        Gen.Select(Gen.Int[0, 30].Array[1, 12], Gen.Int[1, 40]).Sample((bins, least) =>
        {
            var joined = Join(bins, least);
            Assert.Equal(bins.Sum(), joined.Sum());
            if (joined.Count > 1) Assert.All(joined, bin => Assert.True(bin >= least));
        });

    private static IReadOnlyList<int> Join(int[] bins, int least) => Neighbours.Join(bins, bin => bin, (a, b) => a + b, least);
}
