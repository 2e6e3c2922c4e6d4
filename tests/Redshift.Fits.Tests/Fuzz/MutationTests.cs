using System.Globalization;
using Xunit;

namespace Redshift.Fits.Tests;

public sealed class MutationTests
{
    // A million (MUTATIONS=1000000) takes minutes: to be asked for after changes to the reader.
    private static readonly int Count =
        int.TryParse(Environment.GetEnvironmentVariable("MUTATIONS"), CultureInfo.InvariantCulture, out var count) ? count : 20_000;

    // A mutated file of some kilobytes may expand to the megabyte that the tour allows, several times over.
    private const long MostAllocated = 48 << 20;

    [Fact]
    public void Open_MutatedFile_ThrowsNothingButFitsExceptions()
    {
        var specimens = Specimens.All();
        for (var seed = 0; seed < Count; seed++)
        {
            var bytes = Mutation.Apply(specimens[seed % specimens.Length], new Random(seed));
            var before = GC.GetAllocatedBytesForCurrentThread();
            var escaped = Record(bytes);
            Assert.True(escaped is null or FitsException, $"seed {seed}: {escaped}");
            var allocated = GC.GetAllocatedBytesForCurrentThread() - before;
            Assert.True(allocated < MostAllocated, $"seed {seed}: {allocated} bytes allocated for a file of {bytes.Length}");
        }
    }

    private static Exception? Record(byte[] bytes)
    {
        try
        {
            Tour.Visit(bytes);
            return null;
        }
        catch (Exception escaped)
        {
            return escaped;
        }
    }
}
