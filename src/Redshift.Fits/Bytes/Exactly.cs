namespace Redshift.Fits;

/// <summary>Integers without rounding, or an error that says why not.</summary>
internal static class Exactly
{
    public static void Require(bool isInteger, FitsLocation where)
    {
        if (!isInteger) throw new FitsUnsupportedException(where, "the values are not stored as integers; read them as floating-point numbers");
    }

    public static void ToIntegers(Scaling scaling, Bitpix type, ReadOnlySpan<byte> bytes, Span<long> into, FitsLocation where)
    {
        try
        {
            scaling.ToIntegers(type, bytes, into);
        }
        catch (OverflowException)
        {
            throw new FitsUnsupportedException(where, "a value does not fit a signed 64-bit integer; read them as unsigned");
        }
    }

    public static void ToUnsigned(Scaling scaling, Bitpix type, ReadOnlySpan<byte> bytes, Span<ulong> into, FitsLocation where)
    {
        try
        {
            scaling.ToUnsigned(type, bytes, into);
        }
        catch (OverflowException)
        {
            throw new FitsUnsupportedException(where, "a value does not fit an unsigned 64-bit integer; read them as signed");
        }
    }
}
