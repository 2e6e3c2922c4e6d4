using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Report.Formats;

namespace Redshift.Pipeline.Report;

/// <summary>The tables that a ledger holds, ready for every format; their rows are streamed from it.</summary>
public static class LedgerTables
{
    /// <summary>The catalogue, one row a spectrum.</summary>
    public static Table<string[]> Catalogue(LedgerFile ledger) =>
        new("catalogue", "Redshifts and velocities, one row a spectrum", Stored(CatalogueColumns.With(ledger.Keep)), ledger.Catalogue());

    /// <summary>The lines, in the order of the catalogue.</summary>
    public static Table<string[]> Lines(LedgerFile ledger) =>
        new("lines", "Spectral lines, one row a line of a spectrum", Stored(LineColumns.All), ledger.Lines());

    /// <summary>What could not be used.</summary>
    public static Table<string[]> Rejects(LedgerFile ledger) =>
        new("rejects", "Files and spectra that could not be used", Stored(RejectColumns.All), ledger.Rejects());

    /// <summary>What the columns of the other tables mean.</summary>
    public static Table<ColumnGuide> Guide(LedgerFile ledger) => new(
        "columns",
        "Meaning of the columns of the other tables",
        ColumnGuide.Columns,
        ColumnGuide.Of("catalogue.csv", CatalogueColumns.With(ledger.Keep))
            .Concat(ColumnGuide.Of("lines.csv", LineColumns.All))
            .Concat(ColumnGuide.Of("rejects.csv", RejectColumns.All)));

    private static Column<string[]>[] Stored<TRow>(IReadOnlyList<Column<TRow>> columns) =>
        [.. columns.Select(static (column, index) => new Column<string[]>(
            column.Name, column.Unit, column.Ucd, column.Description, column.Type,
            row => new(row[index], column.Type != CellType.Text && row[index].Length > 0)))];
}
