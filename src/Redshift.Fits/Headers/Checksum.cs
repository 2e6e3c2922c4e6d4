using System.Buffers.Binary;

namespace Redshift.Fits;

/// <summary>The ones'-complement checksum of a header-data unit and its ASCII form (section 4.4.2.7 and appendix J).</summary>
internal static class Checksum
{
    /// <summary>The sum of a unit that carries a right CHECKSUM: all ones, which is minus zero.</summary>
    public const uint Sound = uint.MaxValue;

    /// <summary>Adds bytes to a sum; bytes of an unfinished last word do not count.</summary>
    public static uint Add(uint sum, ReadOnlySpan<byte> bytes)
    {
        ulong total = sum;
        for (; bytes.Length >= 4; bytes = bytes[4..]) total += BinaryPrimitives.ReadUInt32BigEndian(bytes);
        return Fold(total);
    }

    /// <summary>Adds two sums.</summary>
    public static uint Add(uint a, uint b) => Fold((ulong)a + b);

    /// <summary>The 16 characters that, in place of 16 zeros, bring the sum of the unit to minus zero.</summary>
    public static string Encode(uint sum)
    {
        Span<char> characters = stackalloc char[16];
        for (var place = 0; place < 4; place++) EncodeByte((byte)(~sum >> (24 - 8 * place)), place, characters);
        return string.Create(16, characters.ToString(), static (into, from) =>
        {
            // The value starts one byte behind a four-byte boundary of its record.
            for (var i = 0; i < 16; i++) into[(i + 1) % 16] = from[i];
        });
    }

    private static uint Fold(ulong total)
    {
        while (total >> 32 != 0) total = (total & uint.MaxValue) + (total >> 32);
        return (uint)total;
    }

    // A byte becomes four characters whose offsets from '0' add up to it.
    private static void EncodeByte(byte value, int place, Span<char> characters)
    {
        Span<int> parts = [value / 4 + value % 4 + '0', value / 4 + '0', value / 4 + '0', value / 4 + '0'];
        while (AvoidPunctuation(parts))
        {
        }

        for (var j = 0; j < 4; j++) characters[4 * j + place] = (char)parts[j];
    }

    private static bool AvoidPunctuation(Span<int> parts)
    {
        var changed = false;
        for (var j = 0; j < 4; j += 2)
        {
            if (char.IsAsciiLetterOrDigit((char)parts[j]) && char.IsAsciiLetterOrDigit((char)parts[j + 1])) continue;
            parts[j]++;
            parts[j + 1]--;
            changed = true;
        }

        return changed;
    }
}
