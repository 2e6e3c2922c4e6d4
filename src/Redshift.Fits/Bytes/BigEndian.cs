using System.Buffers.Binary;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace Redshift.Fits;

/// <summary>Converts stored big-endian elements to numbers of this machine.</summary>
internal static class BigEndian
{
    // Reversed floats wait here, in the first-level cache, to be widened.
    private const int Chunk = 512;

    public static int SizeOf(Bitpix type) => Math.Abs((int)type) / 8;

    /// <summary>Converts as many elements as the target holds; 64-bit integers may be rounded.</summary>
    public static void ToDoubles(Bitpix type, ReadOnlySpan<byte> bytes, Span<double> into)
    {
        if (type == Bitpix.Double) Doubles(bytes, into);
        else if (type == Bitpix.Single) Widen(bytes, into);
        else IntegersAs(type, bytes, into);
    }

    /// <summary>Converts 32-bit floats bit by bit; NaN payloads survive.</summary>
    public static void ToSingles(ReadOnlySpan<byte> bytes, Span<float> into) =>
        BinaryPrimitives.ReverseEndianness(
            MemoryMarshal.Cast<byte, uint>(bytes)[..into.Length], MemoryMarshal.Cast<float, uint>(into));

    /// <summary>Converts integers exactly.</summary>
    public static void ToIntegers(Bitpix type, ReadOnlySpan<byte> bytes, Span<long> into)
    {
        switch (type)
        {
            case Bitpix.Byte:
                for (var i = 0; i < into.Length; i++) into[i] = bytes[i];
                break;
            case Bitpix.Int16:
                for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadInt16BigEndian(bytes[(2 * i)..]);
                break;
            case Bitpix.Int32:
                for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadInt32BigEndian(bytes[(4 * i)..]);
                break;
            case Bitpix.Int64:
                BinaryPrimitives.ReverseEndianness(MemoryMarshal.Cast<byte, long>(bytes)[..into.Length], into);
                break;
            default:
                throw new ArgumentOutOfRangeException(nameof(type), type, "an integer type is expected");
        }
    }

    private static void Doubles(ReadOnlySpan<byte> bytes, Span<double> into) =>
        BinaryPrimitives.ReverseEndianness(
            MemoryMarshal.Cast<byte, ulong>(bytes)[..into.Length], MemoryMarshal.Cast<double, ulong>(into));

    [SkipLocalsInit]
    private static void Widen(ReadOnlySpan<byte> bytes, Span<double> into)
    {
        Span<float> singles = stackalloc float[Chunk];
        while (!into.IsEmpty)
        {
            var count = Math.Min(Chunk, into.Length);
            ToSingles(bytes, singles[..count]);
            Widen(singles[..count], into);
            bytes = bytes[(sizeof(float) * count)..];
            into = into[count..];
        }
    }

    private static void Widen(ReadOnlySpan<float> from, Span<double> into)
    {
        var i = 0;
        for (; i <= from.Length - Vector256<float>.Count; i += Vector256<float>.Count)
        {
            var (lower, upper) = Vector256.Widen(Vector256.Create(from[i..]));
            lower.CopyTo(into[i..]);
            upper.CopyTo(into[(i + Vector256<double>.Count)..]);
        }

        for (; i < from.Length; i++) into[i] = from[i];
    }

    [SkipLocalsInit]
    private static void IntegersAs(Bitpix type, ReadOnlySpan<byte> bytes, Span<double> into)
    {
        Span<long> integers = stackalloc long[Chunk];
        while (!into.IsEmpty)
        {
            var count = Math.Min(Chunk, into.Length);
            ToIntegers(type, bytes, integers[..count]);
            for (var i = 0; i < count; i++) into[i] = integers[i];
            bytes = bytes[(SizeOf(type) * count)..];
            into = into[count..];
        }
    }
}
