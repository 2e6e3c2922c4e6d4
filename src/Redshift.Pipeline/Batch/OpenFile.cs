using System.Threading.Channels;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Batch;

/// <summary>A file whose spectra are on their way: reports its end when the reader and all its workers are done with it.</summary>
/// <param name="file">The file.</param>
/// <param name="entries">Takes the report.</param>
internal sealed class OpenFile(InputFile file, ChannelWriter<LedgerEntry> entries)
{
    // The reader counts as one.
    private int _busy = 1;

    private double _bytesPerSpectrum;

    /// <summary>Its name in the tables.</summary>
    public string Source { get; } = file.Source;

    /// <summary>How much of the input is settled with the end of the file.</summary>
    public double Bytes { get; set; }

    /// <summary>Why nothing of the file can be used after all, or null.</summary>
    public Reject? Spoilt { get; set; }

    /// <summary>Settles the file spectrum by spectrum, where there are any.</summary>
    public void ShareAmong(int spectra)
    {
        if (spectra > 0)
            (_bytesPerSpectrum, Bytes) = (Bytes / spectra, 0);
    }

    /// <summary>One more spectrum is on its way to the workers.</summary>
    public void Enter() => Interlocked.Increment(ref _busy);

    /// <summary>A spectrum has its outcome.</summary>
    public ValueTask ReportAsync(StoredOutcome outcome, double milliseconds, Reject? reject) =>
        entries.WriteAsync(new SpectrumDone(Source, outcome, milliseconds, _bytesPerSpectrum, reject));

    /// <summary>The reader, or the worker with one of its spectra, is done.</summary>
    public ValueTask LeaveAsync() =>
        Interlocked.Decrement(ref _busy) == 0 ? entries.WriteAsync(new FileEnded(Source, Bytes, Spoilt)) : ValueTask.CompletedTask;
}
