using System.Text;
using Parquet;
using Parquet.Schema;

namespace Redshift.Pipeline.Report.Formats;

/// <summary>
/// Apache Parquet. Units, UCDs and descriptions go along as the IVOA's note VOParquet has it: a VOTable without data among the file's
/// metadata.
/// </summary>
internal sealed class ParquetFormat : ITableFormat
{
    private const int GroupLength = 10_000;

    /// <inheritdoc/>
    public void Write<TRow>(Table<TRow> table, Stream stream) =>
        // A file's stream writes at once when asked to write later, and no other format has anything to wait for.
        WriteAsync(table, stream).GetAwaiter().GetResult();

    private static async Task WriteAsync<TRow>(Table<TRow> table, Stream stream)
    {
        var names = ColumnNames.Of(table.Columns);
        ParquetColumn[] columns = [.. table.Columns.Select((column, i) => ParquetColumn.Create(names[i], column.Type))];
        var schema = new ParquetSchema(columns.Select(column => column.Field));
        var writer = await ParquetWriter.CreateAsync(schema, stream).ConfigureAwait(false);
        await using (writer.ConfigureAwait(false))
        {
            writer.CustomMetadata = Metadata(table);
            foreach (var cells in table.Rows.Select(row => Cells(table.Columns, row)).Chunk(GroupLength))
                await WriteGroupAsync(writer, columns, cells).ConfigureAwait(false);
        }
    }

    // Rows may be large; only their cells are kept for a group.
    private static string[] Cells<TRow>(IReadOnlyList<Column<TRow>> columns, TRow row) => [.. columns.Select(column => column.Value(row).Text)];

    private static async Task WriteGroupAsync(ParquetWriter writer, ParquetColumn[] columns, string[][] rows)
    {
        using var group = writer.CreateRowGroup();
        for (var i = 0; i < columns.Length; i++)
            await columns[i].WriteAsync(group, Array.ConvertAll(rows, row => row[i])).ConfigureAwait(false);
        group.CompleteValidate();
    }

    private static Dictionary<string, string> Metadata<TRow>(Table<TRow> table)
    {
        using var description = new MemoryStream();
        VoTableFormat.WriteDescription(table, description);
        return new()
        {
            ["IVOA.VOTable-Parquet.version"] = "1.0",
            ["IVOA.VOTable-Parquet.content"] = Encoding.UTF8.GetString(description.ToArray()),
        };
    }
}
