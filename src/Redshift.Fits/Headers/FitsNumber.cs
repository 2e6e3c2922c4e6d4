using System.Buffers;
using System.Buffers.Text;
using System.Globalization;

namespace Redshift.Fits;

/// <summary>Numbers written in characters, in headers (section 4.2) and in ASCII tables (section 7.2).</summary>
internal static class FitsNumber
{
    private const int LongestNumber = 128;

    private static readonly SearchValues<byte> RealCharacters = SearchValues.Create("0123456789+-.eEdD"u8);

    /// <summary>Reads a finite real number; a D exponent counts as an E.</summary>
    public static bool TryDouble(ReadOnlySpan<byte> text, out double number)
    {
        text = text.Trim((byte)' ');
        number = 0;
        return text.Length is > 0 and <= LongestNumber && !text.ContainsAnyExcept(RealCharacters) && TryParse(text, out number);
    }

    /// <summary>Reads an integer that fits 64 bits.</summary>
    public static bool TryInteger(ReadOnlySpan<byte> text, out long integer)
    {
        text = text.Trim((byte)' ');
        if (text.StartsWith("+"u8)) text = text[1..];
        return Utf8Parser.TryParse(text, out integer, out var used) && used == text.Length;
    }

    private static bool TryParse(ReadOnlySpan<byte> text, out double number)
    {
        Span<byte> plain = stackalloc byte[LongestNumber];
        plain = plain[..text.Length];
        text.CopyTo(plain);
        plain.Replace((byte)'D', (byte)'E');
        plain.Replace((byte)'d', (byte)'e');
        return double.TryParse(plain, NumberStyles.Float, CultureInfo.InvariantCulture, out number) && double.IsFinite(number);
    }
}
