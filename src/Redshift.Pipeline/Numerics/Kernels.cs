using System.Runtime.Intrinsics;

namespace Redshift.Pipeline.Numerics;

/// <summary>Sums of products over spans with a fixed number of lanes, so that the bits do not depend on the machine's vector width.</summary>
internal static class Kernels
{
    /// <summary>Elements that are worked on at once.</summary>
    public const int Lanes = 8;

    private static readonly Vector256<int> Indices = Vector256.Create(0, 1, 2, 3, 4, 5, 6, 7);

    /// <summary>All bits in the first <paramref name="count"/> lanes, none in the others.</summary>
    public static Vector256<float> Mask(int count) => Vector256.LessThan(Indices, Vector256.Create(count)).AsSingle();

    /// <summary>Σ aᵢ·bᵢ.</summary>
    public static float Dot(ReadOnlySpan<float> a, ReadOnlySpan<float> b)
    {
        Vector256<float> first = default, second = default;
        var i = 0;
        for (; i <= a.Length - 16; i += 16)
        {
            first += Vector256.Create(a[i..]) * Vector256.Create(b[i..]);
            second += Vector256.Create(a[(i + 8)..]) * Vector256.Create(b[(i + 8)..]);
        }

        var sum = Vector256.Sum(first + second);
        for (; i < a.Length; i++) sum += a[i] * b[i];
        return sum;
    }

    /// <summary>Σ aᵢ·bᵢ of doubles.</summary>
    public static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        Vector256<double> lanes = default;
        var i = 0;
        for (; i <= a.Length - 4; i += 4) lanes += Vector256.Create(a[i..]) * Vector256.Create(b[i..]);
        var sum = Vector256.Sum(lanes);
        for (; i < a.Length; i++) sum += a[i] * b[i];
        return sum;
    }

    /// <summary>into = a·b, element by element.</summary>
    public static void Multiply(ReadOnlySpan<float> a, ReadOnlySpan<float> b, Span<float> into)
    {
        var i = 0;
        for (; i <= into.Length - 8; i += 8) (Vector256.Create(a[i..]) * Vector256.Create(b[i..])).CopyTo(into[i..]);
        for (; i < into.Length; i++) into[i] = a[i] * b[i];
    }

    /// <summary>into = a·(b − c), element by element.</summary>
    public static void MultiplyDifference(ReadOnlySpan<float> a, ReadOnlySpan<float> b, ReadOnlySpan<float> c, Span<float> into)
    {
        var i = 0;
        for (; i <= into.Length - 8; i += 8) (Vector256.Create(a[i..]) * (Vector256.Create(b[i..]) - Vector256.Create(c[i..]))).CopyTo(into[i..]);
        for (; i < into.Length; i++) into[i] = a[i] * (b[i] - c[i]);
    }
}
