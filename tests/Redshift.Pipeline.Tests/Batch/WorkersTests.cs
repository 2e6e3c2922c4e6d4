using Redshift.Pipeline.Batch;
using Xunit;

namespace Redshift.Pipeline.Tests.Batch;

public sealed class WorkersTests
{
    [Theory]
    [InlineData("1", 1)]
    [InlineData("100000", int.MaxValue)]
    [InlineData("0", int.MaxValue)]
    [InlineData("four", int.MaxValue)]
    [InlineData(null, int.MaxValue)]
    public void Available_takes_the_smaller_of_processors_and_grant(string? granted, int limit) =>
        Assert.Equal(Math.Min(Environment.ProcessorCount, limit), Workers.Available(_ => granted));
}
