namespace Redshift.Fits;

/// <summary>
/// One 80-character record taken apart: keyword, value and comment as views of its bytes (section 4.1). A text value is
/// what stands between the quotes, doubled quotes not yet undone.
/// </summary>
internal readonly ref struct RecordFields
{
    public const int RecordLength = 80;
    public const int KeywordLength = 8;
    private const int ValueStart = 10;

    private RecordFields(ReadOnlySpan<byte> keyword, CardValueKind kind, ReadOnlySpan<byte> value, ReadOnlySpan<byte> comment)
    {
        Keyword = keyword;
        Kind = kind;
        Value = value;
        Comment = comment;
    }

    public ReadOnlySpan<byte> Keyword { get; }

    public CardValueKind Kind { get; }

    public ReadOnlySpan<byte> Value { get; }

    public ReadOnlySpan<byte> Comment { get; }

    public static bool IsHierarch(ReadOnlySpan<byte> record) => record.StartsWith("HIERARCH "u8);

    public static bool IsContinue(ReadOnlySpan<byte> record) => record.StartsWith("CONTINUE"u8);

    public static RecordFields Parse(ReadOnlySpan<byte> record)
    {
        if (IsHierarch(record)) return ParseHierarch(record);
        var keyword = record[..KeywordLength].TrimEnd((byte)' ');
        return record[KeywordLength..].StartsWith("= "u8) && !IsCommentary(keyword)
            ? ParseValue(keyword, record[ValueStart..])
            : Commentary(keyword, record[KeywordLength..]);
    }

    /// <summary>The string and comment of a CONTINUE record; its kind is not text when it carries none.</summary>
    public static RecordFields ParseContinue(ReadOnlySpan<byte> record) => ParseValue("CONTINUE"u8, record[KeywordLength..]);

    // HIERARCH a b c = value: the ESO convention, registered with the FITS standard.
    private static RecordFields ParseHierarch(ReadOnlySpan<byte> record)
    {
        var equals = record.IndexOf((byte)'=');
        if (equals < 0) return Commentary(record[..KeywordLength], record[KeywordLength..]);
        return ParseValue(record["HIERARCH ".Length..equals].Trim((byte)' '), record[(equals + 1)..]);
    }

    private static bool IsCommentary(ReadOnlySpan<byte> keyword) =>
        keyword.IsEmpty || keyword.SequenceEqual("COMMENT"u8) || keyword.SequenceEqual("HISTORY"u8);

    private static RecordFields Commentary(ReadOnlySpan<byte> keyword, ReadOnlySpan<byte> text) =>
        new(keyword, CardValueKind.None, default, text.TrimEnd((byte)' '));

    private static RecordFields ParseValue(ReadOnlySpan<byte> keyword, ReadOnlySpan<byte> field)
    {
        field = field.TrimStart((byte)' ');
        if (field.StartsWith("'"u8)) return ParseText(keyword, field[1..]);
        var slash = field.IndexOf((byte)'/');
        var value = (slash < 0 ? field : field[..slash]).TrimEnd((byte)' ');
        return new(keyword, Classify(value), value, slash < 0 ? default : field[(slash + 1)..].Trim((byte)' '));
    }

    // A string without its closing quote is read to the end of the record.
    private static RecordFields ParseText(ReadOnlySpan<byte> keyword, ReadOnlySpan<byte> field)
    {
        var end = ClosingQuote(field);
        if (end < 0) return new(keyword, CardValueKind.Text, field.TrimEnd((byte)' '), default);
        var rest = field[(end + 1)..].TrimStart((byte)' ');
        var comment = rest.StartsWith("/"u8) ? rest[1..].Trim((byte)' ') : default;
        return new(keyword, CardValueKind.Text, field[..end], comment);
    }

    private static int ClosingQuote(ReadOnlySpan<byte> field)
    {
        for (var i = 0; i < field.Length; i++)
        {
            if (field[i] != (byte)'\'') continue;
            if (i + 1 >= field.Length || field[i + 1] != (byte)'\'') return i;
            i++;
        }

        return -1;
    }

    private static CardValueKind Classify(ReadOnlySpan<byte> value)
    {
        if (value.IsEmpty) return CardValueKind.Undefined;
        if (value.SequenceEqual("T"u8) || value.SequenceEqual("F"u8)) return CardValueKind.Logical;
        if (FitsNumber.TryInteger(value, out _)) return CardValueKind.Integer;
        if (FitsNumber.TryDouble(value, out _)) return CardValueKind.Real;
        return IsComplex(value) ? CardValueKind.Complex : CardValueKind.Malformed;
    }

    private static bool IsComplex(ReadOnlySpan<byte> value)
    {
        if (!value.StartsWith("("u8) || !value.EndsWith(")"u8)) return false;
        var comma = value.IndexOf((byte)',');
        return comma > 0 && FitsNumber.TryDouble(value[1..comma], out _) && FitsNumber.TryDouble(value[(comma + 1)..^1], out _);
    }
}
