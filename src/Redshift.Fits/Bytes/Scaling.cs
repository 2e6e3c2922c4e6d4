using System.Runtime.CompilerServices;

namespace Redshift.Fits;

/// <summary>From stored to physical values: value = zero + scale × stored, and one stored integer that stands for no value.</summary>
/// <param name="Scale">BSCALE or TSCALn.</param>
/// <param name="Zero">BZERO or TZEROn.</param>
/// <param name="Null">BLANK or TNULLn; only integers have one.</param>
internal readonly record struct Scaling(double Scale, double Zero, long? Null)
{
    private const int Chunk = 512;

    // 2^63, by which unsigned 64-bit integers are shifted (section 4.4.2.5).
    private const double HalfOfUnsigned64 = 9223372036854775808.0;

    private bool IsIdentity => Scale == 1 && Zero == 0;

    /// <summary>Whether physical values are integers and this gives them without rounding.</summary>
    public bool IsExact => Scale == 1 && Math.Abs(Zero) <= HalfOfUnsigned64 && Math.Floor(Zero) == Zero;

    /// <summary>Physical values of as many elements as the target holds; NaN where there is none.</summary>
    public void ToDoubles(Bitpix type, ReadOnlySpan<byte> bytes, Span<double> into)
    {
        if (IsLinear(type))
        {
            BigEndian.ToDoubles(type, bytes, into);
            Apply(into);
        }
        else
        {
            IntegersToDoubles(type, bytes, into);
        }
    }

    /// <summary>Whether physical values are those of <see cref="BigEndian"/> with <see cref="Apply"/> done to them, and no more.</summary>
    public bool IsLinear(Bitpix type) => type < 0 || (Null is null && !NeedsExactShift(type));

    /// <summary>Scales stored values in place.</summary>
    public void Apply(Span<double> values)
    {
        if (IsIdentity) return;
        foreach (ref var value in values) value = Zero + Scale * value;
    }

    /// <summary>Physical values rounded to single precision; 32-bit floats keep their bits.</summary>
    [SkipLocalsInit]
    public void ToSingles(Bitpix type, ReadOnlySpan<byte> bytes, Span<float> into)
    {
        if (type == Bitpix.Single && IsIdentity)
        {
            BigEndian.ToSingles(bytes, into);
            return;
        }

        Span<double> doubles = stackalloc double[Chunk];
        for (; !into.IsEmpty; into = into[Math.Min(Chunk, into.Length)..])
        {
            var part = doubles[..Math.Min(Chunk, into.Length)];
            ToDoubles(type, bytes, part);
            for (var i = 0; i < part.Length; i++) into[i] = (float)part[i];
            bytes = bytes[(BigEndian.SizeOf(type) * part.Length)..];
        }
    }

    /// <summary>Exact integers; those beyond 63 bits overflow.</summary>
    public void ToIntegers(Bitpix type, ReadOnlySpan<byte> bytes, Span<long> into)
    {
        BigEndian.ToIntegers(type, bytes, into);
        if (Zero == 0) return;
        foreach (ref var value in into) value = checked((long)(value + (Int128)Zero));
    }

    /// <summary>Exact integers as unsigned ones; negative ones overflow.</summary>
    public void ToUnsigned(Bitpix type, ReadOnlySpan<byte> bytes, Span<ulong> into)
    {
        Span<long> one = stackalloc long[1];
        var size = BigEndian.SizeOf(type);
        for (var i = 0; i < into.Length; i++)
        {
            BigEndian.ToIntegers(type, bytes.Slice(size * i, size), one);
            into[i] = checked((ulong)(one[0] + (Int128)Zero));
        }
    }

    // Adding 2^63 to a 64-bit integer that was rounded to double first would lose its small values.
    private bool NeedsExactShift(Bitpix type) => type == Bitpix.Int64 && Zero != 0 && IsExact;

    [SkipLocalsInit]
    private void IntegersToDoubles(Bitpix type, ReadOnlySpan<byte> bytes, Span<double> into)
    {
        Span<long> integers = stackalloc long[Chunk];
        for (; !into.IsEmpty; into = into[Math.Min(Chunk, into.Length)..])
        {
            var part = integers[..Math.Min(Chunk, into.Length)];
            BigEndian.ToIntegers(type, bytes, part);
            for (var i = 0; i < part.Length; i++) into[i] = part[i] == Null ? double.NaN : Physical(part[i]);
            bytes = bytes[(BigEndian.SizeOf(type) * part.Length)..];
        }
    }

    private double Physical(long stored) => IsExact ? (double)(stored + (Int128)Zero) : Zero + Scale * stored;
}
