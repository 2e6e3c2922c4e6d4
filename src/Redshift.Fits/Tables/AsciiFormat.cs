using System.Globalization;

namespace Redshift.Fits;

/// <summary>A TFORMn of an ASCII table: Aw, Iw, Fw.d, Ew.d or Dw.d (section 7.2.1).</summary>
/// <param name="Type">Text, 64-bit integer or double.</param>
/// <param name="Width">Characters of the field.</param>
/// <param name="Decimals">Digits behind a decimal point that is not written.</param>
internal readonly record struct AsciiFormat(ColumnType Type, int Width, int Decimals)
{
    public static bool TryParse(string text, out AsciiFormat format)
    {
        format = default;
        text = text.Trim();
        if (text.Length < 2 || !TryType(text[0], out var type)) return false;
        var point = text.IndexOf('.', StringComparison.Ordinal);
        var decimals = 0;
        if (point > 0 && !TryInteger(text.AsSpan(point + 1), out decimals)) return false;
        if (!TryInteger(point > 0 ? text.AsSpan(1, point - 1) : text.AsSpan(1), out var width) || width == 0) return false;
        format = new AsciiFormat(type, width, decimals);
        return true;
    }

    private static bool TryInteger(ReadOnlySpan<char> digits, out int value) =>
        int.TryParse(digits, NumberStyles.None, CultureInfo.InvariantCulture, out value);

    private static bool TryType(char code, out ColumnType type)
    {
        type = code switch { 'A' => ColumnType.Text, 'I' => ColumnType.Int64, _ => ColumnType.Double };
        return code is 'A' or 'I' or 'F' or 'E' or 'D';
    }
}
