using System.Runtime.InteropServices;

namespace Redshift.Benchmarks.Runs;

/// <summary>The machine in words: figures without one mean nothing.</summary>
internal static class Machine
{
    /// <summary>Processor, cores, system and runtime.</summary>
    public static string Describe()
    {
        const string info = "/proc/cpuinfo";
        var model = File.Exists(info)
            ? File.ReadLines(info).FirstOrDefault(line => line.StartsWith("model name", StringComparison.Ordinal))?.Split(':')[^1].Trim()
            : null;
        return $"{model ?? RuntimeInformation.ProcessArchitecture.ToString()}, {Environment.ProcessorCount} cores, {RuntimeInformation.OSDescription}, {RuntimeInformation.FrameworkDescription}";
    }
}
