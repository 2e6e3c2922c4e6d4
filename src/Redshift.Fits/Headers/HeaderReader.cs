namespace Redshift.Fits;

/// <summary>Finds the END of a header and copies what stands before it.</summary>
internal static class HeaderReader
{
    // Ten times the longest header met in practice.
    private const long LongestHeader = 16L << 20;

    /// <summary>The header that begins at an offset, and the number of blocks' bytes it takes, less if the file ends inside its last block.</summary>
    public static (Header Header, long Length) Read(ByteSource source, FitsLocation where)
    {
        var start = where.Offset ?? 0;
        var records = FindEnd(source, start, where);
        var bytes = new byte[records];
        source.Read(start, bytes);
        return (new Header(bytes), Blocks.RoundUp(records + RecordFields.RecordLength));
    }

    private static int FindEnd(ByteSource source, long start, FitsLocation where)
    {
        for (var at = start; at < source.Length; at += Blocks.Length)
        {
            if (at - start > LongestHeader) throw new FitsUnsupportedException(where, "the header is longer than 16 MiB");
            using var block = source.View(at, (int)Math.Min(Blocks.Length, source.Length - at));
            var end = EndIn(block.Bytes);
            if (end >= 0) return (int)(at - start) + end;
        }

        throw new FitsTruncatedException(where, "an END card", "the end of the file");
    }

    private static int EndIn(ReadOnlySpan<byte> block)
    {
        for (var at = 0; at + RecordFields.RecordLength <= block.Length; at += RecordFields.RecordLength)
            if (block[at..].StartsWith("END     "u8)) return at;
        return -1;
    }
}
