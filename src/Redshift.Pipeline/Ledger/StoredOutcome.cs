using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Ledger;

/// <summary>What became of one spectrum as the ledger keeps it: exactly the cells of the tables, rounded as they are written.</summary>
/// <param name="Row">The spectrum, or -1 for the whole file.</param>
/// <param name="State">The verdict, or <c>rejected</c>.</param>
/// <param name="Cells">Its row of the catalogue or of the rejects, without source and row.</param>
/// <param name="Lines">Its rows of the line table, without source and row.</param>
public sealed record StoredOutcome(int Row, string State, string Cells, string Lines)
{
    /// <summary>Stands between cells, which are printable ASCII and never hold it.</summary>
    internal const char CellEnd = '\t';

    /// <summary>Stands between lines.</summary>
    internal const char LineEnd = '\n';

    // Source and row, the first two columns of every table, are the key.
    private const int KeyColumns = 2;

    /// <summary>An answer.</summary>
    /// <param name="result">The answer.</param>
    /// <param name="columns">The columns of the catalogue.</param>
    public static StoredOutcome Of(ObservationResult result, IReadOnlyList<Column<ObservationResult>> columns) => new(
        result.Observation.Row,
        Words.Of(result.Verdict),
        Join(columns, result),
        string.Join(LineEnd, result.Lines.Select(line => Join(LineColumns.All, new LineRow(result.Observation, line)))));

    /// <summary>A reject.</summary>
    public static StoredOutcome Of(Reject reject) => new(reject.Row ?? LedgerSchema.WholeFile, LedgerSchema.Rejected, Join(RejectColumns.All, reject), "");

    private static string Join<TRow>(IReadOnlyList<Column<TRow>> columns, TRow row) =>
        string.Join(CellEnd, columns.Skip(KeyColumns).Select(column => column.Value(row).Text));
}
