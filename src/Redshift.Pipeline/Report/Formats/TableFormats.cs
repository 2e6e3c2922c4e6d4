namespace Redshift.Pipeline.Report.Formats;

/// <summary>The formats by name.</summary>
public static class TableFormats
{
    private static readonly Dictionary<string, (ITableFormat Format, string Extension)> ByName = new(StringComparer.Ordinal)
    {
        ["csv"] = (new CsvFormat(), "csv"),
        ["fits"] = (new FitsFormat(), "fits"),
        ["parquet"] = (new ParquetFormat(), "parquet"),
        ["votable"] = (new VoTableFormat(), "vot"),
    };

    /// <summary>The names.</summary>
    public static IReadOnlyCollection<string> Names => ByName.Keys;

    /// <summary>The usual name of the file of a table, such as <c>lines.vot</c>.</summary>
    public static string FileName(string table, string format) => $"{table}.{ByName[format].Extension}";

    /// <summary>Writes a table; the file appears when it is complete, replacing an older one.</summary>
    /// <param name="table">The table.</param>
    /// <param name="format">One of <see cref="Names"/>.</param>
    /// <param name="path">The file.</param>
    /// <exception cref="IOException">The file cannot be written.</exception>
    /// <exception cref="UnauthorizedAccessException">The file cannot be written.</exception>
    public static void Write<TRow>(Table<TRow> table, string format, string path)
    {
        var unfinished = path + ".unfinished";
        try
        {
            using (var stream = File.Create(unfinished))
                ByName[format].Format.Write(table, stream);
            File.Move(unfinished, path, overwrite: true);
        }
        finally
        {
            File.Delete(unfinished);
        }
    }
}
