using BenchmarkDotNet.Attributes;
using Redshift.Benchmarks.Runs;
using Redshift.Pipeline;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Redshift.Testing;

namespace Redshift.Benchmarks.Stages;

/// <summary>What each stage costs for a mean survey spectrum: a stack of mixed kinds is gone through, and the time divided.</summary>
public class StageBenchmarks
{
    private const int Spectra = 24;

    private readonly TemporaryFolder _folder = new();
    private readonly ObservationPipeline _pipeline = new(new PipelineSettings());
    private string _stack = "";
    private Observation[] _observations = [];
    private ObservationResult[] _results = [];

    /// <summary>Makes the input and the models.</summary>
    [GlobalSetup]
    public void Prepare()
    {
        _stack = new BenchmarkInputs(Spectra).WriteStacks(_folder.Path, Spectra)[0];
        _observations = [.. Read()];
        _results = [.. _observations.Select(_pipeline.Analyze)];
    }

    /// <summary>Removes the input.</summary>
    [GlobalCleanup]
    public void CleanUp() => _folder.Dispose();

    /// <summary>File to observation.</summary>
    [Benchmark(OperationsPerInvoke = Spectra)]
    public int Load() => Read().Count();

    /// <summary>Continuum and noise.</summary>
    [Benchmark(OperationsPerInvoke = Spectra)]
    public int Normalize() => _observations.Sum(observation => Normalizer.Normalize(observation).Spectra.Count);

    /// <summary>Everything between reading and reporting, with <see cref="Normalize"/> in it.</summary>
    [Benchmark(OperationsPerInvoke = Spectra)]
    public double Analyze() => _observations.Sum(observation => _pipeline.Analyze(observation).Confidence);

    /// <summary>Answer and lines to cells.</summary>
    [Benchmark(OperationsPerInvoke = Spectra)]
    public int Report() => _results.Sum(result =>
        CatalogueColumns.All.Sum(column => column.Value(result).Text.Length)
        + result.Lines.Sum(line => LineColumns.All.Sum(column => column.Value(new(result.Observation, line)).Text.Length)));

    private IEnumerable<Observation> Read() => SpectrumLoader.Load(_stack, "stack.fits", new LoadSettings())
        .Select(outcome => outcome.Observation ?? throw new InvalidOperationException($"{outcome.Reject}"));
}
