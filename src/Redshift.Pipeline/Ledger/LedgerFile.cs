using Microsoft.Data.Sqlite;

namespace Redshift.Pipeline.Ledger;

/// <summary>
/// The ledger of an output folder: what is known of every file and every spectrum, in a SQLite database. The catalogue and all other
/// tables are written from it. One thread at a time may use it.
/// </summary>
public sealed class LedgerFile : IDisposable
{
    /// <summary>Its name in the output folder.</summary>
    public const string Name = "ledger.db";

    // The cross join keeps SQLite from changing the order of the loops, and so from sorting what comes sorted.
    private const string Outcomes =
        "FROM file CROSS JOIN outcome ON outcome.file = file.id WHERE file.listed = 1 AND outcome.state {0} 'rejected' ORDER BY file.source, outcome.row";

    private LedgerFile(LedgerDatabase database) => Database = database;

    /// <summary>Where the ledger is.</summary>
    public string Path => Database.Path;

    /// <summary>What its run was told to do, or null before the first.</summary>
    /// <exception cref="LedgerException">The ledger cannot be read or written.</exception>
    public LedgerSetup? Setup
    {
        get => LedgerSetup.Read(Database);
        set => value!.Write(Database);
    }

    /// <summary>The header cards that are the last columns of the catalogue.</summary>
    /// <exception cref="LedgerException">The ledger cannot be read.</exception>
    public IReadOnlyList<string> Keep => Setup?.Keep ?? [];

    internal LedgerDatabase Database { get; }

    /// <summary>Opens the ledger of a folder to write, making it where there is none.</summary>
    /// <param name="folder">The output folder, which exists.</param>
    /// <exception cref="LedgerException">It cannot be used.</exception>
    public static LedgerFile Open(string folder) => new(LedgerDatabase.OpenOrCreate(In(folder)));

    /// <summary>Opens the ledger of an earlier run to read; a run that writes it at the same time does no harm.</summary>
    /// <param name="folder">The output folder.</param>
    /// <exception cref="LedgerException">There is none, or it cannot be used.</exception>
    public static LedgerFile OpenExisting(string folder) => new(LedgerDatabase.OpenExisting(In(folder)));

    /// <summary>The rows of the catalogue, sorted by source and row, streamed.</summary>
    /// <returns>For each row the text of all cells in the order of <see cref="Report.CatalogueColumns.With"/>; empty where unknown.</returns>
    /// <exception cref="LedgerException">The ledger cannot be read.</exception>
    public IEnumerable<string[]> Catalogue() =>
        Rows("outcome.cells", "<>").Select(static row => Cells(row.Source, row.Row, row.Text));

    /// <summary>The rows of the line table in the order of the catalogue, streamed.</summary>
    /// <returns>For each row the text of all cells in the order of <see cref="Report.LineColumns.All"/>; empty where unknown.</returns>
    /// <exception cref="LedgerException">The ledger cannot be read.</exception>
    public IEnumerable<string[]> Lines() => Rows("outcome.lines", "<>").SelectMany(static row =>
        row.Text.Split(StoredOutcome.LineEnd, StringSplitOptions.RemoveEmptyEntries).Select(line => Cells(row.Source, row.Row, line)));

    /// <summary>The rejects, sorted by source and row, those of whole files first; streamed.</summary>
    /// <returns>For each the text of all cells in the order of <see cref="Report.RejectColumns.All"/>; empty where unknown.</returns>
    /// <exception cref="LedgerException">The ledger cannot be read.</exception>
    public IEnumerable<string[]> Rejects() => Rows("outcome.cells", "=").Select(static row => Cells(row.Source, row.Row, row.Text));

    /// <summary>How many outcomes there are of each state: the words of the verdicts, and <c>rejected</c>.</summary>
    /// <exception cref="LedgerException">The ledger cannot be read.</exception>
    public IReadOnlyDictionary<string, int> CountByState() => Database
        .Query(
            "SELECT state, count(*) FROM file JOIN outcome ON outcome.file = file.id WHERE file.listed = 1 GROUP BY state",
            static reader => (State: reader.GetString(0), Count: reader.GetInt32(1)))
        .ToDictionary(static pair => pair.State, static pair => pair.Count);

    /// <inheritdoc/>
    public void Dispose() => Database.Dispose();

    private static string In(string folder) => System.IO.Path.Combine(System.IO.Path.GetFullPath(folder), Name);

    private static string[] Cells(string source, string row, string rest) => [source, row, .. rest.Split(StoredOutcome.CellEnd)];

    private IEnumerable<(string Source, string Row, string Text)> Rows(string text, string comparison) => Database.Query(
        $"SELECT file.source, CASE outcome.row WHEN {LedgerSchema.WholeFile} THEN '' ELSE outcome.row END, {text} " + Outcomes.Replace("{0}", comparison, StringComparison.Ordinal),
        static (SqliteDataReader reader) => (reader.GetString(0), reader.GetString(1), reader.GetString(2)));
}
