using BenchmarkDotNet.Attributes;
using Redshift.Benchmarks.Runs;
using Redshift.Fits;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Settings;
using Redshift.Testing;

namespace Redshift.Benchmarks.Stages;

/// <summary>A table of some 4,400 pixels from the system's cache: opened and decoded, and made into an observation.</summary>
public class TableOpening
{
    private readonly TemporaryFolder _folder = new();
    private string _path = "";

    /// <summary>Writes the table.</summary>
    [GlobalSetup]
    public void Prepare() => _path = new BenchmarkInputs(1).WriteTables(_folder.Path, 1)[0];

    /// <summary>Removes the table.</summary>
    [GlobalCleanup]
    public void CleanUp() => _folder.Dispose();

    /// <summary>Opens the file and decodes all columns.</summary>
    [Benchmark]
    public double OpenAndDecode()
    {
        using var file = FitsFile.Open(_path);
        return ((TableHdu)file.Hdus[1]).Columns.Sum(column => column.ReadColumn()[^1]);
    }

    /// <summary>The same up to the observation: layout, units, metadata and errors settled.</summary>
    [Benchmark]
    public int Load() => SpectrumLoader.Load(_path, "table.fits", new LoadSettings()).Count(outcome => outcome.Observation is not null);
}
