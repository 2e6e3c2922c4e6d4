using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Report.Formats;

namespace Redshift.Pipeline.Report;

/// <summary>
/// The tables of an output folder, written from its ledger alone: whatever happened on the way, the same answers give the same bytes.
/// </summary>
public static class CatalogueFiles
{
    /// <summary>Writes all tables; each replaces an older one when it is complete.</summary>
    /// <param name="ledger">The ledger.</param>
    /// <param name="folder">The output folder.</param>
    /// <param name="token">Ends the writing; tables that are not complete yet stay as they were.</param>
    /// <exception cref="IOException">The ledger cannot be read or the folder not written.</exception>
    /// <exception cref="OperationCanceledException">The token ended the writing.</exception>
    public static void Write(LedgerFile ledger, string folder, CancellationToken token = default)
    {
        Write(LedgerTables.Lines(ledger));
        Write(LedgerTables.Rejects(ledger));
        Write(LedgerTables.Guide(ledger));
        Write(LedgerTables.Catalogue(ledger));

        void Write<TRow>(Table<TRow> table) => TableFormats.Write(
            table.Until(token), "csv", Path.Combine(folder, TableFormats.FileName(table.Name, "csv")));
    }
}
