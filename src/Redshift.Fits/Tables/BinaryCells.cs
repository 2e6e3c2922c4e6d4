using System.Buffers.Binary;
using System.Globalization;

namespace Redshift.Fits;

/// <summary>Cells of a binary table, in the row itself or in the heap.</summary>
internal sealed class BinaryCells(TableRows rows, BinaryFormat format, int offset, Scaling scaling, FitsLocation where) : ColumnCells
{
    // Rows of a long table are fetched in pieces of about this size.
    private const int PieceLength = 1 << 20;

    // Of longer rows only the number itself is fetched.
    private const int LongRow = 1 << 13;

    private readonly Bitpix _bitpix = format.Type.ToBitpix();

    public override int LengthAt(long row) => Locate(row).Count;

    public override void ReadDoubles(long row, Span<double> into)
    {
        using var cell = ViewCell(row);
        scaling.ToDoubles(_bitpix, cell.Bytes, into);
    }

    public override void ReadIntegers(long row, Span<long> into)
    {
        using var cell = ViewCell(row);
        Exactly.ToIntegers(scaling, _bitpix, cell.Bytes, into, where);
    }

    public override void ReadUnsigned(long row, Span<ulong> into)
    {
        using var cell = ViewCell(row);
        Exactly.ToUnsigned(scaling, _bitpix, cell.Bytes, into, where);
    }

    public override Window ViewCell(long row)
    {
        var (start, count) = Locate(row);
        return rows.Source.View(start, (int)format.Type.BytesOf(count));
    }

    public override void ReadColumn(long firstRow, Span<double> into)
    {
        var most = rows.RowLength > LongRow ? 1 : PieceLength / rows.RowLength;
        for (var done = 0; done < into.Length; done += most)
        {
            var part = into[done..Math.Min(done + most, into.Length)];
            var bytes = checked((part.Length - 1) * rows.RowLength + (int)format.Width);
            using var view = rows.Source.View(rows.OffsetOf(firstRow + done) + offset, bytes);
            Strided.Gather(_bitpix, view.Bytes, rows.RowLength, scaling, part);
        }
    }

    private (long Start, int Count) Locate(long row)
    {
        var start = rows.OffsetOf(row) + offset;
        if (!format.IsVariable) return (start, format.Repeat);
        return format.Repeat == 0 ? (rows.HeapStart, 0) : Follow(start);
    }

    // A descriptor is a count and an offset into the heap (section 7.3.5).
    private (long Start, int Count) Follow(long descriptor)
    {
        using var view = rows.Source.View(descriptor, format.DescriptorBytes);
        var wide = format.DescriptorBytes == 16;
        var count = wide ? BinaryPrimitives.ReadInt64BigEndian(view.Bytes) : BinaryPrimitives.ReadInt32BigEndian(view.Bytes);
        var place = wide ? BinaryPrimitives.ReadInt64BigEndian(view.Bytes[8..]) : BinaryPrimitives.ReadInt32BigEndian(view.Bytes[4..]);
        if (count == 0) return (rows.HeapStart, 0);
        var heap = rows.End - rows.HeapStart;
        if (count < 0 || count > int.MaxValue || place < 0 || place > heap || format.Type.BytesOf(count) > Math.Min(heap - place, int.MaxValue))
            throw OutsideHeap(descriptor, count, place, heap);
        return (rows.HeapStart + place, (int)count);
    }

    private FitsIntegrityException OutsideHeap(long descriptor, long count, long place, long heap) => new(
        where with { Offset = descriptor },
        string.Create(CultureInfo.InvariantCulture, $"an array within the heap of {heap} bytes"),
        string.Create(CultureInfo.InvariantCulture, $"{count} elements at {place}"));
}
