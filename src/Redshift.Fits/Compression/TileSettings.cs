namespace Redshift.Fits;

/// <summary>What the header of a tile-compressed image says (section 10.1).</summary>
internal sealed record TileSettings(
    TileMethod Method, Quantization Quantization, long Seed, int BlockSize, int BytePix, bool Smooth, double? Scale, double? Zero, long? Blank)
{
    // The standard knows 16 and 32.
    private const int LargestBlock = 1024;

    public static TileSettings Read(Header header, FitsLocation where) => new(
        ReadMethod(header, where),
        ReadQuantization(header, where),
        header.GetInteger("ZDITHER0") ?? 1,
        (int)(Parameter(header, "BLOCKSIZE", 1, LargestBlock, where) ?? 32),
        ReadBytePix(header, where),
        Parameter(header, "SMOOTH", long.MinValue, long.MaxValue, where) is not (null or 0),
        header.GetDouble("ZSCALE"),
        header.GetDouble("ZZERO"),
        header.GetInteger("ZBLANK"));

    private static TileMethod ReadMethod(Header header, FitsLocation where)
    {
        var name = header.RequireString("ZCMPTYPE", where with { Keyword = "ZCMPTYPE" });
        return name switch
        {
            "GZIP_1" => TileMethod.Gzip,
            "GZIP_2" => TileMethod.ShuffledGzip,
            "RICE_1" or "RICE_ONE" => TileMethod.Rice,
            "PLIO_1" => TileMethod.Plio,
            "HCOMPRESS_1" => TileMethod.Hcompress,
            "NOCOMPRESS" => TileMethod.None,
            _ => throw new FitsUnsupportedException(where with { Keyword = "ZCMPTYPE" }, $"compression '{name}' is not read"),
        };
    }

    private static Quantization ReadQuantization(Header header, FitsLocation where)
    {
        var name = header.GetString("ZQUANTIZ") ?? "NO_DITHER";
        return name switch
        {
            "SUBTRACTIVE_DITHER_1" => Quantization.SubtractiveDither1,
            "SUBTRACTIVE_DITHER_2" => Quantization.SubtractiveDither2,
            "NO_DITHER" or "NONE" or "" => Quantization.NoDither,
            _ => throw new FitsUnsupportedException(where with { Keyword = "ZQUANTIZ" }, $"quantisation '{name}' is not read"),
        };
    }

    private static int ReadBytePix(Header header, FitsLocation where) => Parameter(header, "BYTEPIX", 1, 8, where) switch
    {
        null or 4 => 4,
        1 => 1,
        2 => 2,
        _ => throw new FitsUnsupportedException(where, "Rice compression is read for pixels of 1, 2 and 4 bytes"),
    };

    // Parameters of a method stand in pairs ZNAMEi, ZVALi.
    private static long? Parameter(Header header, string name, long least, long most, FitsLocation where)
    {
        for (var i = 1; header.GetString(Keywords.Indexed("ZNAME", i)) is { } present; i++)
            if (present == name) return header.RequireInteger(Keywords.Indexed("ZVAL", i), least, most, where);
        return null;
    }
}
