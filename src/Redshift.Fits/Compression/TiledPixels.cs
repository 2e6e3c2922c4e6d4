namespace Redshift.Fits;

/// <summary>
/// The pixels of a tile-compressed image as if they lay in a file uncompressed. The slab read last is kept, since neighbours
/// are usually wanted next.
/// </summary>
internal sealed class TiledPixels(TableHdu table, Bitpix bitpix, long[] axes) : ByteSource(table.File.Name)
{
    private readonly int _size = BigEndian.SizeOf(bitpix);
    private readonly Lazy<(TileGrid Grid, TileDecoder Decoder)> _tiles =
        new(() => ReadTiles(table, bitpix, axes), LazyThreadSafetyMode.PublicationOnly);

    private volatile Slab? _last;

    public override long Length => HduLayout.Elements(axes) * _size;

    public override void Read(long offset, Span<byte> into)
    {
        var slabLength = _tiles.Value.Grid.PixelsPerSlab * _size;
        while (!into.IsEmpty)
        {
            var slab = SlabAt(offset / slabLength);
            var rest = slab.Bytes.AsSpan((int)(offset % slabLength));
            var count = Math.Min(rest.Length, into.Length);
            rest[..count].CopyTo(into);
            into = into[count..];
            offset += count;
        }
    }

    // The file itself belongs to somebody else.
    public override void Dispose()
    {
    }

    private static (TileGrid Grid, TileDecoder Decoder) ReadTiles(TableHdu table, Bitpix bitpix, long[] axes)
    {
        var where = table.Layout.Where;
        var grid = new TileGrid(axes, [.. axes.Select((length, axis) => TileLength(table.Header, axis, length, where))]);
        if (grid.TileCount != table.RowCount)
            throw new FitsHeaderException(where with { Keyword = "NAXIS2" }, $"a row for each of {grid.TileCount} tiles", $"{table.RowCount}");
        if (grid.PixelsPerSlab * BigEndian.SizeOf(bitpix) > Array.MaxLength)
            throw new FitsUnsupportedException(where, "tiles beyond 2 GiB are not read");
        return (grid, new TileDecoder(table, bitpix));
    }

    // By default a tile is a row of the image.
    private static long TileLength(Header header, int axis, long length, FitsLocation where)
    {
        var keyword = Keywords.Indexed("ZTILE", axis + 1);
        if (!header.Contains(keyword)) return axis == 0 ? length : 1;
        return header.RequireInteger(keyword, 1, long.MaxValue, where);
    }

    private Slab SlabAt(long index)
    {
        var slab = _last;
        if (slab is null || slab.Index != index) _last = slab = Decode(index);
        return slab;
    }

    private Slab Decode(long index)
    {
        var (grid, decoder) = _tiles.Value;
        var bytes = new byte[grid.PixelsOfSlab(index) * _size];
        for (long tile = 0; tile < grid.TilesPerSlab; tile++)
        {
            var (start, lengths) = grid.Place(index, tile);
            var pixels = new byte[HduLayout.Elements(lengths) * _size];
            decoder.Decode(index * grid.TilesPerSlab + tile, lengths, pixels);
            grid.Copy(pixels, start, lengths, _size, bytes);
        }

        return new Slab(index, bytes);
    }

    private sealed record Slab(long Index, byte[] Bytes);
}
