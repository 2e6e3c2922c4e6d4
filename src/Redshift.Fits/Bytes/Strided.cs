using System.Buffers.Binary;

namespace Redshift.Fits;

/// <summary>Picks one number out of each row.</summary>
internal static class Strided
{
    /// <summary>The number at the start of each row of <paramref name="stride"/> bytes, scaled.</summary>
    public static void Gather(Bitpix type, ReadOnlySpan<byte> bytes, int stride, Scaling scaling, Span<double> into)
    {
        if (scaling.IsLinear(type))
        {
            Gather(type, bytes, stride, into);
            scaling.Apply(into);
        }
        else
        {
            for (var i = 0; i < into.Length; i++) scaling.ToDoubles(type, bytes[(i * stride)..], into.Slice(i, 1));
        }
    }

    // One loop for each type: a test inside would cost as much as the reading.
    private static void Gather(Bitpix type, ReadOnlySpan<byte> bytes, int stride, Span<double> into)
    {
        switch (type)
        {
            case Bitpix.Byte:
                for (var i = 0; i < into.Length; i++) into[i] = bytes[i * stride];
                break;
            case Bitpix.Int16:
                for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadInt16BigEndian(bytes[(i * stride)..]);
                break;
            case Bitpix.Int32:
                for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadInt32BigEndian(bytes[(i * stride)..]);
                break;
            case Bitpix.Int64:
                for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadInt64BigEndian(bytes[(i * stride)..]);
                break;
            case Bitpix.Single:
                for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadSingleBigEndian(bytes[(i * stride)..]);
                break;
            default:
                for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadDoubleBigEndian(bytes[(i * stride)..]);
                break;
        }
    }
}
