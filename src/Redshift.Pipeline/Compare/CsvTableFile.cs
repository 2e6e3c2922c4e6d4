using CsvHelper;

namespace Redshift.Pipeline.Compare;

/// <summary>A table in CSV with its names in the first line; semicolons or tabs may stand for commas; lines that start with # are remarks.</summary>
internal sealed class CsvTableFile : TableFile
{
    private const int LongestRecord = 1 << 20;

    private static readonly CsvReaderOptions Options = CsvReaderOptions.Default with
    {
        TrackLineNumbers = true,
        CommentPrefix = '#',
        TrimWhitespace = true,
        MaxRecordSize = LongestRecord,
    };

    private readonly CsvReader _reader;

    /// <summary>Opens the file and reads the names.</summary>
    public CsvTableFile(string path)
        : base(path)
    {
        _reader = CsvReader.FromFile(path, Options with { Separator = SeparatorOf(path) });
        try
        {
            Names = [.. Guarded(() => _reader.Headers)];
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
        while (Guarded(_reader.Read))
            yield return (FormattableString.Invariant($"line {_reader.LineNumber}"), [.. Names.Select((_, i) => _reader.GetString(i))]);
    }

    /// <inheritdoc/>
    public override void Dispose() => _reader.Dispose();

    // The names decide: texts further down are full of semicolons.
    private static char SeparatorOf(string path)
    {
        var names = File.ReadLines(path).FirstOrDefault(line => line.Length > 0 && line[0] != '#') ?? "";
        return ",;\t".FirstOrDefault(names.Contains, ',');
    }

    private T Guarded<T>(Func<T> read)
    {
        try
        {
            return read();
        }
        catch (CsvFormatException problem)
        {
            throw new TableFileException(Path, FormattableString.Invariant($"line {problem.LineNumber}"), "a record that is no CSV", "fields with commas between, quoted in pairs");
        }
    }
}
