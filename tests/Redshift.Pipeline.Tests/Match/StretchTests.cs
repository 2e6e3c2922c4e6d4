using CsCheck;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Results;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class StretchTests
{
    private static readonly Template Noise = new("noise", ObjectKind.Star, MadeUp());

    [Fact]
    public void A_stretch_lies_on_the_grid_and_holds_what_was_asked_for() => Gen.Select(Gen.Int[-60_000, 110_000], Gen.Int[1, 60_000]).Sample((from, count) =>
    {
        var stretch = Stretch.Around(from, from + count);
        Assert.InRange(stretch.Start, 0, Math.Clamp(from, 0, TemplateGrid.Count - 2));
        Assert.InRange(stretch.End, Math.Clamp(from + count, 2, TemplateGrid.Count), TemplateGrid.Count);
    });

    [Fact]
    public void A_short_part_takes_a_short_stretch_and_neighbours_share_it()
    {
        Assert.Equal(4096, Stretch.Around(20_500, 22_000).Length);
        Assert.Equal(Stretch.Around(20_500, 22_000), Stretch.Around(20_600, 22_100));
        Assert.Equal(Stretch.Whole, Stretch.Around(0, TemplateGrid.Count));
    }

    /// <summary>The running sums of the widest filters begin elsewhere, so that their last digit may differ.</summary>
    [Theory]
    [InlineData(0)]
    [InlineData(10)]
    [InlineData(20)]
    [InlineData(35)]
    public void A_stretch_is_broadened_as_the_whole_is(int level)
    {
        var whole = Noise.Broadened(level, Stretch.Whole);
        Gen.Select(Gen.Int[-3000, TemplateGrid.Count + 3000], Gen.Int[1, 30_000]).Sample((from, count) =>
        {
            var stretch = Stretch.Around(from, from + count);
            var part = Noise.Broadened(level, stretch);
            Assert.Equal(stretch.Length, part.Length);
            for (var i = 0; i < part.Length; i++)
                Assert.Equal(whole[stretch.Start + i], part[i], 2e-7f);
        }, iter: 20);
    }

    private static float[] MadeUp()
    {
        var random = new RandomSource(4);
        return [.. Enumerable.Range(0, TemplateGrid.Count).Select(_ => (float)random.Uniform(0.5, 1.5))];
    }
}
