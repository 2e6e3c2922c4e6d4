namespace Redshift.Fits;

/// <summary>Where the rows and the heap of a table lie.</summary>
/// <param name="Source">Where the bytes are.</param>
/// <param name="Start">Offset of the first row.</param>
/// <param name="RowLength">Bytes of a row.</param>
/// <param name="Count">Number of rows.</param>
/// <param name="HeapStart">Offset of the heap.</param>
/// <param name="End">Offset behind rows and heap.</param>
/// <param name="Where">The table, for messages.</param>
internal sealed record TableRows(
    ByteSource Source, long Start, int RowLength, long Count, long HeapStart, long End, FitsLocation Where)
{
    public static TableRows Read(HduLayout layout, ByteSource source)
    {
        var where = layout.Where;
        if (layout.Bitpix != Bitpix.Byte)
            throw new FitsHeaderException(where with { Keyword = "BITPIX" }, "8 for a table", layout.Header.Describe("BITPIX"));
        if (layout.Axes is not [var width, var rows])
            throw new FitsHeaderException(where with { Keyword = "NAXIS" }, "2 for a table", layout.Header.Describe("NAXIS"));
        if (width > int.MaxValue) throw new FitsUnsupportedException(where with { Keyword = "NAXIS1" }, "rows longer than 2 GiB are not read");
        var end = layout.DataStart + layout.DataLength;
        var heap = layout.Header.IntegerOr("THEAP", 0, width * rows, where);
        if (heap > layout.DataLength)
            throw new FitsHeaderException(where with { Keyword = "THEAP" }, "an offset within the data", layout.Header.Describe("THEAP"));
        return new TableRows(source, layout.DataStart, (int)width, rows, layout.DataStart + heap, end, where);
    }

    public long OffsetOf(long row) => Start + row * RowLength;
}
