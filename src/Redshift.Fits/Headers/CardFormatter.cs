using System.Text;

namespace Redshift.Fits;

/// <summary>Writes a card as one or more 80-character records (sections 4.1 and 4.2).</summary>
internal static class CardFormatter
{
    private const int Length = RecordFields.RecordLength;
    private const int FixedValueWidth = 20;
    private const int CommentaryWidth = 72;

    public static IEnumerable<string> Format(Card card) => card.Value.Kind switch
    {
        CardValueKind.None => FormatCommentary(card),
        CardValueKind.Text => FormatText(card),
        _ => [WithComment(Start(card.Keyword) + Ascii(card.Value.Literal).PadLeft(FixedValueWidth), card.Comment)],
    };

    private static IEnumerable<string> FormatCommentary(Card card)
    {
        var text = Ascii(card.Comment);
        var keyword = card.Keyword.ToUpperInvariant().PadRight(RecordFields.KeywordLength);
        for (var at = 0; at == 0 || at < text.Length; at += CommentaryWidth)
            yield return (keyword + text[at..Math.Min(at + CommentaryWidth, text.Length)]).PadRight(Length);
    }

    private static IEnumerable<string> FormatText(Card card)
    {
        var start = Start(card.Keyword);
        var rest = Ascii(card.Value.Literal).Replace("'", "''", StringComparison.Ordinal);
        while (rest.Length > Room(start))
        {
            var cut = Cut(rest, Room(start) - 1);
            yield return $"{start}'{rest[..cut]}&'".PadRight(Length);
            rest = rest[cut..];
            start = "CONTINUE  ";
        }

        yield return WithComment($"{start}'{rest.PadRight(8)}'".PadRight(start.Length + FixedValueWidth), card.Comment);
    }

    private static int Room(string start) => Length - start.Length - 2;

    // A doubled quote must not be torn apart.
    private static int Cut(string text, int most)
    {
        var quotes = 0;
        while (quotes < most && text[most - 1 - quotes] == '\'') quotes++;
        return quotes % 2 == 0 ? most : most - 1;
    }

    private static string Start(string keyword)
    {
        keyword = keyword.ToUpperInvariant();
        if (IsStandard(keyword)) return keyword.PadRight(RecordFields.KeywordLength) + "= ";
        var start = $"HIERARCH {keyword} = ";
        if (keyword.Length == 0 || keyword.Contains('=', StringComparison.Ordinal) || start.Length > Length - FixedValueWidth - 4 || Ascii(keyword) != keyword)
            throw new ArgumentException($"'{keyword}' cannot be the keyword of a header card", nameof(keyword));
        return start;
    }

    private static bool IsStandard(string keyword) =>
        keyword.Length is > 0 and <= RecordFields.KeywordLength && keyword.All(c => c is (>= 'A' and <= 'Z') or (>= '0' and <= '9') or '-' or '_');

    private static string WithComment(string record, string comment)
    {
        if (comment.Length > 0) record += " / " + Ascii(comment);
        return record.Length > Length ? record[..Length] : record.PadRight(Length);
    }

    // Headers are restricted to printable ASCII (section 3.2).
    private static string Ascii(string text)
    {
        if (text.All(c => c is >= ' ' and <= '~')) return text;
        return new StringBuilder(text.Length).AppendJoin("", text.Select(c => c is >= ' ' and <= '~' ? c : '?')).ToString();
    }
}
