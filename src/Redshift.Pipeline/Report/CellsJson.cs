using System.Text;
using System.Text.Json;

namespace Redshift.Pipeline.Report;

/// <summary>Rows of a report as JSON: the same rounded values as in the tables, numbers as numbers, unknown as null.</summary>
public static class CellsJson
{
    private static readonly JsonWriterOptions Options = new() { Indented = true, NewLine = "\n" };

    /// <summary>Builds a JSON text.</summary>
    public static string Build(Action<Utf8JsonWriter> write)
    {
        using var stream = new MemoryStream();
        using (var writer = new Utf8JsonWriter(stream, Options))
            write(writer);
        return Encoding.UTF8.GetString(stream.ToArray());
    }

    /// <summary>Writes one row as an object.</summary>
    public static void WriteRow<TRow>(Utf8JsonWriter writer, IEnumerable<Column<TRow>> columns, TRow row)
    {
        writer.WriteStartObject();
        foreach (var column in columns)
        {
            writer.WritePropertyName(column.Name);
            WriteCell(writer, column.Value(row));
        }

        writer.WriteEndObject();
    }

    /// <summary>Writes rows as an array of objects.</summary>
    public static void WriteRows<TRow>(Utf8JsonWriter writer, IReadOnlyList<Column<TRow>> columns, IEnumerable<TRow> rows)
    {
        writer.WriteStartArray();
        foreach (var row in rows)
            WriteRow(writer, columns, row);
        writer.WriteEndArray();
    }

    private static void WriteCell(Utf8JsonWriter writer, Cell cell)
    {
        if (cell.Text.Length == 0)
            writer.WriteNullValue();
        else if (cell.IsNumber)
            writer.WriteRawValue(cell.Text);
        else
            writer.WriteStringValue(cell.Text);
    }
}
