using Redshift.Pipeline.Ledger;
using Xunit;

namespace Redshift.Pipeline.Tests.Ledger;

public sealed class ShardTests
{
    private static readonly Shard[] Parts = [.. Enumerable.Range(1, 7).Select(index => new Shard(index, 7))];

    [Theory]
    [InlineData("3/7", 3, 7)]
    [InlineData("1/1", 1, 1)]
    public void A_part_is_read_as_it_is_written(string text, int index, int count)
    {
        Assert.True(Shard.TryParse(text, out var shard));
        Assert.Equal(new(index, count), shard);
        Assert.Equal(text, shard.ToString());
    }

    [Theory]
    [InlineData("")]
    [InlineData("3")]
    [InlineData("0/7")]
    [InlineData("8/7")]
    [InlineData("-1/7")]
    [InlineData("1/0")]
    [InlineData("1/2/3")]
    [InlineData("a/b")]
    public void Anything_else_is_none(string text) => Assert.False(Shard.TryParse(text, out _));

    [Fact]
    public void Every_spectrum_has_exactly_one_owner_and_only_owners_read_a_small_file()
    {
        for (var file = 0; file < 500; file++)
        {
            var source = $"night/{file}.fits";
            var owner = Assert.Single(Parts, part => part.Reads(source, Shard.LargeFile - 1));
            Assert.All([0, 1, Shard.BlockRows, 123456], row => Assert.Equal([owner], Parts.Where(part => part.Owns(source, 100, row))));
        }
    }

    [Fact]
    public void Large_files_are_dealt_out_in_blocks()
    {
        var owners = Enumerable.Range(0, 100 * Shard.BlockRows)
            .Select(row => Assert.Single(Parts, part => part.Owns("stack.fits", Shard.LargeFile, row))).ToList();

        Assert.All(Enumerable.Range(0, owners.Count), row => Assert.Equal(owners[row / Shard.BlockRows * Shard.BlockRows], owners[row]));
        // 100 blocks over 7 parts: 14 each, give or take four times the square root.
        Assert.All(Parts, part => Assert.InRange(owners.Count(owner => owner == part) / Shard.BlockRows, 1, 29));
    }

    // What belongs to a part must not change with a release, or the parts of a long run would not fit together.
    [Fact]
    public void The_sharing_out_is_fixed() => Assert.Equal(
        [6, 1, 1, 1, 3, 6, 3, 4],
        Enumerable.Range(0, 8).Select(file => Parts.Single(part => part.Owns($"{file}.fits", 0, 0)).Index));
}
