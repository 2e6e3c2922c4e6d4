namespace Redshift.Pipeline.Report;

/// <summary>One row of <c>columns.csv</c>, which explains the columns of the other tables.</summary>
/// <param name="Table">File that has the column.</param>
/// <param name="Name">Name of the column.</param>
/// <param name="Unit">Unit.</param>
/// <param name="Ucd">Unified content descriptor.</param>
/// <param name="Description">Meaning.</param>
public sealed record ColumnGuide(string Table, string Name, string Unit, string Ucd, string Description)
{
    /// <summary>The columns of the guide itself.</summary>
    public static IReadOnlyList<Column<ColumnGuide>> Columns { get; } =
    [
        new("table", "", "meta.id;meta.table", "File that has the column", CellType.Text, r => Cell.Of(r.Table)),
        new("name", "", "meta.id", "Name of the column", CellType.Text, r => Cell.Of(r.Name)),
        new("unit", "", "meta.unit", "Unit", CellType.Text, r => Cell.Of(r.Unit)),
        new("ucd", "", "meta.ucd", "Unified content descriptor", CellType.Text, r => Cell.Of(r.Ucd)),
        new("description", "", "meta.note", "Meaning", CellType.Text, r => Cell.Of(r.Description)),
    ];

    /// <summary>The rows for the columns of one table.</summary>
    public static IEnumerable<ColumnGuide> Of<TRow>(string table, IEnumerable<Column<TRow>> columns) =>
        columns.Select(column => new ColumnGuide(table, column.Name, column.Unit, column.Ucd, column.Description));
}
