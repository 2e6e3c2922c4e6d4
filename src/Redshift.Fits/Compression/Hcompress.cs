namespace Redshift.Fits;

/// <summary>
/// HCOMPRESS_1 (section 10.4.4): the Haar-like H-transform of an image, its coefficients divided by a scale and their bit planes
/// coded as quadtrees. Method: White 1992, "High-performance compression of astronomical images".
/// </summary>
internal static class Hcompress
{
    private const int Magic = 0xdd99;

    // Coefficients are 64-bit integers; a sign and the growth of the transform need room.
    private const int MostPlanes = 60;

    /// <summary>Decodes a tile of two axes longer than one, at most.</summary>
    public static void Decode(ReadOnlySpan<byte> compressed, long[] lengths, bool smooth, Span<int> into, FitsLocation where)
    {
        var reader = new BitReader(compressed, where);
        if (reader.Bits(16) != Magic) throw new FitsIntegrityException(where, "an H-compressed tile", "something else");
        var (rows, columns, scale) = (reader.Int32(), reader.Int32(), reader.Int32());
        if (rows <= 0 || columns <= 0 || (long)rows * columns != into.Length)
            throw new FitsIntegrityException(where, $"a tile of {string.Join(" x ", lengths)} pixels", $"one of {columns} x {rows}");
        var coefficients = ReadCoefficients(ref reader, rows, columns, where);
        if (scale > 1)
            foreach (ref var coefficient in coefficients.AsSpan()) coefficient *= scale;
        new HTransform(coefficients, rows, columns, smooth ? scale : 0).Invert();
        for (var i = 0; i < into.Length; i++) into[i] = (int)coefficients[i];
    }

    private static long[] ReadCoefficients(ref BitReader reader, int rows, int columns, FitsLocation where)
    {
        var sum = reader.Int64();
        int[] planes = [reader.Byte(), reader.Byte(), reader.Byte()];
        foreach (var count in planes)
            if (count > MostPlanes) throw new FitsIntegrityException(where, $"at most {MostPlanes} bit planes", $"{count}");
        var coefficients = new long[rows * columns];
        ReadQuadrants(ref reader, coefficients, rows, columns, planes, where);
        ReadSigns(ref reader, coefficients);
        coefficients[0] = sum;
        return coefficients;
    }

    // Sums, differences along the two axes, and their curvature have bit planes of their own.
    private static void ReadQuadrants(
        ref BitReader reader, long[] coefficients, int rows, int columns, int[] planes, FitsLocation where)
    {
        var (upper, left) = ((rows + 1) / 2, (columns + 1) / 2);
        new Quadtree(coefficients, 0, columns, upper, left).Read(ref reader, planes[0], where);
        new Quadtree(coefficients, left, columns, upper, columns / 2).Read(ref reader, planes[1], where);
        new Quadtree(coefficients, columns * upper, columns, rows / 2, left).Read(ref reader, planes[1], where);
        new Quadtree(coefficients, columns * upper + left, columns, rows / 2, columns / 2).Read(ref reader, planes[2], where);
        if (reader.Bits(4) != 0) throw new FitsIntegrityException(where, "zero behind the bit planes", "something else");
        reader.AlignToByte();
    }

    private static void ReadSigns(ref BitReader reader, long[] coefficients)
    {
        foreach (ref var coefficient in coefficients.AsSpan())
            if (coefficient != 0 && reader.Bit() != 0) coefficient = -coefficient;
    }
}
