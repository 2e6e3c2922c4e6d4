using System.Buffers.Binary;

namespace Redshift.Fits;

/// <summary>Picks one number out of each row.</summary>
internal static class Strided
{
    /// <summary>The number at the start of each row of <paramref name="stride"/> bytes, scaled.</summary>
    public static void Gather(Bitpix type, ReadOnlySpan<byte> bytes, int stride, Scaling scaling, Span<double> into)
    {
        if (scaling is { Scale: 1, Zero: 0, Null: null } && type is Bitpix.Single or Bitpix.Double or Bitpix.Int32)
            GatherPlain(type, bytes, stride, into);
        else
            for (var i = 0; i < into.Length; i++) scaling.ToDoubles(type, bytes[(i * stride)..], into.Slice(i, 1));
    }

    private static void GatherPlain(Bitpix type, ReadOnlySpan<byte> bytes, int stride, Span<double> into)
    {
        if (type == Bitpix.Single)
            for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadSingleBigEndian(bytes[(i * stride)..]);
        else if (type == Bitpix.Double)
            for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadDoubleBigEndian(bytes[(i * stride)..]);
        else
            for (var i = 0; i < into.Length; i++) into[i] = BinaryPrimitives.ReadInt32BigEndian(bytes[(i * stride)..]);
    }
}
