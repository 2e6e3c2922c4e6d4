using System.Globalization;

namespace Redshift.Fits;

/// <summary>Makes an image of a table that holds one in compressed tiles (chapter 10).</summary>
internal static class CompressedImage
{
    public static bool Is(HduLayout layout) => layout.Header.GetLogical("ZIMAGE") == true;

    public static ImageHdu Create(HduLayout layout, ByteSource source, FitsReadOptions options)
    {
        var table = new TableHdu(layout, source, isAscii: false);
        var bitpix = HduLayout.ReadBitpix(layout.Header, layout.Where, "ZBITPIX");
        var axes = HduLayout.ReadAxes(layout.Header, layout.Where, "ZNAXIS");
        RequireBounds(axes, bitpix, layout, options);
        return new ImageHdu(layout, source, UncompressedHeader.Of(layout.Header), new TiledPixels(table, bitpix, axes), bitpix, axes);
    }

    private static void RequireBounds(long[] axes, Bitpix bitpix, HduLayout layout, FitsReadOptions options)
    {
        var limit = options.ExpansionLimit(layout.DataLength);
        Int128 bytes = BigEndian.SizeOf(bitpix);
        foreach (var axis in axes)
        {
            bytes *= axis;
            if (bytes > limit)
                throw new FitsUnsupportedException(
                    layout.Where, string.Create(CultureInfo.InvariantCulture, $"the image is larger than the {limit} bytes allowed"));
        }
    }
}
