using System.Globalization;
using Microsoft.Data.Sqlite;

namespace Redshift.Pipeline.Ledger;

/// <summary>The connection to a ledger: opens and checks it, and turns errors of the database into words.</summary>
internal sealed class LedgerDatabase : IDisposable
{
    // Seconds to wait for another process that reads.
    private const int Patience = 5;

    private readonly SqliteConnection _connection;
    private readonly bool _writes;

    private LedgerDatabase(string path, SqliteOpenMode mode)
    {
        Path = path;
        _writes = mode != SqliteOpenMode.ReadOnly;
        _connection = new(new SqliteConnectionStringBuilder
        {
            DataSource = path,
            Mode = mode,
            Pooling = false,
            DefaultTimeout = Patience,
        }.ToString());
    }

    /// <summary>What the names of files end in that SQLite keeps beside a database while it is open, and a killed run leaves behind.</summary>
    public static IReadOnlyList<string> Logs { get; } = ["-wal", "-shm", "-journal"];

    /// <summary>Where the ledger is.</summary>
    public string Path { get; }

    /// <summary>Opens a ledger to write, making it where there is none.</summary>
    /// <exception cref="LedgerException">It cannot be used.</exception>
    public static LedgerDatabase OpenOrCreate(string path)
    {
        var database = new LedgerDatabase(path, SqliteOpenMode.ReadWriteCreate);
        return database.Opened(() =>
        {
            database.Execute(JournalChoice.For(System.IO.Path.GetDirectoryName(path)!));
            if (database.IsNew())
                database.Execute("BEGIN IMMEDIATE;" + LedgerSchema.Create + "COMMIT;");
            database.Check();
        });
    }

    /// <summary>
    /// Opens a ledger that exists, to read only. All is read in one transaction: who goes through a table twice finds the same rows,
    /// even while a run goes on.
    /// </summary>
    /// <exception cref="LedgerException">It cannot be used.</exception>
    public static LedgerDatabase OpenExisting(string path)
    {
        if (!File.Exists(path))
            throw new LedgerException(path, "nothing", "a ledger", "name the output folder of a run");
        var database = new LedgerDatabase(path, SqliteOpenMode.ReadOnly);
        return database.Opened(() =>
        {
            database.Execute("BEGIN");
            database.Check();
        });
    }

    /// <summary>Runs statements that give nothing back.</summary>
    public void Execute(string sql) => Guarded(() =>
    {
        using var command = Command(sql);
        return command.ExecuteNonQuery();
    });

    /// <summary>Makes a command; run it inside <see cref="Guarded"/>.</summary>
    public SqliteCommand Command(string sql)
    {
        var command = _connection.CreateCommand();
        command.CommandText = sql;
        return command;
    }

    /// <summary>The rows of a query, one after the other.</summary>
    public IEnumerable<T> Query<T>(string sql, Func<SqliteDataReader, T> map)
    {
        using var command = Command(sql);
        using var reader = Guarded(command.ExecuteReader);
        while (Guarded(reader.Read))
            yield return Guarded(() => map(reader));
    }

    /// <summary>Does something with the database.</summary>
    /// <exception cref="LedgerException">The database says no.</exception>
    public T Guarded<T>(Func<T> action)
    {
        try
        {
            return action();
        }
        catch (SqliteException problem)
        {
            throw LedgerException.From(problem, Path);
        }
    }

    /// <summary>Undoes what was begun and not committed.</summary>
    public void RollBack()
    {
        // SQLite ends a transaction by itself where the disk is full, and says so only here.
        if (SQLitePCL.raw.sqlite3_get_autocommit(_connection.Handle!) == 0)
            Execute("ROLLBACK");
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        if (_writes)
            MakeSingleFile();
        _connection.Dispose();
    }

    // Without a write-ahead log beside it a ledger can be copied as one file, and be read where nobody may write.
    private void MakeSingleFile()
    {
        try
        {
            using var command = Command("PRAGMA journal_mode=DELETE");
            command.CommandTimeout = 1;
            command.ExecuteNonQuery();
        }
        catch (SqliteException)
        {
            // Somebody reads it at this moment, or the disk is full. The log then stays beside the ledger, which is as good.
        }
    }

    private LedgerDatabase Opened(Action prepare)
    {
        try
        {
            Guarded(() =>
            {
                _connection.Open();
                return 0;
            });
            prepare();
            return this;
        }
        catch
        {
            Dispose();
            throw;
        }
    }

    private bool IsNew() => Number("SELECT count(*) FROM sqlite_schema") == 0 && Number("PRAGMA application_id") == 0;

    private void Check()
    {
        if (Number("PRAGMA application_id") != LedgerSchema.ApplicationId)
            throw LedgerException.Foreign(Path, "a database of another program", "a ledger");
        if (Number("PRAGMA user_version") is var version && version != LedgerSchema.Version)
        {
            throw LedgerException.Foreign(
                Path,
                string.Create(CultureInfo.InvariantCulture, $"a ledger of version {version}"),
                string.Create(CultureInfo.InvariantCulture, $"version {LedgerSchema.Version}, which this release writes"));
        }
    }

    private long Number(string sql) => Guarded(() =>
    {
        using var command = Command(sql);
        return (long)command.ExecuteScalar()!;
    });
}
