using System.Diagnostics;
using System.Globalization;
using Redshift.Pipeline.Report;

namespace Redshift.Cli;

/// <summary>
/// How far work is, on standard error: one line that is drawn over on a terminal, a plain line now and then elsewhere.
/// </summary>
internal sealed class ProgressLine : IDisposable
{
    private const int BarWidth = 24;
    private const string ClearLine = "\r\u001b[K";

    private readonly TextWriter _out = Console.Error;
    private readonly bool _redraws;
    private readonly TimeSpan _interval;
    private readonly Lock _lock = new();
    private readonly Stopwatch _watch = Stopwatch.StartNew();
    private TimeSpan _last;
    private bool _drawn;

    /// <summary>Starts the clock; a dumb terminal counts as none.</summary>
    public ProgressLine()
    {
        _redraws = !Console.IsErrorRedirected && Environment.GetEnvironmentVariable("TERM") != "dumb";
        _interval = TimeSpan.FromSeconds(_redraws ? 0.2 : 10);
    }

    /// <summary>Prints a line of its own; safe to call from several threads.</summary>
    public void Say(string message)
    {
        lock (_lock)
        {
            Clear();
            _out.WriteLine(HarmlessText.Printable(message));
        }
    }

    /// <summary>Shows how far the work is, unless that was shown a moment ago; safe to call from several threads.</summary>
    /// <param name="done">Share that is done.</param>
    /// <param name="describe">Says what is done, from the seconds since the start.</param>
    public void Show(double done, Func<double, string> describe)
    {
        lock (_lock)
        {
            if (_watch.Elapsed - _last < _interval)
                return;
            _last = _watch.Elapsed;
            Clear();
            _out.Write(string.Create(
                CultureInfo.InvariantCulture,
                $"{(_redraws ? Bar(done) : "")}{100 * done:F0} %, {describe(_last.TotalSeconds)}, {Left(done)} left{(_redraws ? "" : "\n")}"));
            _drawn = _redraws;
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        lock (_lock)
            Clear();
    }

    private void Clear()
    {
        if (_drawn)
            _out.Write(ClearLine);
        _drawn = false;
    }

    private static string Bar(double done)
    {
        var full = (int)(done * BarWidth);
        return new string('#', full) + new string('.', BarWidth - full) + " ";
    }

    private string Left(double done)
    {
        if (done <= 0)
            return "unknown time";
        var left = _last * ((1 - done) / done);
        return left.TotalHours < 1
            ? left.ToString(@"m\:ss", CultureInfo.InvariantCulture)
            : string.Create(CultureInfo.InvariantCulture, $"{left.TotalHours:F1} h");
    }
}
