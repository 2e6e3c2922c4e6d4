using System.Threading.Channels;
using Microsoft.Data.Sqlite;

namespace Redshift.Pipeline.Ledger;

/// <summary>The one writer of a ledger: takes down what the workers report, in commits of a quarter of a second.</summary>
public sealed class LedgerWriter : IDisposable
{
    /// <summary>
    /// Nothing that was written waits longer for its commit. A killed run loses no more than this, what came while a commit waited for the
    /// disk, and what was being measured. There must not be many commits, as each waits for the disk.
    /// </summary>
    public static readonly TimeSpan CommitInterval = TimeSpan.FromSeconds(0.25);

    private readonly LedgerDatabase _database;
    private readonly TimeProvider _clock;
    private readonly SqliteCommand _begin;
    private readonly SqliteCommand _forget;
    private readonly SqliteCommand _add;
    private readonly SqliteCommand _end;

    /// <summary>Makes the writer of a ledger.</summary>
    /// <param name="ledger">The ledger.</param>
    /// <param name="clock">Tells the time between commits; the system's unless given.</param>
    public LedgerWriter(LedgerFile ledger, TimeProvider? clock = null)
    {
        _database = ledger.Database;
        _clock = clock ?? TimeProvider.System;
        _begin = Command(
            "UPDATE file SET size = @size, modified = @modified, hash = @hash, fingerprint = @fingerprint, complete = 0 WHERE source = @source",
            "@source", "@size", "@modified", "@hash", "@fingerprint");
        _forget = Command("DELETE FROM outcome WHERE file = (SELECT id FROM file WHERE source = @source)", "@source");
        _add = Command(
            "INSERT OR REPLACE INTO outcome (file, row, state, milliseconds, cells, lines) "
            + "SELECT id, @row, @state, @milliseconds, @cells, @lines FROM file WHERE source = @source",
            "@source", "@row", "@state", "@milliseconds", "@cells", "@lines");
        _end = Command("UPDATE file SET complete = 1 WHERE source = @source", "@source");
    }

    /// <summary>Writes all entries until there are no more; what was written before a failure stays written.</summary>
    /// <param name="entries">The entries; those of one file in order.</param>
    /// <param name="written">Is told each entry.</param>
    /// <exception cref="LedgerException">The ledger cannot be written.</exception>
    public async Task WriteAllAsync(ChannelReader<LedgerEntry> entries, Action<LedgerEntry> written)
    {
        var more = entries.WaitToReadAsync().AsTask();
        while (await more.ConfigureAwait(false))
        {
            _database.Execute("BEGIN IMMEDIATE");
            var begun = _clock.GetTimestamp();
            var interval = Task.Delay(CommitInterval, _clock);
            while (!IsDue(begun) && more.IsCompletedSuccessfully && more.Result)
            {
                // The clock is looked at before each entry: a stream that never pauses must not put off the commit.
                while (!IsDue(begun) && entries.TryRead(out var entry))
                {
                    Write(entry);
                    written(entry);
                }

                more = entries.WaitToReadAsync().AsTask();
                await Task.WhenAny(more, interval).ConfigureAwait(false);
            }

            _database.Execute("COMMIT");
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        _begin.Dispose();
        _forget.Dispose();
        _add.Dispose();
        _end.Dispose();
        _database.RollBack();
    }

    private bool IsDue(long begun) => _clock.GetElapsedTime(begun) >= CommitInterval;

    private void Write(LedgerEntry entry)
    {
        switch (entry)
        {
            case FileBegun begun:
                if (!begun.Keeps)
                    Run(_forget, begun.Source);
                Run(_begin, begun.Source, begun.Stamp.Size, begun.Stamp.Modified, begun.Hash, begun.Fingerprint);
                break;
            case SpectrumDone done:
                Add(done.Source, done.Outcome, done.Milliseconds);
                break;
            case FileEnded { Spoilt: { } reject }:
                Run(_forget, entry.Source);
                Add(entry.Source, StoredOutcome.Of(reject), 0);
                Run(_begin, entry.Source, FileStamp.None.Size, FileStamp.None.Modified, "", "");
                break;
            case FileEnded:
                Run(_end, entry.Source);
                break;
        }
    }

    private void Add(string source, StoredOutcome outcome, double milliseconds) =>
        Run(_add, source, outcome.Row, outcome.State, milliseconds, outcome.Cells, outcome.Lines);

    private SqliteCommand Command(string sql, params ReadOnlySpan<string> parameters)
    {
        var command = _database.Command(sql);
        foreach (var parameter in parameters)
            command.Parameters.AddWithValue(parameter, "");
        return command;
    }

    private void Run(SqliteCommand command, params object[] values) => _database.Guarded(() =>
    {
        for (var i = 0; i < values.Length; i++)
            command.Parameters[i].Value = values[i];
        return command.ExecuteNonQuery();
    });
}
