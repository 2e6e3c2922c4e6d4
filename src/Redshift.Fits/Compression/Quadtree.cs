using System.Numerics;

namespace Redshift.Fits;

/// <summary>One quadrant of H-transform coefficients, whose bit planes are coded as quadtrees of four-bit nodes.</summary>
internal readonly ref struct Quadtree(long[] coefficients, int start, int stride, int rows, int columns)
{
    private const int PlainPlane = 0;
    private const int CodedPlane = 0xf;

    /// <summary>Reads the bit planes, the highest first.</summary>
    public void Read(ref BitReader reader, int planes, FitsLocation where)
    {
        if (rows == 0 || columns == 0) planes = Math.Min(planes, 0);
        var nodes = new byte[((rows + 1) / 2 + 1) * ((columns + 1) / 2 + 1)];
        for (var plane = planes - 1; plane >= 0; plane--)
        {
            var how = (int)reader.Bits(4);
            if (how == PlainPlane) ReadPlain(ref reader, nodes);
            else if (how == CodedPlane) nodes = ReadCoded(ref reader, nodes);
            else throw new FitsIntegrityException(where, "a bit plane, plain or coded", $"code {how}");
            Insert(nodes, plane);
        }
    }

    private void ReadPlain(ref BitReader reader, Span<byte> nodes)
    {
        foreach (ref var node in nodes[..((rows + 1) / 2 * ((columns + 1) / 2))]) node = (byte)reader.Bits(4);
    }

    // From the root down: every node that is not zero has up to four children.
    private byte[] ReadCoded(ref BitReader reader, byte[] nodes)
    {
        nodes[0] = ReadNode(ref reader);
        var levels = Levels(Math.Max(rows, columns));
        for (var level = levels - 1; level >= 1; level--)
        {
            var (height, width) = (CeilingShift(rows, level), CeilingShift(columns, level));
            nodes = Split(ref reader, nodes, height, width);
        }

        return nodes;
    }

    private static int Levels(int length) => length <= 1 ? 0 : BitOperations.Log2((uint)length - 1) + 1;

    private static int CeilingShift(int length, int shift) => (int)(((long)length + (1L << shift) - 1) >> shift);

    // The children are stored from the last to the first.
    private static byte[] Split(ref BitReader reader, byte[] parents, int height, int width)
    {
        var children = new byte[Math.Max(parents.Length, height * width)];
        for (var i = height * width - 1; i >= 0; i--)
            if (BitOf(parents, (width + 1) / 2, i / width, i % width) != 0) children[i] = ReadNode(ref reader);
        return children;
    }

    private void Insert(byte[] nodes, int plane)
    {
        var width = (columns + 1) / 2;
        for (var row = 0; row < rows; row++)
            for (var column = 0; column < columns; column++)
                coefficients[start + row * stride + column] |= (long)BitOf(nodes, width, row, column) << plane;
    }

    // A node holds the bits of a 2 x 2 square, row by row, the first one highest.
    private static int BitOf(byte[] nodes, int width, int row, int column) =>
        (nodes[row / 2 * width + column / 2] >> (3 - 2 * (row % 2) - column % 2)) & 1;

    // A fixed Huffman code: 1, 2, 4, 8 have three bits, 3, 5, 10, 12, 15 four, 6, 7, 9, 11, 13 five, 0 and 14 six.
    private static byte ReadNode(ref BitReader reader)
    {
        var code = reader.Bits(3);
        if (code < 4) return (byte)(1 << (int)code);
        code = code << 1 | reader.Bits(1);
        if (code < 13) return FourBits[(int)code - 8];
        code = code << 1 | reader.Bits(1);
        if (code < 31) return FiveBits[(int)code - 26];
        return reader.Bit() == 0 ? (byte)0 : (byte)14;
    }

    private static ReadOnlySpan<byte> FourBits => [3, 5, 10, 12, 15];

    private static ReadOnlySpan<byte> FiveBits => [6, 7, 9, 11, 13];
}
