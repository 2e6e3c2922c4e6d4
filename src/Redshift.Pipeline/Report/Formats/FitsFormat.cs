using System.Globalization;
using Redshift.Fits;

namespace Redshift.Pipeline.Report.Formats;

/// <summary>
/// A FITS binary table (FITS Standard 4.0, section 7.3) with units, UCDs, comments and checksums, without a date. Unknown numbers
/// are not-a-number, or TNULL in columns of whole numbers.
/// </summary>
internal sealed class FitsFormat : ITableFormat
{
    private const int Unknown = int.MinValue;

    /// <inheritdoc/>
    public void Write<TRow>(Table<TRow> table, Stream stream)
    {
        var (rows, widths) = Measure(table);
        using var cursor = new RowCursor<TRow>(table.Rows);
        var names = ColumnNames.Of(table.Columns);
        var columns = table.Columns.Select((column, i) => Define(names[i], column, widths[i], cursor));
        Card[] cards = [Card.Of("CREATOR", "zladder"), Card.Commentary("COMMENT", table.Description)];
        new FitsWriter(stream, checksums: true).WriteTable(table.Name.ToUpperInvariant(), rows, [.. columns], cards);
    }

    private static (long Rows, int[] Widths) Measure<TRow>(Table<TRow> table)
    {
        var rows = 0L;
        // Some readers stumble over fields without any width.
        var widths = Enumerable.Repeat(1, table.Columns.Count).ToArray();
        var texts = Enumerable.Range(0, widths.Length).Where(i => table.Columns[i].Type == CellType.Text).ToArray();
        foreach (var row in table.Rows)
        {
            rows++;
            foreach (var i in texts)
                widths[i] = Math.Max(widths[i], table.Columns[i].Value(row).Text.Length);
        }

        return (rows, widths);
    }

    private static ColumnDefinition Define<TRow>(string name, Column<TRow> column, int width, RowCursor<TRow> cursor)
    {
        string Text(long row) => column.Value(cursor.At(row)).Text;
        var definition = column.Type switch
        {
            CellType.Whole => ColumnDefinition.Int32s(name, row => Whole(Text(row))) with { Null = Unknown },
            CellType.Real => ColumnDefinition.Doubles(name, row => Real(Text(row))),
            _ => ColumnDefinition.Strings(name, width, Text),
        };
        return definition with { Unit = column.Unit, Ucd = column.Ucd, Comment = column.Description };
    }

    private static int Whole(string text) => text.Length == 0 ? Unknown : int.Parse(text, CultureInfo.InvariantCulture);

    private static double Real(string text) => text.Length == 0 ? double.NaN : double.Parse(text, CultureInfo.InvariantCulture);
}
