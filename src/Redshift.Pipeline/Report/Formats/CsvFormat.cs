using CsvHelper;

namespace Redshift.Pipeline.Report.Formats;

/// <summary>CSV as RFC 4180 has it, but with line feeds, and plain ASCII.</summary>
internal sealed class CsvFormat : ITableFormat
{
    private static readonly CsvWriterOptions Options = CsvWriterOptions.Default with { NewLine = "\n" };

    /// <inheritdoc/>
    public void Write<TRow>(Table<TRow> table, Stream stream)
    {
        using var writer = CsvWriter.Create(stream, Options, leaveOpen: true);
        WriteRecord(writer, table.Columns.Select(column => column.Name));
        foreach (var row in table.Rows)
            WriteRecord(writer, table.Columns.Select(column => column.Value(row).Text));
    }

    private static void WriteRecord(CsvWriter writer, IEnumerable<string> fields)
    {
        foreach (var field in fields)
            writer.WriteField(field);
        writer.EndRecord();
    }
}
