using System.Globalization;
using System.Text;

namespace Redshift.Fits;

/// <summary>Lays the cards of a unit out as header blocks.</summary>
internal sealed class HeaderBuilder
{
    // Not needed since version 4.0 of the standard, but older readers look for it.
    private static readonly Card LongStrings = Card.Of("LONGSTRN", "OGIP 1.0", "long strings are continued");

    private readonly List<Card> _cards = [];

    public void Add(Card card) => _cards.Add(card);

    /// <summary>The header, without checksums.</summary>
    public byte[] ToBytes() => ToBytes(_cards);

    /// <summary>The header with DATASUM and CHECKSUM of itself and the data.</summary>
    public byte[] ToBytes(uint dataSum)
    {
        var open = WithSums(dataSum, new string('0', 16));
        var sum = Checksum.Add(dataSum, Checksum.Add(0, ToBytes(open)));
        return ToBytes(WithSums(dataSum, Checksum.Encode(sum)));
    }

    private IEnumerable<Card> WithSums(uint dataSum, string checksum) =>
    [
        .. _cards,
        Card.Of("DATASUM", dataSum.ToString(CultureInfo.InvariantCulture), "sum of the data unit"),
        Card.Of("CHECKSUM", checksum, "brings the sum of the HDU to all ones"),
    ];

    private static byte[] ToBytes(IEnumerable<Card> cards)
    {
        var records = cards.SelectMany(CardFormatter.Format).ToList();
        if (records.Exists(IsContinuation)) records.AddRange(CardFormatter.Format(LongStrings));
        var text = string.Concat(records) + "END";
        return Encoding.ASCII.GetBytes(text.PadRight((int)Blocks.RoundUp(text.Length)));
    }

    private static bool IsContinuation(string record) => record.StartsWith("CONTINUE", StringComparison.Ordinal);
}
