namespace Redshift.Fits;

/// <summary>
/// An array cut into tiles, the first axis fastest for both. Tiles that share their place on the slowest axis together
/// are one contiguous run of pixels, a slab.
/// </summary>
internal sealed class TileGrid
{
    private readonly long[] _axes;
    private readonly long[] _tile;
    private readonly long[] _tiles;

    public TileGrid(long[] axes, long[] tile)
    {
        // Trailing axes of length one do not make slabs.
        var rank = axes.Length;
        while (rank > 1 && axes[rank - 1] == 1) rank--;
        _axes = axes[..rank];
        _tile = [.. tile.Take(rank).Select((length, i) => Math.Min(length, axes[i]))];
        _tiles = [.. _axes.Select((length, i) => (length - 1) / _tile[i] + 1)];
        PixelsPerLayer = Product(_axes[..^1]);
        TilesPerSlab = Product(_tiles[..^1]);
    }

    /// <summary>Pixels of one step of the slowest axis.</summary>
    private long PixelsPerLayer { get; }

    public long TilesPerSlab { get; }

    public long TileCount => TilesPerSlab * _tiles[^1];

    /// <summary>Pixels of every slab but the last, which may have fewer.</summary>
    public long PixelsPerSlab => PixelsPerLayer * _tile[^1];

    public long PixelsOfSlab(long slab) => PixelsPerLayer * Math.Min(_tile[^1], _axes[^1] - slab * _tile[^1]);

    /// <summary>Place of a tile's first pixel in its slab, and the tile's lengths along the axes, cut at the array's edges.</summary>
    public (long Start, long[] Lengths) Place(long slab, long tileOfSlab)
    {
        var lengths = new long[_axes.Length];
        long start = 0, step = 1;
        for (var axis = 0; axis < _axes.Length - 1; axis++)
        {
            var at = tileOfSlab % _tiles[axis] * _tile[axis];
            tileOfSlab /= _tiles[axis];
            lengths[axis] = Math.Min(_tile[axis], _axes[axis] - at);
            start += at * step;
            step *= _axes[axis];
        }

        lengths[^1] = Math.Min(_tile[^1], _axes[^1] - slab * _tile[^1]);
        return (start, lengths);
    }

    /// <summary>Copies the pixels of a tile to their places in its slab.</summary>
    public void Copy(ReadOnlySpan<byte> tile, long start, long[] lengths, int pixelSize, Span<byte> slab)
    {
        var run = (int)lengths[0] * pixelSize;
        var at = new long[lengths.Length];
        for (; !tile.IsEmpty; tile = tile[run..])
        {
            tile[..run].CopyTo(slab[((int)OffsetOf(start, at) * pixelSize)..]);
            Advance(at, lengths);
        }
    }

    private static long Product(long[] lengths) => lengths.Aggregate(1L, (product, length) => product * length);

    private long OffsetOf(long start, long[] at)
    {
        long step = 1;
        for (var axis = 1; axis < at.Length; axis++)
        {
            step *= _axes[axis - 1];
            start += at[axis] * step;
        }

        return start;
    }

    private static void Advance(long[] at, long[] lengths)
    {
        for (var axis = 1; axis < at.Length; axis++)
        {
            if (++at[axis] < lengths[axis]) return;
            at[axis] = 0;
        }
    }
}
