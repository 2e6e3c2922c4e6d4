namespace Redshift.Fits;

/// <summary>Says of which kind a unit is.</summary>
internal static class HduFactory
{
    public static Hdu Create(HduLayout layout, ByteSource source, FitsReadOptions options)
    {
        if (layout.Where.Hdu == 0) return CreatePrimary(layout, source);
        var type = layout.Header.RequireString("XTENSION", layout.Where);
        return type switch
        {
            // IUEIMAGE is the name under which IMAGE was first used.
            "IMAGE" or "IUEIMAGE" => new ImageHdu(layout, source),
            "BINTABLE" when CompressedImage.Is(layout) => CompressedImage.Create(layout, source, options),
            "BINTABLE" or "A3DTABLE" => new TableHdu(layout, source, isAscii: false),
            "TABLE" => new TableHdu(layout, source, isAscii: true),
            _ => new OtherHdu(layout, source, type),
        };
    }

    private static ImageHdu CreatePrimary(HduLayout layout, ByteSource source)
    {
        if (layout.Header.GetLogical("SIMPLE") != true)
            throw new FitsUnsupportedException(layout.Where with { Keyword = "SIMPLE" }, "the file says that it does not follow the standard");
        if (layout.Header.GetLogical("GROUPS") == true && layout.Axes is [0, ..])
            throw new FitsUnsupportedException(layout.Where with { Keyword = "GROUPS" }, "random groups are not read");
        return new ImageHdu(layout, source);
    }
}
