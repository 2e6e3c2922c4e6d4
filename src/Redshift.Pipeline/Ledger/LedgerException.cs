using Microsoft.Data.Sqlite;
using Redshift.Pipeline.Report;

namespace Redshift.Pipeline.Ledger;

/// <summary>The ledger cannot be used: what was found, what was expected and what to do about it.</summary>
/// <param name="path">The ledger.</param>
/// <param name="found">What stands there.</param>
/// <param name="expected">What was expected.</param>
/// <param name="advice">What to do.</param>
/// <param name="cause">What brought it to light.</param>
public sealed class LedgerException(string path, string found, string expected, string advice, Exception? cause = null)
    : IOException($"{path}: found {found}; expected {expected}; {advice}", cause)
{
    private const string StartAnew = "move it away to start anew, or bring back a copy; the tables beside it are untouched";

    // Primary result codes of SQLite (https://sqlite.org/rescode.html).
    private const int Busy = 5;
    private const int Locked = 6;
    private const int ReadOnly = 8;
    private const int InputOutput = 10;
    private const int Corrupt = 11;
    private const int Full = 13;
    private const int CannotOpen = 14;
    private const int NotADatabase = 26;

    /// <summary>A file that is no ledger, or not one of this program's version.</summary>
    internal static LedgerException Foreign(string path, string found, string expected) => new(path, found, expected, StartAnew);

    /// <summary>The words for an error of the database.</summary>
    internal static Exception From(SqliteException problem, string path) => problem.SqliteErrorCode switch
    {
        Busy or Locked => new FolderInUseException(Path.GetDirectoryName(path)!),
        NotADatabase => new LedgerException(path, "a file that is no database", "a ledger", StartAnew, problem),
        Corrupt => new LedgerException(path, "a damaged database", "a sound ledger", StartAnew, problem),
        Full => new LedgerException(path, "no room left on the disk", "room for the ledger", GoOn, problem),
        InputOutput => new LedgerException(path, "a disk that does not read or write", "a sound disk with room for the ledger", GoOn, problem),
        ReadOnly or CannotOpen => new LedgerException(
            path, "a file or folder that may not be written", "permission to write", "change it or choose another folder", problem),
        _ => new LedgerException(path, $"an error of the database ({problem.Message})", "none", GoOn, problem),
    };

    private const string GoOn = "mend that and give the same command again: it goes on from what was recorded";
}
