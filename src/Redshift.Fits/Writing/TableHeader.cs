namespace Redshift.Fits;

/// <summary>Header and rows of a binary table (section 7.3).</summary>
internal static class TableHeader
{
    public static HeaderBuilder Build(string name, long rows, IReadOnlyList<ColumnDefinition> columns)
    {
        var header = new HeaderBuilder();
        header.Add(Card.Of("XTENSION", "BINTABLE", "binary table"));
        header.Add(Card.Of("BITPIX", 8, "bits of an element"));
        header.Add(Card.Of("NAXIS", 2, "number of axes"));
        header.Add(Card.Of("NAXIS1", RowLength(columns), "bytes of a row"));
        header.Add(Card.Of("NAXIS2", rows, "number of rows"));
        header.Add(Card.Of("PCOUNT", 0, "no heap"));
        header.Add(Card.Of("GCOUNT", 1, "one table"));
        header.Add(Card.Of("TFIELDS", columns.Count, "number of columns"));
        if (name.Length > 0) header.Add(Card.Of("EXTNAME", name, "name of this unit"));
        for (var i = 0; i < columns.Count; i++) AddColumn(header, i + 1, columns[i]);
        return header;
    }

    public static void WriteRows(DataSink sink, long rows, IReadOnlyList<ColumnDefinition> columns)
    {
        var bytes = new byte[RowLength(columns)];
        for (long row = 0; row < rows; row++)
        {
            var at = 0;
            foreach (var column in columns)
            {
                column.Encode(row, bytes.AsSpan(at, column.Width));
                at += column.Width;
            }

            sink.Write(bytes);
        }
    }

    private static int RowLength(IReadOnlyList<ColumnDefinition> columns) => columns.Sum(column => column.Width);

    private static void AddColumn(HeaderBuilder header, int number, ColumnDefinition column)
    {
        header.Add(Card.Of(Keywords.Indexed("TTYPE", number), column.Name));
        header.Add(Card.Of(Keywords.Indexed("TFORM", number), column.Format));
        AddText(header, "TUNIT", number, column.Unit);
        AddText(header, "TUCD", number, column.Ucd);
        AddText(header, "TUTYP", number, column.Utype);
        AddText(header, "TCOMM", number, column.Comment);
        if (column.Null is { } none) header.Add(Card.Of(Keywords.Indexed("TNULL", number), none));
        if (column.Zero is { } zero) header.Add(Card.Of(Keywords.Indexed("TZERO", number), zero));
        if (column.Dimensions is { } axes) AddText(header, "TDIM", number, $"({string.Join(',', axes)})");
    }

    private static void AddText(HeaderBuilder header, string stem, int number, string? text)
    {
        if (!string.IsNullOrEmpty(text)) header.Add(Card.Of(Keywords.Indexed(stem, number), text));
    }
}
