namespace Redshift.Fits;

/// <summary>The mandatory cards of an array (sections 4.4.1 and 7.1).</summary>
internal static class ImageHeader
{
    public static HeaderBuilder Build(string name, Bitpix bitpix, ReadOnlySpan<long> shape, bool isPrimary)
    {
        var header = new HeaderBuilder();
        header.Add(isPrimary ? Card.Of("SIMPLE", true, "conforms to FITS standard 4.0") : Card.Of("XTENSION", "IMAGE", "image extension"));
        header.Add(Card.Of("BITPIX", (int)bitpix, "bits of an element"));
        header.Add(Card.Of("NAXIS", shape.Length, "number of axes"));
        for (var i = 0; i < shape.Length; i++) header.Add(Card.Of(Keywords.Indexed("NAXIS", i + 1), shape[i], "length of the axis"));
        if (isPrimary)
        {
            header.Add(Card.Of("EXTEND", true, "extensions may follow"));
        }
        else
        {
            header.Add(Card.Of("PCOUNT", 0, "no parameters"));
            header.Add(Card.Of("GCOUNT", 1, "one array"));
        }

        if (name.Length > 0) header.Add(Card.Of("EXTNAME", name, "name of this unit"));
        return header;
    }
}
