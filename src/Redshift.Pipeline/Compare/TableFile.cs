namespace Redshift.Pipeline.Compare;

/// <summary>A table of any program, CSV or FITS, read row by row as text.</summary>
internal abstract class TableFile(string path) : IDisposable
{
    /// <summary>The file.</summary>
    public string Path { get; } = path;

    /// <summary>Names of the columns.</summary>
    public abstract IReadOnlyList<string> Names { get; }

    /// <summary>Opens a table.</summary>
    /// <exception cref="TableFileException">It is none.</exception>
    public static TableFile Open(string path)
    {
        try
        {
            return StartsAsFits(path) ? new FitsTableFile(path) : new CsvTableFile(path);
        }
        catch (Exception problem) when (problem is IOException or UnauthorizedAccessException)
        {
            throw new TableFileException(path, "", "no file that can be opened", "a table in CSV or FITS");
        }
    }

    /// <summary>The rows, once: each with its place in the words of an error and with one text a column, empty where unknown.</summary>
    public abstract IEnumerable<(string Place, IReadOnlyList<string> Cells)> Rows();

    /// <inheritdoc/>
    public abstract void Dispose();

    // SIMPLE = T at fixed places opens every FITS file (FITS Standard 4.0, section 4.4.1.1).
    private static bool StartsAsFits(string path)
    {
        using var file = File.OpenRead(path);
        var start = new byte[9];
        return file.ReadAtLeast(start, start.Length, throwOnEndOfStream: false) == start.Length && start.AsSpan().SequenceEqual("SIMPLE  ="u8);
    }
}
