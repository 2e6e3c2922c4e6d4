using System.Text;

namespace Redshift.Fits;

/// <summary>Makes a card of its record and the CONTINUE records behind it (section 4.2.1.2).</summary>
internal static class CardReader
{
    public static Card Read(ReadOnlySpan<byte> records)
    {
        var fields = RecordFields.Parse(records[..RecordFields.RecordLength]);
        var keyword = KeywordOf(fields.Keyword);
        return fields.Kind == CardValueKind.Text
            ? ReadText(keyword, fields, records[RecordFields.RecordLength..])
            : new Card(keyword, new CardValue(fields.Kind, Decode(fields.Value)), Decode(fields.Comment));
    }

    /// <summary>The text alone, or null when the value is none: most cards that are read are asked for no more.</summary>
    public static string? ReadText(ReadOnlySpan<byte> records)
    {
        var fields = RecordFields.Parse(records[..RecordFields.RecordLength]);
        if (fields.Kind != CardValueKind.Text) return null;
        return records.Length == RecordFields.RecordLength ? Unquote(fields.Value) : Read(records).Value.AsText();
    }

    private static Card ReadText(string keyword, RecordFields fields, ReadOnlySpan<byte> more)
    {
        var text = new StringBuilder(Unquote(fields.Value));
        var comment = new StringBuilder(Decode(fields.Comment));
        while (!more.IsEmpty && text.Length > 0 && text[^1] == '&')
        {
            var next = RecordFields.ParseContinue(more[..RecordFields.RecordLength]);
            if (next.Kind != CardValueKind.Text) break;
            text.Length--;
            text.Append(Unquote(next.Value));
            Join(comment, Decode(next.Comment));
            more = more[RecordFields.RecordLength..];
        }

        return new Card(keyword, new CardValue(CardValueKind.Text, text.ToString().TrimEnd(' ')), comment.ToString());
    }

    private static void Join(StringBuilder comment, string more)
    {
        if (comment.Length > 0 && more.Length > 0) comment.Append(' ');
        comment.Append(more);
    }

    private static string KeywordOf(ReadOnlySpan<byte> keyword) =>
        string.Join(' ', Decode(keyword).Split(' ', StringSplitOptions.RemoveEmptyEntries));

    // Trailing blanks mean nothing, but those before a '&' belong to the string.
    private static string Unquote(ReadOnlySpan<byte> quoted) =>
        Decode(quoted.TrimEnd((byte)' ')).Replace("''", "'", StringComparison.Ordinal);

    private static string Decode(ReadOnlySpan<byte> text) => Encoding.Latin1.GetString(text);
}
