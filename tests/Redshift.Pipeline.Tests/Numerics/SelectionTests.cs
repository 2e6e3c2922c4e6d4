using CsCheck;
using Redshift.Pipeline.Numerics;
using Xunit;

namespace Redshift.Pipeline.Tests.Numerics;

public class SelectionTests
{
    [Theory]
    [InlineData(new double[0], 0)]
    [InlineData(new[] { 3.0 }, 3)]
    [InlineData(new[] { 5.0, 1, 3 }, 3)]
    [InlineData(new[] { 5.0, 1, 3, 4 }, 3.5)]
    public void Median_is_the_middle(double[] values, double median) => Assert.Equal(median, Selection.Median(values));

    [Fact]
    public void Each_place_holds_what_sorting_puts_there() =>
        // Few different values make many ties.
        Gen.OneOf(Gen.Double[-1, 1].Array[1, 200], Gen.Int[0, 4].Select(i => (double)i).Array[1, 200]).SelectMany(values => Gen.Int[0, values.Length - 1].Select(i => (values, i)))
            .Sample((values, i) =>
            {
                var sorted = values.Order().ToArray();
                double[] reordered = [.. values];
                Assert.Equal(sorted[i], Selection.Take(reordered, i));
                Assert.Equal(sorted, reordered.Order());
                Assert.All(reordered[..i], v => Assert.True(v <= sorted[i]));
                Assert.All(reordered[i..], v => Assert.True(v >= sorted[i]));
            });
}
