namespace Redshift.Pipeline.Report.Explain;

/// <summary>Columns of text under each other for a terminal: numbers to the right, words to the left.</summary>
public sealed class TextTable
{
    private const string Gap = "  ";

    private readonly List<Cell[]> _rows = [];

    /// <summary>Adds a row; a cell that is a number is set to the right, an empty one to either side.</summary>
    public void Add(params Cell[] row) => _rows.Add(row);

    /// <summary>Adds a row of words.</summary>
    public void AddWords(params string[] row) => _rows.Add([.. row.Select(word => new Cell(word, false))]);

    /// <summary>Writes a table with a title and a heading after an empty line; nothing where there are no rows.</summary>
    public static void Write<TRow>(TextWriter output, string title, IReadOnlyList<Column<TRow>> columns, IEnumerable<TRow> rows)
    {
        Cell[][] cells = [.. rows.Select(row => columns.Select(column => column.Value(row)).ToArray())];
        if (cells.Length == 0)
            return;
        Write(output, title, cells.Prepend([.. columns.Select(column => new Cell(column.Name, false))]));
    }

    /// <summary>Writes rows under a title after an empty line; nothing where there are none.</summary>
    public static void Write(TextWriter output, string title, IEnumerable<Cell[]> rows)
    {
        var table = new TextTable();
        foreach (var row in rows)
            table.Add(row);
        if (table._rows.Count == 0)
            return;
        output.WriteLine();
        output.WriteLine(title);
        table.Write(output, "  ");
    }

    /// <summary>Writes the rows, each after <paramref name="indent"/>.</summary>
    public void Write(TextWriter output, string indent)
    {
        var widths = Enumerable.Range(0, _rows.Select(row => row.Length).DefaultIfEmpty(0).Max())
            .Select(i => _rows.Where(row => row.Length > i).Max(row => row[i].Text.Length)).ToArray();
        foreach (var row in _rows)
            output.WriteLine((indent + string.Join(Gap, row.Select((cell, i) => Pad(cell, widths[i], i)))).TrimEnd());
    }

    // A heading of a column of numbers stands over the numbers.
    private string Pad(Cell cell, int width, int column) =>
        _rows.Exists(row => row.Length > column && row[column].IsNumber) ? cell.Text.PadLeft(width) : cell.Text.PadRight(width);
}
