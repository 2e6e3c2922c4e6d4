using System.Threading.Channels;
using Redshift.Pipeline.Ledger;

namespace Redshift.Pipeline.Batch;

/// <summary>A batch run that is written down in a ledger as it goes.</summary>
/// <param name="run">The run.</param>
/// <param name="ledger">The ledger.</param>
/// <param name="written">Is told each entry, from one thread at a time.</param>
public sealed class RecordedRun(BatchRun run, LedgerFile ledger, Action<LedgerEntry> written)
{
    // Enough for the workers to go on while a commit waits for the disk.
    private const int WaitingEntries = 1024;

    /// <summary>Runs the files. When it ends, in whatever way, all that was done is committed, unless the ledger itself failed.</summary>
    /// <param name="files">The files.</param>
    /// <param name="token">Ends the run early.</param>
    /// <exception cref="OperationCanceledException">The token ended the run.</exception>
    /// <exception cref="LedgerException">The ledger cannot be written.</exception>
    public async Task RunAsync(IReadOnlyList<FileWork> files, CancellationToken token)
    {
        using var stop = CancellationTokenSource.CreateLinkedTokenSource(token);
        var entries = Channel.CreateBounded<LedgerEntry>(WaitingEntries);
        var writing = Task.Run(() => WriteAsync(entries.Reader, stop), CancellationToken.None);
        var running = run.RunAsync(files, entries.Writer, stop.Token);
        await running.ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        entries.Writer.Complete();
        await writing.ConfigureAwait(false);
        await running.ConfigureAwait(false);
    }

    private async Task WriteAsync(ChannelReader<LedgerEntry> entries, CancellationTokenSource stop)
    {
        using var writer = new LedgerWriter(ledger);
        try
        {
            await writer.WriteAllAsync(entries, written).ConfigureAwait(false);
        }
        catch
        {
            await stop.CancelAsync().ConfigureAwait(false);
            // Workers that still hand in their last must not wait for ever.
            await foreach (var _ in entries.ReadAllAsync(CancellationToken.None).ConfigureAwait(false))
            {
            }

            throw;
        }
    }
}
