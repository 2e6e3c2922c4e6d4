using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Batch;

/// <summary>A fault of this program, as a reject that asks to be told of it.</summary>
internal static class Fault
{
    /// <summary>The reject.</summary>
    public static Reject In(string source, int? row, string place, Exception problem) =>
        new(source, row, place, $"a fault of this program ({problem.GetType().Name}: {problem.Message})", "no fault; please report it with this file");
}
