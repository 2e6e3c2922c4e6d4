using System.Buffers.Binary;

namespace Redshift.Fits;

/// <summary>PLIO_1 (section 10.4.3): run lengths of a mask, as instructions of 16 bits that move a level and paint with it.</summary>
internal static class Plio
{
    private const int ShortHeader = 3;
    private const int LongHeader = 5;

    public static void Decode(ReadOnlySpan<byte> compressed, Span<int> into, FitsLocation where)
    {
        into.Clear();
        var (first, end) = Instructions(compressed, where);
        var level = 1;
        var at = 0;
        for (var i = first; i < end && at < into.Length; i++)
        {
            var word = Word(compressed, i);
            var data = word & 0xfff;
            switch (word >> 12)
            {
                case 0:
                    at += data;
                    break;
                case 1 when i + 1 < end:
                    level = (Word(compressed, ++i) << 12) + data;
                    break;
                case 2:
                    level += data;
                    break;
                case 3:
                    level -= data;
                    break;
                case 4:
                    Paint(into, ref at, data, level);
                    break;
                case 5:
                    at += Math.Max(0, data - 1);
                    Paint(into, ref at, Math.Min(1, data), level);
                    break;
                case 6:
                    level += data;
                    Paint(into, ref at, 1, level);
                    break;
                case 7:
                    level -= data;
                    Paint(into, ref at, 1, level);
                    break;
                default:
                    throw Broken(where, "an instruction of a pixel list", $"word {word:x4}");
            }
        }
    }

    // Short lists have their length in the third word, long ones theirs in two more and the header's own in the second.
    private static (int First, int End) Instructions(ReadOnlySpan<byte> compressed, FitsLocation where)
    {
        var words = compressed.Length / 2;
        if (words < ShortHeader) throw Broken(where, "a pixel list", $"{words} words");
        var length = (short)Word(compressed, 2);
        if (length > 0) return (ShortHeader, Math.Min(length, words));
        if (words < LongHeader) throw Broken(where, "a long pixel list", $"{words} words");
        return (Word(compressed, 1), Math.Min((Word(compressed, 4) << 15) + Word(compressed, 3), words));
    }

    private static void Paint(Span<int> into, ref int at, int count, int level)
    {
        if (at < into.Length) into.Slice(at, Math.Min(count, into.Length - at)).Fill(level);
        at += count;
    }

    private static int Word(ReadOnlySpan<byte> bytes, int index) => BinaryPrimitives.ReadUInt16BigEndian(bytes[(2 * index)..]);

    private static FitsIntegrityException Broken(FitsLocation where, string expected, string found) => new(where, expected, found);
}
