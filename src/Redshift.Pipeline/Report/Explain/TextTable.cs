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
