namespace Redshift.Benchmarks.Runs;

/// <summary>The command that is measured.</summary>
/// <param name="Program">The command, or its dll.</param>
internal sealed record MeasuredCommand(string Program)
{
    /// <summary>Runs it to its end.</summary>
    /// <exception cref="InvalidOperationException">It failed.</exception>
    public MeasuredProcess Run(params IReadOnlyList<string> arguments) => Program.EndsWith(".dll", StringComparison.Ordinal)
        ? MeasuredProcess.Run("dotnet", [Program, .. arguments])
        : MeasuredProcess.Run(Program, arguments);
}
