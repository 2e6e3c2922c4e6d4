using System.Globalization;

namespace Redshift.Cli;

/// <summary>How far work is that consists of a known number of alike steps.</summary>
/// <param name="what">What is done at each step, such as "objects measured".</param>
internal sealed class CountProgress(string what) : IDisposable
{
    private readonly ProgressLine _line = new();
    private int _done;

    /// <summary>Prints a line of its own; safe to call from several threads.</summary>
    public void Say(string message) => _line.Say(message);

    /// <summary>Takes note of a step; safe to call from several threads.</summary>
    /// <param name="all">Number of all steps.</param>
    public void Step(int all)
    {
        var done = Interlocked.Increment(ref _done);
        _line.Show((double)done / all, seconds => string.Create(CultureInfo.InvariantCulture, $"{done} {what} ({done / seconds:F0} a second)"));
    }

    /// <inheritdoc/>
    public void Dispose() => _line.Dispose();
}
