using BenchmarkDotNet.Analysers;
using BenchmarkDotNet.Columns;
using BenchmarkDotNet.Configs;
using BenchmarkDotNet.Diagnosers;
using BenchmarkDotNet.Exporters;
using BenchmarkDotNet.Jobs;
using BenchmarkDotNet.Loggers;
using BenchmarkDotNet.Toolchains.InProcess.Emit;

namespace Redshift.Benchmarks.Stages;

/// <summary>Short jobs in this process: the stages take milliseconds, which needs no more.</summary>
internal sealed class QuietConfig : ManualConfig
{
    /// <summary>Makes the configuration.</summary>
    public QuietConfig()
    {
        AddJob(Job.ShortRun.WithToolchain(InProcessEmitToolchain.Instance));
        AddColumnProvider(DefaultColumnProviders.Instance);
        AddLogger(ConsoleLogger.Default);
        AddAnalyser(EnvironmentAnalyser.Default);
        AddDiagnoser(MemoryDiagnoser.Default);
        AddExporter(MarkdownExporter.GitHub);
        ArtifactsPath = Path.Combine(Path.GetTempPath(), "redshift-benchmarks");
    }
}
