namespace Redshift.Pipeline.Ledger;

/// <summary>The tables of the ledger.</summary>
internal static class LedgerSchema
{
    /// <summary>Marks a database as a ledger of this program: the letters zldr.</summary>
    public const int ApplicationId = 0x7a6c6472;

    /// <summary>Raised with every change of the tables.</summary>
    public const int Version = 1;

    /// <summary>The row of an outcome that is about the whole file.</summary>
    public const int WholeFile = -1;

    /// <summary>The state of an outcome that could not be used; all other states are verdicts.</summary>
    public const string Rejected = "rejected";

    // Cells are separated by tabs and lines by line feeds: cells are printable ASCII and hold neither. They begin behind source and row,
    // which stand in the key. Sources are ASCII too, so that the byte order of SQLite is the ordinal order of the reports.
    public static readonly string Create = FormattableString.Invariant(
        $"""
        CREATE TABLE setup (name TEXT PRIMARY KEY, value TEXT NOT NULL) WITHOUT ROWID;
        CREATE TABLE file (
            id INTEGER PRIMARY KEY,
            source TEXT NOT NULL UNIQUE,
            path TEXT NOT NULL,
            listed INTEGER NOT NULL,
            size INTEGER NOT NULL DEFAULT -1,
            modified INTEGER NOT NULL DEFAULT 0,
            hash TEXT NOT NULL DEFAULT '',
            fingerprint TEXT NOT NULL DEFAULT '',
            complete INTEGER NOT NULL DEFAULT 0);
        CREATE TABLE outcome (
            file INTEGER NOT NULL REFERENCES file (id),
            row INTEGER NOT NULL,
            state TEXT NOT NULL,
            milliseconds REAL NOT NULL,
            cells TEXT NOT NULL,
            lines TEXT NOT NULL,
            PRIMARY KEY (file, row));
        PRAGMA application_id={ApplicationId};
        PRAGMA user_version={Version};
        """);
}
