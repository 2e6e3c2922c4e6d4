using System.Globalization;
using Redshift.Fits;

namespace Redshift.Pipeline.Compare;

/// <summary>The first table of a FITS file; cells with more than one element count as unknown.</summary>
internal sealed class FitsTableFile : TableFile
{
    private readonly FitsFile _file;
    private readonly TableHdu _table;

    /// <summary>Opens the file and finds its table.</summary>
    public FitsTableFile(string path)
        : base(path)
    {
        _file = Guarded("", () => FitsFile.Open(path));
        try
        {
            _table = _file.Hdus.OfType<TableHdu>().FirstOrDefault() ?? throw new TableFileException(path, "", "no table", "a FITS file with a table");
            Names = [.. Guarded("HDU " + _table.Index, () => _table.Columns).Select(column => column.Name)];
        }
        catch
        {
            Dispose();
            throw;
        }
    }

    /// <inheritdoc/>
    public override IReadOnlyList<string> Names { get; }

    /// <inheritdoc/>
    public override IEnumerable<(string Place, IReadOnlyList<string> Cells)> Rows()
    {
        for (long row = 0; row < _table.RowCount; row++)
        {
            var (number, place) = (row, FormattableString.Invariant($"HDU {_table.Index} row {row}"));
            yield return (place, Guarded(place, () => _table.Columns.Select(column => Text(column, number)).ToArray()));
        }
    }

    /// <inheritdoc/>
    public override void Dispose() => _file.Dispose();

    private T Guarded<T>(string place, Func<T> read)
    {
        try
        {
            return read();
        }
        catch (FitsException problem)
        {
            throw new TableFileException(Path, place, problem.Message, "a sound FITS table");
        }
    }

    private static string Text(TableColumn column, long row)
    {
        if (column.IsText)
            return column.ReadString(row).Trim();
        if (!column.IsNumeric || column.LengthAt(row) != 1)
            return "";
        // Identifiers of 19 digits do not survive as doubles.
        if (column.IsInteger)
            return column.ReadIntegers(row)[0].ToString(CultureInfo.InvariantCulture);
        var value = column.ReadDoubles(row)[0];
        return double.IsFinite(value) ? value.ToString("R", CultureInfo.InvariantCulture) : "";
    }
}
