using CsvHelper;

namespace Redshift.Pipeline.Report;

/// <summary>
/// A CSV file (RFC 4180, but LF and plain ASCII) written row by row under a temporary name; it gets its own name when it is complete,
/// so that nobody ever reads half a table.
/// </summary>
/// <typeparam name="TRow">What a row is made from.</typeparam>
public sealed class CsvTable<TRow> : IDisposable
{
    private static readonly CsvWriterOptions Options = CsvWriterOptions.Default with { NewLine = "\n" };

    private readonly string _path;
    private readonly string _unfinished;
    private readonly IReadOnlyList<Column<TRow>> _columns;
    private readonly CsvWriter _writer;

    /// <summary>Starts the file with its header.</summary>
    /// <exception cref="IOException">The file cannot be made.</exception>
    public CsvTable(string path, IReadOnlyList<Column<TRow>> columns)
    {
        _path = path;
        _unfinished = path + ".unfinished";
        _columns = columns;
        _writer = CsvWriter.ToFile(_unfinished, Options);
        foreach (var column in columns)
            _writer.WriteField(column.Name);
        _writer.EndRecord();
    }

    /// <summary>Adds a row.</summary>
    public void Add(TRow row)
    {
        foreach (var column in _columns)
            _writer.WriteField(column.Value(row).Text);
        _writer.EndRecord();
    }

    /// <summary>Ends the file and gives it its name, replacing an older one.</summary>
    public void Complete()
    {
        _writer.Dispose();
        File.Move(_unfinished, _path, overwrite: true);
    }

    /// <summary>Drops the file where it was not completed.</summary>
    public void Dispose()
    {
        _writer.Dispose();
        File.Delete(_unfinished);
    }
}
