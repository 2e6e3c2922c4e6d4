using Microsoft.Data.Sqlite;

namespace Redshift.Pipeline.Ledger;

/// <summary>What the ledger knows of a file.</summary>
/// <param name="Id">Its number in the ledger.</param>
/// <param name="Source">Its name in the tables.</param>
/// <param name="Path">Where it was read.</param>
/// <param name="Stamp">Its size and time then.</param>
/// <param name="Hash">The hash of its content then.</param>
/// <param name="Fingerprint">What its answers depend on beside it.</param>
/// <param name="Complete">Whether all its spectra are done.</param>
public sealed record KnownFile(long Id, string Source, string Path, FileStamp Stamp, string Hash, string Fingerprint, bool Complete);

/// <summary>
/// Tells the ledger the inputs of a run, all or none: these files make up the catalogue from then on. What is known of other files stays
/// in the ledger, should they be inputs again.
/// </summary>
public sealed class LedgerListing : IDisposable
{
    private readonly LedgerDatabase _database;
    private readonly SqliteCommand _find;
    private readonly SqliteCommand _list;

    /// <summary>Begins a new list.</summary>
    /// <exception cref="LedgerException">The ledger cannot be written.</exception>
    public LedgerListing(LedgerFile ledger)
    {
        _database = ledger.Database;
        _database.Execute("BEGIN IMMEDIATE; UPDATE file SET listed = 0 WHERE listed = 1");
        _find = _database.Command("SELECT id, path, size, modified, hash, fingerprint, complete FROM file WHERE source = @source");
        _find.Parameters.Add("@source", SqliteType.Text);
        _list = _database.Command(
            "INSERT INTO file (source, path, listed) VALUES (@source, @path, 1) ON CONFLICT (source) DO UPDATE SET listed = 1, path = @path");
        _list.Parameters.Add("@source", SqliteType.Text);
        _list.Parameters.Add("@path", SqliteType.Text);
    }

    /// <summary>Puts a file on the list.</summary>
    /// <param name="source">Its name in the tables.</param>
    /// <param name="path">Where it is.</param>
    /// <returns>What was known of it before, or null.</returns>
    /// <exception cref="LedgerException">The ledger cannot be written.</exception>
    public KnownFile? Add(string source, string path) => _database.Guarded(() =>
    {
        _find.Parameters[0].Value = _list.Parameters[0].Value = source;
        _list.Parameters[1].Value = path;
        var known = Find();
        _list.ExecuteNonQuery();
        return known;
    });

    /// <summary>The outcomes of a file so far, as row and whether there is an answer.</summary>
    /// <exception cref="LedgerException">The ledger cannot be read.</exception>
    public IEnumerable<(int Row, bool Answered)> Outcomes(KnownFile file) => _database.Query(
        FormattableString.Invariant($"SELECT row, state <> '{LedgerSchema.Rejected}' FROM outcome WHERE file = {file.Id}"),
        static reader => (reader.GetInt32(0), reader.GetBoolean(1)));

    /// <summary>Makes the list valid.</summary>
    /// <exception cref="LedgerException">The ledger cannot be written.</exception>
    public void Complete() => _database.Execute("COMMIT");

    /// <inheritdoc/>
    public void Dispose()
    {
        _find.Dispose();
        _list.Dispose();
        _database.RollBack();
    }

    private KnownFile? Find()
    {
        using var reader = _find.ExecuteReader();
        return reader.Read()
            ? new(
                reader.GetInt64(0), (string)_find.Parameters[0].Value!, reader.GetString(1), new(reader.GetInt64(2), reader.GetInt64(3)), reader.GetString(4), reader.GetString(5),
                reader.GetBoolean(6))
            : null;
    }
}
