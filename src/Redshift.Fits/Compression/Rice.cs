namespace Redshift.Fits;

/// <summary>
/// RICE_1 (section 10.4.1): differences of neighbours in blocks, each with its own number of low bits written plainly and
/// the high part in unary.
/// </summary>
internal static class Rice
{
    /// <summary>Decodes integers of 1 (unsigned), 2 or 4 bytes.</summary>
    public static void Decode(ReadOnlySpan<byte> compressed, int bytePix, int blockSize, Span<int> into, FitsLocation where)
    {
        if (into.IsEmpty) return;
        var code = Code.For(bytePix);
        var reader = new BitReader(compressed, where);
        var last = (int)reader.Bits(code.PixelBits);
        for (; !into.IsEmpty; into = into[Math.Min(blockSize, into.Length)..])
            last = DecodeBlock(ref reader, code, into[..Math.Min(blockSize, into.Length)], last);
    }

    private static int DecodeBlock(ref BitReader reader, Code code, Span<int> block, int last)
    {
        var lowBits = (int)reader.Bits(code.SelectorBits) - 1;
        for (var i = 0; i < block.Length; i++)
        {
            var difference = lowBits < 0 ? 0 : ReadDifference(ref reader, code, lowBits);
            last = code.Wrap(last + Unfold(difference));
            block[i] = last;
        }

        return last;
    }

    private static uint ReadDifference(ref BitReader reader, Code code, int lowBits)
    {
        if (lowBits == code.Incompressible) return reader.Bits(code.PixelBits);
        var high = (uint)reader.Zeros();
        return (high << lowBits) | reader.Bits(lowBits);
    }

    // Signed differences are interleaved: 0, -1, 1, -2, ...
    private static int Unfold(uint folded) => (folded & 1) == 0 ? (int)(folded >> 1) : (int)~(folded >> 1);

    /// <summary>The numbers the method uses for a pixel size.</summary>
    private readonly record struct Code(int PixelBits, int SelectorBits, int Incompressible)
    {
        public static Code For(int bytePix) => bytePix switch
        {
            1 => new Code(8, 3, 6),
            2 => new Code(16, 4, 14),
            _ => new Code(32, 5, 25),
        };

        public int Wrap(int value) => PixelBits switch { 8 => (byte)value, 16 => (short)value, _ => value };
    }
}
