using System.Globalization;

namespace Redshift.Fits;

/// <summary>Reads the columns of a table from its header.</summary>
internal static class ColumnReader
{
    // Section 7.3.1.
    private const int MostColumns = 999;

    public static IReadOnlyList<TableColumn> ReadAll(TableHdu table)
    {
        if (table.Header.GetLogical("ZTABLE") == true)
            throw new FitsUnsupportedException(table.Layout.Where with { Keyword = "ZTABLE" }, "compressed tables are not read");
        var columns = new TableColumn[table.Header.RequireInteger("TFIELDS", 0, MostColumns, table.Layout.Where)];
        long offset = 0;
        for (var i = 0; i < columns.Length; i++)
            columns[i] = table.IsAscii ? ReadAscii(table, i) : ReadBinary(table, i, ref offset);
        return columns;
    }

    private static TableColumn ReadBinary(TableHdu table, int index, ref long offset)
    {
        var (text, where) = FormatOf(table, index);
        if (!BinaryFormat.TryParse(text, out var format)) throw new FitsHeaderException(where, "a binary table format", $"'{text}'");
        var start = offset;
        offset += format.Width;
        RequireInside(table.Rows, offset, where);
        var scaling = ReadScaling(table.Header, index, table.Header.GetInteger(Keywords.Indexed("TNULL", index + 1)));
        // What is added to a complex number is real: the column adds it to the first of the two parts.
        var cells = new BinaryCells(table.Rows, format, (int)start, format.Type.IsComplex() ? scaling with { Zero = 0 } : scaling, where);
        var shape = new ColumnShape(format.Type, format.Repeat, format.IsVariable, format.SubstringLength);
        return new TableColumn(table, index, shape, cells, scaling);
    }

    private static TableColumn ReadAscii(TableHdu table, int index)
    {
        var (text, where) = FormatOf(table, index);
        if (!AsciiFormat.TryParse(text, out var format)) throw new FitsHeaderException(where, "an ASCII table format", $"'{text}'");
        var start = table.Header.RequireInteger(Keywords.Indexed("TBCOL", index + 1), 1, int.MaxValue, table.Layout.Where) - 1;
        RequireInside(table.Rows, start + format.Width, where);
        var scaling = ReadScaling(table.Header, index, null);
        var nullText = table.Header.GetString(Keywords.Indexed("TNULL", index + 1));
        var cells = new AsciiCells(table.Rows, format, (int)start, scaling, nullText, where);
        return new TableColumn(table, index, new ColumnShape(format.Type, 1, false, 0), cells, scaling);
    }

    private static (string Text, FitsLocation Where) FormatOf(TableHdu table, int index)
    {
        var keyword = Keywords.Indexed("TFORM", index + 1);
        var where = table.Layout.Where with { Keyword = keyword };
        return (table.Header.RequireString(keyword, where), where);
    }

    private static Scaling ReadScaling(Header header, int index, long? none) => new(
        header.GetDouble(Keywords.Indexed("TSCAL", index + 1)) ?? 1,
        header.GetDouble(Keywords.Indexed("TZERO", index + 1)) ?? 0,
        none);

    private static void RequireInside(TableRows rows, long end, FitsLocation where)
    {
        if (end > rows.RowLength)
            throw new FitsHeaderException(
                where,
                string.Create(CultureInfo.InvariantCulture, $"columns within the {rows.RowLength} bytes of a row"),
                string.Create(CultureInfo.InvariantCulture, $"one that ends at {end}"));
    }
}
