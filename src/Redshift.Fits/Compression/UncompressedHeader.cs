using System.Text;
using System.Text.RegularExpressions;

namespace Redshift.Fits;

/// <summary>The header that a compressed image would have without compression: the table's own cards gone, ZNAXIS1 called NAXIS1 again.</summary>
internal static partial class UncompressedHeader
{
    // The name given to the table when the image had none.
    private const string NoName = "COMPRESSED_IMAGE";

    public static Header Of(Header table)
    {
        var records = new List<byte>();
        foreach (var card in table.Records())
        {
            var keyword = Encoding.Latin1.GetString(card.Span[..RecordFields.KeywordLength]).TrimEnd();
            if (OfTable().IsMatch(keyword) || (keyword == "EXTNAME" && table.GetString("EXTNAME") == NoName)) continue;
            var start = records.Count;
            records.AddRange(card.Span);
            if (OfImage().Match(keyword) is { Success: true } match) Rename(records, start, match.Groups[1].Value);
        }

        return new Header([.. records]);
    }

    private static void Rename(List<byte> records, int start, string keyword)
    {
        keyword = keyword switch { "HECKSUM" => "CHECKSUM", "TENSION" => "XTENSION", _ => keyword };
        for (var i = 0; i < RecordFields.KeywordLength; i++) records[start + i] = (byte)(i < keyword.Length ? keyword[i] : ' ');
    }

    [GeneratedRegex(
        @"^(XTENSION|BITPIX|NAXIS\d*|PCOUNT|GCOUNT|THEAP|TFIELDS|T(FORM|TYPE|UNIT|DIM)\d+|CHECKSUM|DATASUM|ZIMAGE|ZCMPTYPE|Z(TILE|NAME|VAL)\d+|ZQUANTIZ|ZDITHER0|ZMASKCMP|ZSCALE|ZZERO)$")]
    private static partial Regex OfTable();

    [GeneratedRegex(@"^Z(SIMPLE|TENSION|BITPIX|NAXIS\d*|EXTEND|BLOCKED|PCOUNT|GCOUNT|HECKSUM|DATASUM|BLANK)$")]
    private static partial Regex OfImage();
}
