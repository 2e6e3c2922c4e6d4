namespace Redshift.Pipeline.Report.Formats;

/// <summary>A file format for tables. All formats hold the same rounded values, and the same table gives the same bytes.</summary>
public interface ITableFormat
{
    /// <summary>Writes a whole table.</summary>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    void Write<TRow>(Table<TRow> table, Stream stream);
}
