using System.Buffers.Binary;

namespace Redshift.Fits;

/// <summary>Decompresses single tiles to the bytes that the uncompressed image would hold.</summary>
internal sealed class TileDecoder
{
    private const int LargestPixel = 8;

    // Stands for exactly zero in SUBTRACTIVE_DITHER_2 (section 10.2.1).
    private const int QuantizedZero = -2147483646;

    private readonly TileSettings _settings;
    private readonly Bitpix _bitpix;
    private readonly FitsLocation _where;
    private readonly TableColumn? _compressed;
    private readonly TableColumn? _gzipped;
    private readonly TableColumn? _plain;
    private readonly TableColumn? _scale;
    private readonly TableColumn? _zero;
    private readonly TableColumn? _blank;

    public TileDecoder(TableHdu table, Bitpix bitpix)
    {
        _settings = TileSettings.Read(table.Header, table.Layout.Where);
        _bitpix = bitpix;
        _where = table.Layout.Where;
        _compressed = table.Find("COMPRESSED_DATA");
        _gzipped = table.Find("GZIP_COMPRESSED_DATA");
        _plain = table.Find("UNCOMPRESSED_DATA");
        _scale = table.Find("ZSCALE");
        _zero = table.Find("ZZERO");
        _blank = table.Find("ZBLANK");
    }

    private int Size => BigEndian.SizeOf(_bitpix);

    /// <summary>Decodes a tile.</summary>
    /// <param name="tile">Row of the table.</param>
    /// <param name="lengths">Lengths of the tile along the axes.</param>
    /// <param name="into">Pixels of the tile times their size.</param>
    public void Decode(long tile, long[] lengths, Span<byte> into)
    {
        if (Holds(_compressed, tile)) DecodeCompressed(tile, lengths, into);
        else if (Holds(_gzipped, tile)) DecodeGzip(_gzipped!, tile, into);
        else if (Holds(_plain, tile)) DecodePlain(tile, into);
        else throw new FitsIntegrityException(_where, "the data of every tile", $"none for tile {tile + 1}");
    }

    private static bool Holds(TableColumn? column, long tile) => column is not null && column.LengthAt(tile) > 0;

    private void DecodePlain(long tile, Span<byte> into)
    {
        using var cell = _plain!.ViewCell(tile);
        RequireLength(cell.Bytes.Length, into.Length);
        cell.Bytes.CopyTo(into);
    }

    // Floats that would not be quantised are compressed as they are.
    private void DecodeGzip(TableColumn column, long tile, Span<byte> into)
    {
        using var cell = column.ViewCell(tile);
        RequireLength(Gunzip.Decode(cell.Bytes, into, _where), into.Length);
    }

    private void DecodeCompressed(long tile, long[] lengths, Span<byte> into)
    {
        using var cell = _compressed!.ViewCell(tile);
        var count = into.Length / Size;
        if (_settings.Method is TileMethod.Gzip or TileMethod.ShuffledGzip or TileMethod.None)
        {
            DecodeBytes(cell.Bytes, tile, count, into);
            return;
        }

        var integers = new int[count];
        DecodeIntegers(cell.Bytes, lengths, integers);
        Store(integers, tile, into);
    }

    private void DecodeIntegers(ReadOnlySpan<byte> bytes, long[] lengths, Span<int> into)
    {
        switch (_settings.Method)
        {
            case TileMethod.Rice:
                Rice.Decode(bytes, _settings.BytePix, _settings.BlockSize, into, _where);
                break;
            case TileMethod.Plio:
                Plio.Decode(bytes, into, _where);
                break;
            default:
                Hcompress.Decode(bytes, lengths, _settings.Smooth, into, _where);
                break;
        }
    }

