using System.Diagnostics;
using System.Globalization;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Report;

namespace Redshift.Cli;

/// <summary>
/// How far a run is, on standard error: one line that is drawn over on a terminal, a plain line now and then elsewhere.
/// </summary>
internal sealed class Progress : IDisposable
{
    private const int BarWidth = 24;
    private const string ClearLine = "\r\u001b[K";

    private readonly TextWriter _out;
    private readonly bool _redraws;
    private readonly TimeSpan _interval;
    private readonly double _bytes;
    private readonly Lock _lock = new();
    private readonly Stopwatch _watch = Stopwatch.StartNew();
    private TimeSpan _last;
    private double _settled;
    private int _rejects;
    private bool _drawn;

    private Progress(TextWriter output, bool redraws, long bytes)
    {
        _out = output;
        _redraws = redraws;
        _bytes = Math.Max(1, bytes);
        _interval = TimeSpan.FromSeconds(redraws ? 0.2 : 10);
    }

    /// <summary>Number of spectra measured so far.</summary>
    public int Measured { get; private set; }

    /// <summary>Starts for inputs of a total size; a dumb terminal counts as none.</summary>
    public static Progress Start(long bytes) => new(
        Console.Error, !Console.IsErrorRedirected && Environment.GetEnvironmentVariable("TERM") != "dumb", bytes);

    /// <summary>Prints a line of its own; safe to call from several threads.</summary>
    public void Say(string message)
    {
        lock (_lock)
        {
            Clear();
            _out.WriteLine(HarmlessText.Printable(message));
        }
    }

    /// <summary>Takes note of a step of the run.</summary>
    public void Update(LedgerEntry entry)
    {
        Count(entry);
        if (_watch.Elapsed - _last < _interval)
            return;
        _last = _watch.Elapsed;
        lock (_lock)
            Draw(Math.Min(1, _settled / _bytes));
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        lock (_lock)
            Clear();
    }

    private void Count(LedgerEntry entry)
    {
        _settled += entry.Bytes;
        if (entry is SpectrumDone { Reject: null })
            Measured++;
        if ((entry as SpectrumDone)?.Reject is { } reject)
            Refuse(reject.ToString());
        if ((entry as FileEnded)?.Spoilt is { } spoilt)
            Refuse(spoilt.ToString());
    }

    private void Refuse(string message)
    {
        _rejects++;
        Say("rejected: " + message);
    }

    private void Draw(double done)
    {
        Clear();
        if (_redraws)
            _out.Write(Bar(done) + Text(done));
        else
            _out.WriteLine(Text(done));
        _drawn = _redraws;
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

    private string Text(double done) => string.Create(
        CultureInfo.InvariantCulture,
        $"{100 * done:F0} %, {Measured} spectra ({Measured / _watch.Elapsed.TotalSeconds:F0} a second), {_rejects} rejects, {Left(done)} left");

    private string Left(double done)
    {
        if (done <= 0)
            return "unknown time";
        var left = _watch.Elapsed * ((1 - done) / done);
        return left.TotalHours < 1
            ? left.ToString(@"m\:ss", CultureInfo.InvariantCulture)
            : string.Create(CultureInfo.InvariantCulture, $"{left.TotalHours:F1} h");
    }
}
