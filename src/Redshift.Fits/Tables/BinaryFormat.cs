using System.Globalization;

namespace Redshift.Fits;

/// <summary>A TFORMn of a binary table: <c>rT</c>, or <c>rPT(max)</c> and <c>rQT(max)</c> for arrays in the heap (section 7.3).</summary>
/// <param name="Type">Element type.</param>
/// <param name="Repeat">Elements of a cell; for arrays in the heap, descriptors of a cell (0 or 1).</param>
/// <param name="DescriptorBytes">0 for a fixed array, 8 for P, 16 for Q.</param>
/// <param name="SubstringLength">Length of each string of a <c>rAw</c> column, or 0.</param>
internal readonly record struct BinaryFormat(ColumnType Type, int Repeat, int DescriptorBytes, int SubstringLength)
{
    public bool IsVariable => DescriptorBytes > 0;

    /// <summary>Bytes the cell takes within its row.</summary>
    public long Width => IsVariable ? (long)Repeat * DescriptorBytes : Type.BytesOf(Repeat);

    public static bool TryParse(string text, out BinaryFormat format)
    {
        format = default;
        text = text.Trim();
        var digits = text.AsSpan().IndexOfAnyExceptInRange('0', '9');
        if (digits < 0) return false;
        var repeat = 1;
        if (digits > 0 && !TryInteger(text.AsSpan(0, digits), out repeat)) return false;
        var code = text.AsSpan(digits);
        return code[0] is 'P' or 'Q' ? TryVariable(code, repeat, out format) : TryFixed(code, repeat, out format);
    }

    private static bool TryFixed(ReadOnlySpan<char> code, int repeat, out BinaryFormat format)
    {
        var known = TryType(code[0], out var type);
        var substring = 0;
        if (type == ColumnType.Text && code.Length > 1) _ = TryInteger(code[1..], out substring);
        format = new BinaryFormat(type, repeat, 0, substring);
        return known;
    }

    private static bool TryVariable(ReadOnlySpan<char> code, int repeat, out BinaryFormat format)
    {
        format = default;
        if (repeat > 1 || code.Length < 2 || !TryType(code[1], out var type)) return false;
        format = new BinaryFormat(type, repeat, code[0] == 'P' ? 8 : 16, 0);
        return true;
    }

    private static bool TryInteger(ReadOnlySpan<char> digits, out int value) =>
        int.TryParse(digits, NumberStyles.None, CultureInfo.InvariantCulture, out value);

    private static bool TryType(char code, out ColumnType type)
    {
        const string Codes = "LXBIJKAEDCM";
        var place = Codes.IndexOf(code, StringComparison.Ordinal);
        type = (ColumnType)Math.Max(0, place);
        return place >= 0;
    }
}
