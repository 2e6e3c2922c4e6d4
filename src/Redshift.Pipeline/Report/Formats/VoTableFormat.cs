using System.Text;
using System.Xml;

namespace Redshift.Pipeline.Report.Formats;

/// <summary>VOTable 1.4 of the IVOA with its data in TABLEDATA; an empty cell is an unknown value (section 5.1).</summary>
internal sealed class VoTableFormat : ITableFormat
{
    // The namespace stayed that of 1.3 (VOTable 1.4, section 3).
    private const string Namespace = "http://www.ivoa.net/xml/VOTable/v1.3";

    private static readonly XmlWriterSettings Settings = new() { Encoding = new UTF8Encoding(false), CloseOutput = false };

    /// <inheritdoc/>
    public void Write<TRow>(Table<TRow> table, Stream stream) => Write(table, stream, WriteData);

    /// <summary>Writes what describes the table, without the data.</summary>
    public static void WriteDescription<TRow>(Table<TRow> table, Stream stream) => Write(table, stream, (_, _) => { });

    private static void Write<TRow>(Table<TRow> table, Stream stream, Action<XmlWriter, Table<TRow>> writeData)
    {
        using var writer = XmlWriter.Create(stream, Settings);
        writer.WriteStartDocument();
        StartLine(writer);
        writer.WriteStartElement("VOTABLE", Namespace);
        writer.WriteAttributeString("version", "1.4");
        StartLine(writer);
        writer.WriteStartElement("RESOURCE");
        StartLine(writer);
        WriteTable(writer, table, writeData);
        StartLine(writer);
        writer.WriteEndElement();
        StartLine(writer);
        writer.WriteEndElement();
        StartLine(writer);
    }

    private static void WriteTable<TRow>(XmlWriter writer, Table<TRow> table, Action<XmlWriter, Table<TRow>> writeData)
    {
        writer.WriteStartElement("TABLE");
        writer.WriteAttributeString("name", table.Name);
        StartLine(writer);
        writer.WriteElementString("DESCRIPTION", table.Description);
        var names = ColumnNames.Of(table.Columns);
        for (var i = 0; i < names.Count; i++)
            WriteField(writer, names[i], table.Columns[i]);
        writeData(writer, table);
        StartLine(writer);
        writer.WriteEndElement();
    }

    private static void WriteField<TRow>(XmlWriter writer, string name, Column<TRow> column)
    {
        StartLine(writer);
        writer.WriteStartElement("FIELD");
        writer.WriteAttributeString("name", name);
        writer.WriteAttributeString("datatype", column.Type switch { CellType.Whole => "int", CellType.Real => "double", _ => "char" });
        if (column.Type == CellType.Text)
            writer.WriteAttributeString("arraysize", "*");
        if (column.Unit.Length > 0)
            writer.WriteAttributeString("unit", column.Unit);
        if (column.Ucd.Length > 0)
            writer.WriteAttributeString("ucd", column.Ucd);
        writer.WriteElementString("DESCRIPTION", column.Description);
        writer.WriteEndElement();
    }

    private static void WriteData<TRow>(XmlWriter writer, Table<TRow> table)
    {
        StartLine(writer);
        writer.WriteStartElement("DATA");
        writer.WriteStartElement("TABLEDATA");
        foreach (var row in table.Rows)
        {
            StartLine(writer);
            writer.WriteStartElement("TR");
            foreach (var column in table.Columns)
                writer.WriteElementString("TD", column.Value(row).Text);
            writer.WriteEndElement();
        }

        StartLine(writer);
        writer.WriteEndElement();
        writer.WriteEndElement();
    }

    // A table is long: a line a row, and nothing to indent it.
    private static void StartLine(XmlWriter writer) => writer.WriteWhitespace("\n");
}
