using System.Buffers.Binary;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace Redshift.Fits;

/// <summary>Converts numbers of this machine to stored big-endian elements.</summary>
internal static class HostOrder
{
    public static int SizeOf<T>()
        where T : unmanaged => Unsafe.SizeOf<T>();

    public static void Encode<T>(ReadOnlySpan<T> values, Span<byte> into)
        where T : unmanaged
    {
        switch (SizeOf<T>())
        {
            case 1:
                MemoryMarshal.AsBytes(values).CopyTo(into);
                break;
            case 2:
                BinaryPrimitives.ReverseEndianness(MemoryMarshal.Cast<T, ushort>(values), MemoryMarshal.Cast<byte, ushort>(into));
                break;
            case 4:
                BinaryPrimitives.ReverseEndianness(MemoryMarshal.Cast<T, uint>(values), MemoryMarshal.Cast<byte, uint>(into));
                break;
            default:
                BinaryPrimitives.ReverseEndianness(MemoryMarshal.Cast<T, ulong>(values), MemoryMarshal.Cast<byte, ulong>(into));
                break;
        }
    }
}
