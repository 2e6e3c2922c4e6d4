using System.IO.Compression;

namespace Redshift.Fits;

/// <summary>GZIP_1 and GZIP_2 (section 10.4.2): big-endian elements, for the second with their bytes sorted by significance.</summary>
internal static class Gunzip
{
    /// <summary>Fills the target with what the stream holds and returns how much that was; a stream that holds more is broken.</summary>
    public static int Decode(ReadOnlySpan<byte> compressed, Span<byte> into, FitsLocation where)
    {
        try
        {
            using var stream = new GZipStream(new MemoryStream(compressed.ToArray()), CompressionMode.Decompress);
            var length = stream.ReadAtLeast(into, into.Length, throwOnEndOfStream: false);
            if (length < into.Length || stream.ReadByte() < 0) return length;
        }
        catch (InvalidDataException broken)
        {
            throw new FitsIntegrityException(where, "a sound gzip stream", broken.Message, broken);
        }

        throw new FitsIntegrityException(where, "no more than the pixels of a tile", "more");
    }

    /// <summary>Puts the bytes of each element together again.</summary>
    public static void Unshuffle(ReadOnlySpan<byte> shuffled, int size, Span<byte> into)
    {
        var count = shuffled.Length / size;
        for (var i = 0; i < count; i++)
            for (var place = 0; place < size; place++)
                into[i * size + place] = shuffled[place * count + i];
    }
}
