using System.Diagnostics;
using System.Globalization;
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
    private readonly int _files;
    private readonly Lock _lock = new();
    private readonly Stopwatch _watch = Stopwatch.StartNew();
    private TimeSpan _last;
    private bool _drawn;

    private Progress(TextWriter output, bool redraws, int files)
    {
        _out = output;
        _redraws = redraws;
        _files = files;
        _interval = TimeSpan.FromSeconds(redraws ? 0.2 : 10);
    }

    /// <summary>Starts for a number of files; a dumb terminal counts as none.</summary>
    public static Progress Start(int files) => new(
        Console.Error, !Console.IsErrorRedirected && Environment.GetEnvironmentVariable("TERM") != "dumb", files);

    /// <summary>Prints a line of its own; safe to call from several threads.</summary>
    public void Say(string message)
    {
        lock (_lock)
        {
            Clear();
            _out.WriteLine(HarmlessText.Printable(message));
        }
    }

    /// <summary>Takes note of an outcome of the file with this number.</summary>
    public void Update(int file, Tally tally)
    {
        if (_watch.Elapsed - _last < _interval)
            return;
        _last = _watch.Elapsed;
        lock (_lock)
            Draw((double)file / _files, tally);
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        lock (_lock)
            Clear();
    }

    private void Draw(double done, Tally tally)
    {
        Clear();
        if (_redraws)
            _out.Write(Bar(done) + Text(done, tally));
        else
            _out.WriteLine(Text(done, tally));
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

    private string Text(double done, Tally tally) => string.Create(
        CultureInfo.InvariantCulture,
        $"{100 * done:F0} % of the files, {tally.Results} spectra ({tally.Results / _watch.Elapsed.TotalSeconds:F0} a second), {tally.Rejects} rejects");
}
