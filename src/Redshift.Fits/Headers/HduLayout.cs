namespace Redshift.Fits;

/// <summary>Size and place of a data unit, from the mandatory keywords (sections 4.4.1 and 7).</summary>
/// <param name="Header">The header that says so.</param>
/// <param name="Bitpix">Element type.</param>
/// <param name="Axes">Axis lengths, NAXIS1 first.</param>
/// <param name="DataStart">Offset of the first data byte.</param>
/// <param name="DataLength">Bytes of data without padding.</param>
/// <param name="Where">The unit, for messages.</param>
internal sealed record HduLayout(Header Header, Bitpix Bitpix, long[] Axes, long DataStart, long DataLength, FitsLocation Where)
{
    // Section 4.4.1.1.
    private const int MostAxes = 999;

    /// <summary>Offset behind the data and their padding.</summary>
    public long End => DataStart + Blocks.RoundUp(DataLength);

    public static HduLayout Read(ByteSource source, FitsLocation where)
    {
        var (header, length) = HeaderReader.Read(source, where);
        var bitpix = ReadBitpix(header, where);
        var axes = ReadAxes(header, where);
        var start = where.Offset.GetValueOrDefault() + length;
        return new HduLayout(header, bitpix, axes, start, ReadDataLength(header, bitpix, axes, start, where), where);
    }

    /// <summary>Number of elements of an array with these axes; zero without axes.</summary>
    public static long Elements(ReadOnlySpan<long> axes)
    {
        if (axes.IsEmpty) return 0;
        long product = 1;
        foreach (var axis in axes) product = checked(product * axis);
        return product;
    }

    internal static Bitpix ReadBitpix(Header header, FitsLocation where, string keyword = "BITPIX")
    {
        var value = header.RequireInteger(keyword, -64, 64, where);
        return value is 8 or 16 or 32 or 64 or -32 or -64
            ? (Bitpix)value
            : throw new FitsHeaderException(where with { Keyword = keyword }, "8, 16, 32, 64, -32 or -64", header.Describe(keyword));
    }

    internal static long[] ReadAxes(Header header, FitsLocation where, string stem = "NAXIS")
    {
        var axes = new long[header.RequireInteger(stem, 0, MostAxes, where)];
        for (var i = 0; i < axes.Length; i++)
            axes[i] = header.RequireInteger(Keywords.Indexed(stem, i + 1), 0, long.MaxValue, where);
        return axes;
    }

    private static long ReadDataLength(Header header, Bitpix bitpix, long[] axes, long start, FitsLocation where)
    {
        // In a primary header the two would speak of random groups, which are refused.
        var isExtension = where.Hdu > 0;
        var parameters = isExtension ? header.IntegerOr("PCOUNT", 0, 0, where) : 0;
        var groups = isExtension ? header.IntegerOr("GCOUNT", 0, 1, where) : 1;
        try
        {
            var bytes = checked(Math.Abs((long)bitpix) / 8 * groups * (parameters + Elements(axes)));
            _ = checked(start + Blocks.RoundUp(bytes));
            return bytes;
        }
        catch (OverflowException)
        {
            throw new FitsHeaderException(where with { Keyword = "NAXIS" }, "axes whose data a file can hold", "a product beyond 64 bits");
        }
    }
}
