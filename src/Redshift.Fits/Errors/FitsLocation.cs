using System.Globalization;
using System.Text;

namespace Redshift.Fits;

/// <summary>Where in a file something was found: as much of it as is known.</summary>
/// <param name="File">Name of the file as it was opened.</param>
/// <param name="Hdu">0-based index of the header-data unit; the primary one is 0.</param>
/// <param name="Keyword">Header keyword concerned.</param>
/// <param name="Offset">Byte offset from the start of the (decompressed) file.</param>
public readonly record struct FitsLocation(string File, int? Hdu = null, string? Keyword = null, long? Offset = null)
{
    /// <summary>The location in words, for example <c>night1.fits, HDU 2, keyword NAXIS1, byte 5760</c>.</summary>
    public override string ToString()
    {
        var text = new StringBuilder(File);
        if (Hdu is { } hdu) text.Append(CultureInfo.InvariantCulture, $", HDU {hdu}");
        if (Keyword is { } keyword) text.Append(CultureInfo.InvariantCulture, $", keyword {keyword}");
        if (Offset is { } offset) text.Append(CultureInfo.InvariantCulture, $", byte {offset}");
        return text.ToString();
    }
}
