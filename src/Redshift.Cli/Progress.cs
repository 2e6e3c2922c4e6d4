using System.Globalization;
using Redshift.Pipeline.Ledger;

namespace Redshift.Cli;

/// <summary>How far a run is.</summary>
/// <param name="bytes">Total size of the inputs.</param>
internal sealed class Progress(long bytes) : IDisposable
{
    private readonly ProgressLine _line = new();
    private double _settled;
    private int _rejects;

    /// <summary>Number of spectra measured so far.</summary>
    public int Measured { get; private set; }

    /// <summary>Prints a line of its own; safe to call from several threads.</summary>
    public void Say(string message) => _line.Say(message);

    /// <summary>Takes note of a step of the run.</summary>
    public void Update(LedgerEntry entry)
    {
        Count(entry);
        _line.Show(Math.Min(1, _settled / Math.Max(1, bytes)), Describe);
    }

    /// <inheritdoc/>
    public void Dispose() => _line.Dispose();

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

    private string Describe(double seconds) =>
        string.Create(CultureInfo.InvariantCulture, $"{Measured} spectra ({Measured / seconds:F0} a second), {_rejects} rejects");
}
