using System.Buffers.Binary;
using System.Collections;
using System.Text;

namespace Redshift.Fits;

/// <summary>
/// The cards of one header, in order, without END. Keywords are found whatever their case; of several cards with one keyword
/// the first wins. It stays readable after the file is disposed.
/// </summary>
public sealed class Header : IReadOnlyList<Card>
{
    // Keys are scattered by a factor nobody can foresee, so that no header can make the index slow.
    private static readonly ulong Scatter = (ulong)Random.Shared.NextInt64() | 1;

    private readonly byte[] _records;
    private readonly int[] _starts;
    private readonly Dictionary<ulong, int> _index;
    private Dictionary<string, int>? _longIndex;

    internal Header(byte[] records)
    {
        _records = records;
        _starts = new int[CountCards(records)];
        _index = new Dictionary<ulong, int>(_starts.Length);
        IndexCards();
    }

    /// <summary>A header that no file holds, with these cards.</summary>
    public static Header Of(IEnumerable<Card> cards) => new(Encoding.ASCII.GetBytes(string.Concat(cards.SelectMany(CardFormatter.Format))));

    /// <summary>Number of cards; a continued string counts as one.</summary>
    public int Count => _starts.Length;

    /// <summary>The card at a place, from 0.</summary>
    public Card this[int index] => CardReader.Read(RecordsOf(index));

    /// <summary>Whether a card with this keyword is there.</summary>
    public bool Contains(string keyword) => IndexOf(keyword) >= 0;

    /// <summary>The first card with this keyword, or null. HIERARCH keywords are found with and without that word.</summary>
    public Card? Find(string keyword) => IndexOf(keyword) is >= 0 and var index ? this[index] : null;

    /// <summary>The string of a card, or null when it is absent or holds no string.</summary>
    public string? GetString(string keyword) => IndexOf(keyword) is >= 0 and var index ? CardReader.ReadText(RecordsOf(index)) : null;

    /// <summary>The number of a card, also one in quotes or with a D exponent, or null when it is absent or holds no number.</summary>
    public double? GetDouble(string keyword)
    {
        if (IndexOf(keyword) is not (>= 0 and var index)) return null;
        var fields = RecordFields.Parse(FirstRecordOf(index));
        var mayBeNumber = fields.Kind is CardValueKind.Integer or CardValueKind.Real or CardValueKind.Text;
        return mayBeNumber && FitsNumber.TryDouble(fields.Value, out var number) ? number : null;
    }

    /// <summary>The integer of a card, or null when it is absent or holds no integer that fits 64 bits.</summary>
    public long? GetInteger(string keyword)
    {
        if (IndexOf(keyword) is not (>= 0 and var index)) return null;
        var fields = RecordFields.Parse(FirstRecordOf(index));
        return fields.Kind == CardValueKind.Integer && FitsNumber.TryInteger(fields.Value, out var integer) ? integer : null;
    }

    /// <summary>The logical value of a card, or null when it is absent or holds none.</summary>
    public bool? GetLogical(string keyword)
    {
        if (IndexOf(keyword) is not (>= 0 and var index)) return null;
        var fields = RecordFields.Parse(FirstRecordOf(index));
        return fields.Kind == CardValueKind.Logical ? fields.Value[0] == (byte)'T' : null;
    }

    /// <inheritdoc/>
    public IEnumerator<Card> GetEnumerator()
    {
        for (var i = 0; i < Count; i++) yield return this[i];
    }

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();

    /// <summary>The records of each card, as they stand.</summary>
    internal IEnumerable<ReadOnlyMemory<byte>> Records()
    {
        for (var i = 0; i < Count; i++) yield return _records.AsMemory(RangeOf(i));
    }

    private Range RangeOf(int index) => _starts[index]..(index + 1 < _starts.Length ? _starts[index + 1] : _records.Length);

    private ReadOnlySpan<byte> RecordsOf(int index) => _records.AsSpan(RangeOf(index));

    private ReadOnlySpan<byte> FirstRecordOf(int index) => _records.AsSpan(_starts[index], RecordFields.RecordLength);

    private static int CountCards(ReadOnlySpan<byte> records)
    {
        var count = 0;
        for (var at = 0; at < records.Length; at += RecordFields.RecordLength)
            if (StartsCard(records, at)) count++;
        return count;
    }

    private static bool StartsCard(ReadOnlySpan<byte> records, int at) => at == 0 || !RecordFields.IsContinue(records[at..]);

    private void IndexCards()
    {
        var card = 0;
        for (var at = 0; at < _records.Length; at += RecordFields.RecordLength)
        {
            if (!StartsCard(_records, at)) continue;
            _index.TryAdd(Pack(_records.AsSpan(at, RecordFields.KeywordLength)), card);
            _starts[card++] = at;
        }
    }

    private int IndexOf(string keyword)
    {
        ArgumentNullException.ThrowIfNull(keyword);
        if (keyword.Length <= RecordFields.KeywordLength && _index.TryGetValue(Pack(keyword), out var index)) return index;
        return _index.ContainsKey(Pack("HIERARCH"u8)) ? IndexOfLong(keyword) : -1;
    }

    private int IndexOfLong(string keyword)
    {
        var index = _longIndex ??= IndexLongKeywords();
        const string Prefix = "HIERARCH ";
        var words = keyword.StartsWith(Prefix, StringComparison.OrdinalIgnoreCase) ? keyword[Prefix.Length..] : keyword;
        return index.TryGetValue(words, out var found) ? found : -1;
    }

    private Dictionary<string, int> IndexLongKeywords()
    {
        var index = new Dictionary<string, int>(StringComparer.OrdinalIgnoreCase);
        for (var i = 0; i < Count; i++)
            if (RecordFields.IsHierarch(FirstRecordOf(i))) index.TryAdd(this[i].Keyword, i);
        return index;
    }

    private static ulong Pack(string keyword)
    {
        Span<byte> bytes = stackalloc byte[RecordFields.KeywordLength];
        bytes.Fill((byte)' ');
        Encoding.ASCII.GetBytes(keyword, bytes);
        return Pack(bytes);
    }

    private static ulong Pack(ReadOnlySpan<byte> keyword)
    {
        var packed = BinaryPrimitives.ReadUInt64BigEndian(keyword);
        return Scatter * (MayHoldLowerCase(packed) ? PackLowerCase(keyword) : packed);
    }

    // Lower-case letters are among the characters with both of the bits 0x60; upper-case ones have 0x40 alone.
    private static bool MayHoldLowerCase(ulong packed) => (packed & (packed << 1) & 0x4040404040404040) != 0;

    private static ulong PackLowerCase(ReadOnlySpan<byte> keyword)
    {
        Span<byte> upper = stackalloc byte[RecordFields.KeywordLength];
        keyword.CopyTo(upper);
        Ascii.ToUpperInPlace(upper, out _);
        return BinaryPrimitives.ReadUInt64BigEndian(upper);
    }
}
