using System.Runtime.Intrinsics;

namespace Redshift.Pipeline.Numerics;

/// <summary>Elementary functions of eight numbers at once, from additions and multiplications alone: the bits do not depend on the C library.</summary>
internal static class VectorMath
{
    private const float Ln2 = 0.69314718f;

    /// <summary>exp(x) for x from −87 to 88 to some 1e-6: a power of two and a Taylor series to the sixth order about it; smaller x give next to nothing.</summary>
    public static Vector256<float> Exp(Vector256<float> x)
    {
        var power = Vector256.Max(x * (1 / Ln2), Vector256.Create(-126f));
        var whole = Vector256.Floor(power + Vector256.Create(0.5f));
        var rest = (power - whole) * Ln2;
        var one = Vector256<float>.One;
        var inner = Vector256.Create(1f / 24) + rest * (Vector256.Create(1f / 120) + rest * (1f / 720));
        var series = one + rest * (one + rest * (Vector256.Create(0.5f) + rest * (Vector256.Create(1f / 6) + rest * inner)));
        return series * Vector256.ShiftLeft(Vector256.ConvertToInt32(whole) + Vector256.Create(127), 23).AsSingle();
    }

    /// <summary>exp(−u²/2), at least to |u| = 13.</summary>
    public static Vector256<float> Gaussian(Vector256<float> u) => Exp(u * u * -0.5f);

    /// <summary>ln x of positive normal numbers to some 1e-6: the exponent and 2 artanh((m−1)/(m+1)) of a mantissa m from √½ to √2.</summary>
    public static Vector256<float> Ln(Vector256<float> x)
    {
        // Bits of √½: what is added moves the mantissa's range without a comparison.
        var offset = Vector256.Create(0x3F3504F3);
        var bits = x.AsInt32() - offset;
        var exponent = Vector256.ConvertToSingle(Vector256.ShiftRightArithmetic(bits, 23));
        var mantissa = ((bits & Vector256.Create(0x7FFFFF)) + offset).AsSingle();
        var one = Vector256<float>.One;
        var z = (mantissa - one) / (mantissa + one);
        var square = z * z;
        return exponent * Ln2 + z * (Vector256.Create(2f) + square * (Vector256.Create(2f / 3) + square * (Vector256.Create(2f / 5) + square * (2f / 7))));
    }
}
