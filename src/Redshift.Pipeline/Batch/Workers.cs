using System.Globalization;

namespace Redshift.Pipeline.Batch;

/// <summary>How many workers a machine has room for.</summary>
public static class Workers
{
    /// <summary>
    /// The processors this process may use (the operating system's affinity and limits count), or fewer where a batch system gave the task
    /// fewer (SLURM_CPUS_PER_TASK).
    /// </summary>
    public static int Available(Func<string, string?> environment) =>
        int.TryParse(environment("SLURM_CPUS_PER_TASK"), NumberStyles.None, CultureInfo.InvariantCulture, out var granted) && granted > 0
            ? Math.Min(granted, Environment.ProcessorCount)
            : Environment.ProcessorCount;
}