    // The stream itself tells the size of its elements: integers may be narrower or wider than the pixels.
    private void DecodeBytes(ReadOnlySpan<byte> bytes, long tile, int count, Span<byte> into)
    {
        var elements = new byte[Math.Min((long)count * LargestPixel, Array.MaxLength)];
        var length = Expand(bytes, elements);
        var size = length / Math.Max(1, count);
        if (size is not (1 or 2 or 4 or 8) || size * count != length) RequireLength(length, into.Length);
        if (_settings.Method == TileMethod.ShuffledGzip) elements = Unshuffled(elements.AsSpan(0, length), size);
        if (size == Size && !IsQuantized(tile)) elements.AsSpan(0, length).CopyTo(into);
        else StoreIntegers(elements.AsSpan(0, length), size, tile, into);
    }

    private int Expand(ReadOnlySpan<byte> bytes, Span<byte> elements)
    {
        if (_settings.Method != TileMethod.None) return Gunzip.Decode(bytes, elements, _where);
        var length = Math.Min(bytes.Length, elements.Length);
        bytes[..length].CopyTo(elements);
        return length;
    }

    private static byte[] Unshuffled(ReadOnlySpan<byte> shuffled, int size)
    {
        var elements = new byte[shuffled.Length];
        Gunzip.Unshuffle(shuffled, size, elements);
        return elements;
    }

    private void StoreIntegers(ReadOnlySpan<byte> elements, int size, long tile, Span<byte> into)
    {
        var wide = new long[elements.Length / size];
        BigEndian.ToIntegers((Bitpix)(8 * size), elements, wide);
        var integers = new int[wide.Length];
        for (var i = 0; i < wide.Length; i++) integers[i] = (int)wide[i];
        Store(integers, tile, into);
    }

    private bool IsQuantized(long tile) => _bitpix < 0 && (_settings.Scale is not null || Holds(_scale, tile));

    private void Store(ReadOnlySpan<int> integers, long tile, Span<byte> into)
    {
        if (_bitpix < 0) Dequantize(integers, tile, into);
        else StorePixels(integers, into);
    }

    private void StorePixels(ReadOnlySpan<int> integers, Span<byte> into)
    {
        for (var i = 0; i < integers.Length; i++) StorePixel(integers[i], into[(i * Size)..]);
    }

    private void StorePixel(int value, Span<byte> into)
    {
        switch (_bitpix)
        {
            case Bitpix.Byte:
                into[0] = (byte)value;
                break;
            case Bitpix.Int16:
                BinaryPrimitives.WriteInt16BigEndian(into, (short)value);
                break;
            case Bitpix.Int32:
                BinaryPrimitives.WriteInt32BigEndian(into, value);
                break;
            default:
                BinaryPrimitives.WriteInt64BigEndian(into, value);
                break;
        }
    }

    private void Dequantize(ReadOnlySpan<int> integers, long tile, Span<byte> into)
    {
        var scale = ValueOf(_scale, tile) ?? _settings.Scale ?? 1;
        var zero = ValueOf(_zero, tile) ?? _settings.Zero ?? 0;
        var blank = ValueOf(_blank, tile) ?? _settings.Blank;
        var walk = Dither.Start(tile, _settings.Seed);
        for (var i = 0; i < integers.Length; i++)
        {
            var shift = _settings.Quantization == Quantization.NoDither ? 0 : 0.5 - Dither.Take(ref walk);
            StoreFloat(Physical(integers[i], shift, scale, zero, blank), into[(i * Size)..]);
        }
    }

    private double Physical(int stored, double shift, double scale, double zero, double? blank)
    {
        if (stored == blank) return double.NaN;
        if (stored == QuantizedZero && _settings.Quantization == Quantization.SubtractiveDither2) return 0;
        return (stored + shift) * scale + zero;
    }

    private void StoreFloat(double value, Span<byte> into)
    {
        if (_bitpix == Bitpix.Single) BinaryPrimitives.WriteSingleBigEndian(into, (float)value);
        else BinaryPrimitives.WriteDoubleBigEndian(into, value);
    }

    private static double? ValueOf(TableColumn? column, long tile) => column?.ReadDoubles(tile) is [var value, ..] ? value : null;

    private void RequireLength(int found, int expected)
    {
        if (found != expected) throw new FitsIntegrityException(_where, $"{expected} bytes of pixels in a tile", $"{found}");
    }
}
