using CsCheck;
using Redshift.Pipeline.Report.Plots;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class SpreadingTests
{
    [Fact]
    public void Labels_that_fit_end_up_apart_and_inside() =>
        Gen.Float[0, 100].Array[0, 10].Sample(wanted =>
        {
            Array.Sort(wanted);
            var placed = Spreading.Apart(wanted, 10, 0, 100);
            var inOrder = placed.Zip(placed.Skip(1)).All(pair => pair.Second - pair.First > 10 - 1e-3);
            return inOrder && placed.All(position => position is > -1e-3f and < 100.001f);
        });

    [Fact]
    public void Labels_that_are_apart_stay() => Assert.Equal([5, 20, 90], Spreading.Apart([5, 20, 90], 10, 0, 100));
}
