using System.Threading.Channels;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Batch;

/// <summary>Reads one file after the other: what is new in it goes to the workers, what cannot be used is reported.</summary>
/// <param name="settings">How files are read.</param>
/// <param name="fingerprint">What the answers depend on beside the files.</param>
/// <param name="shard">Which part of large files is read.</param>
/// <param name="work">Takes the spectra.</param>
/// <param name="entries">Takes the reports.</param>
internal sealed class FileReader(
    LoadSettings settings, string fingerprint, Shard shard, ChannelWriter<PendingSpectrum> work, ChannelWriter<LedgerEntry> entries)
{
    /// <summary>Reads a file to its end.</summary>
    /// <exception cref="OperationCanceledException">The token ended the run.</exception>
    public async Task ReadAsync(FileWork item, CancellationToken token)
    {
        var file = new OpenFile(item.File, entries);
        var stamp = item.File.Problem is null ? FileStamp.Of(item.File.Path) : FileStamp.None;
        if (IsForOthers(file.Source, item.File.Path, stamp.Size))
        {
            await entries.WriteAsync(Unread(file.Source), token).ConfigureAwait(false);
            file.Bytes = stamp.Size;
        }
        else if (!TryHash(item.File, out var hash, out var problem))
        {
            await entries.WriteAsync(Unread(file.Source), token).ConfigureAwait(false);
            await file.ReportAsync(StoredOutcome.Of(problem), 0, problem).ConfigureAwait(false);
        }
        else
        {
            var known = item.Known?.Hash == hash ? item.Known : null;
            await entries.WriteAsync(new FileBegun(file.Source, stamp, hash, fingerprint, known is not null), token).ConfigureAwait(false);
            file.Bytes = stamp.Size;
            if (known is not { Complete: true })
                await ReadSpectraAsync(item.File, file, row => shard.Owns(file.Source, stamp.Size, row) && known?.Done.Contains(row) != true, token).ConfigureAwait(false);
            if (FileStamp.Of(item.File.Path) != stamp)
                file.Spoilt = Changed(item.File);
        }

        await file.LeaveAsync().ConfigureAwait(false);
    }

    // Of a large file the headers tell whether this part has to read it: parts must not all read all stacks.
    private bool IsForOthers(string source, string path, long size)
    {
        if (size < Shard.LargeFile || shard == Shard.Whole)
            return false;
        using var reading = new FileReading(source, settings);
        return Guarded(source, null, () => reading.Open(path), static fault => fault) is null
            && !Enumerable.Range(0, reading.Rows).Any(row => shard.Owns(source, size, row));
    }

    private async Task ReadSpectraAsync(InputFile input, OpenFile file, Func<int, bool> isWanted, CancellationToken token)
    {
        using var reading = new FileReading(file.Source, settings);
        if (Guarded<Reject?>(file.Source, null, () => reading.Open(input.Path), static fault => fault) is { } refused)
        {
            await file.ReportAsync(StoredOutcome.Of(refused), 0, refused).ConfigureAwait(false);
            return;
        }

        var rows = Enumerable.Range(0, reading.Rows).Where(isWanted).ToList();
        file.ShareAmong(rows.Count);
        foreach (var row in rows)
        {
            token.ThrowIfCancellationRequested();
            var (observation, reject) = Guarded(file.Source, row, () => reading.Read(row), static fault => new LoadOutcome(null, fault));
            if (observation is null)
                await file.ReportAsync(StoredOutcome.Of(reject!), 0, reject).ConfigureAwait(false);
            else
                await SendAsync(new(file, observation), token).ConfigureAwait(false);
        }
    }

    private ValueTask SendAsync(PendingSpectrum spectrum, CancellationToken token)
    {
        spectrum.File.Enter();
        return work.WriteAsync(spectrum, token);
    }

    private static bool TryHash(InputFile file, out string hash, out Reject problem)
    {
        (hash, problem) = ("", file.Reject!);
        if (file.Reject is not null)
            return false;
        try
        {
            hash = ContentHash.Of(file.Path);
            return true;
        }
        catch (Exception trouble) when (trouble is IOException or UnauthorizedAccessException)
        {
            problem = new(file.Source, null, "file", trouble.Message, "a readable file");
            return false;
        }
    }

    private static FileBegun Unread(string source) => new(source, FileStamp.None, "", "", Keeps: false);

    private static Reject Changed(InputFile file) => File.Exists(file.Path)
        ? new(file.Source, null, "file", "another size or time after reading than before", "a file that nobody writes; run again when it is complete")
        : new(file.Source, null, "file", "that it vanished while it was read", "a file that stays; run again when it is back");

    // A fault of our own in one file must not cost the night: it becomes a reject that says so.
    private static T Guarded<T>(string source, int? row, Func<T> read, Func<Reject, T> refuse)
    {
        try
        {
            return read();
        }
        catch (Exception problem) when (problem is not OperationCanceledException)
        {
            return refuse(Fault.In(source, row, "reading", problem));
        }
    }
}
