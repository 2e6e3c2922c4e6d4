using System.IO.Compression;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;
using Redshift.Simulation.Samples;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Simulation;

public class SampleNightTests
{
    [Fact]
    public void The_samples_are_what_their_generator_writes()
    {
        using var folder = new TemporaryFolder();
        SampleNight.WriteTo(folder.Path);
        var kept = Repository.PathOf("sample-spectra");
        Assert.Equal(Files(folder.Path), Files(kept));
        foreach (var name in Files(kept))
            Assert.True(Content(Path.Combine(folder.Path, name)).SequenceEqual(Content(Path.Combine(kept, name))), $"{name} differs from what its generator writes");
    }

    [Fact]
    public void The_samples_stay_small() =>
        Assert.InRange(Directory.EnumerateFiles(Repository.PathOf("sample-spectra"), "*", SearchOption.AllDirectories).Sum(path => new FileInfo(path).Length), 1, 3_000_000);

    [Fact]
    public void Every_row_of_the_table_of_truths_is_read_and_nothing_else()
    {
        string[] told = [.. File.ReadLines(Repository.PathOf("sample-spectra", "truth.csv")).Skip(1).Select(line => string.Join(',', line.Split(',')[..2]))];
        string[] read = [.. Outcomes().Where(outcome => outcome.Observation is not null).Select(outcome => $"{outcome.Observation!.Source},{outcome.Observation.Row}")];
        Assert.Equal(told.Order(StringComparer.Ordinal), read.Order(StringComparer.Ordinal));
        Assert.Equal(["slit/interrupted.fits"], Outcomes().Where(outcome => outcome.Reject is not null).Select(outcome => outcome.Reject!.Source));
    }

    private static IEnumerable<LoadOutcome> Outcomes() =>
        from name in Files(Repository.PathOf("sample-spectra"))
        where name != "truth.csv"
        from outcome in SpectrumLoader.Load(Repository.PathOf("sample-spectra", name), name, new LoadSettings())
        select outcome;

    private static string[] Files(string folder) =>
        [.. Directory.EnumerateFiles(folder, "*", SearchOption.AllDirectories).Select(path => Path.GetRelativePath(folder, path)).Where(path => path != "README.md").Order(StringComparer.Ordinal)];

    // How well a compressor packs is its own business: compressed files are compared by what they hold.
    private static byte[] Content(string path)
    {
        using var file = File.OpenRead(path);
        using Stream stream = path.EndsWith(".gz", StringComparison.Ordinal) ? new GZipStream(file, CompressionMode.Decompress) : file;
        using var memory = new MemoryStream();
        stream.CopyTo(memory);
        return memory.ToArray();
    }
}
