using System.Numerics;
using System.Runtime.Intrinsics;

namespace Redshift.Pipeline.Numerics;

/// <summary>
/// Complex fast Fourier transform of eight sequences at once, one a lane, of one length, a power of two, on separate real and imaginary
/// arrays (Stockham's self-sorting form with radix 4; e.g. Van Loan 1992, Computational Frameworks for the FFT, §2.4).
/// </summary>
/// <remarks>Lanes never meet, so that the bits do not depend on the vector width. Not thread safe: holds scratch space.</remarks>
internal sealed class FourierTransform
{
    [ThreadStatic]
    private static Dictionary<int, FourierTransform>? _perThread;

    private readonly float[] _cos;
    private readonly float[] _sin;
    private readonly Vector256<float>[] _re;
    private readonly Vector256<float>[] _im;

    public FourierTransform(int length)
    {
        if (!BitOperations.IsPow2(length)) throw new ArgumentOutOfRangeException(nameof(length), length, "a power of two is expected");
        Length = length;
        (_cos, _sin) = (new float[length], new float[length]);
        for (var k = 0; k < length; k++) (_sin[k], _cos[k]) = ((float)Math.Sin(-2 * Math.PI * k / length), (float)Math.Cos(-2 * Math.PI * k / length));
        (_re, _im) = (new Vector256<float>[length], new Vector256<float>[length]);
    }

    /// <summary>A transform of this length for the calling thread, kept for the next call.</summary>
    public static FourierTransform OfLength(int length)
    {
        _perThread ??= [];
        if (!_perThread.TryGetValue(length, out var transform)) _perThread[length] = transform = new FourierTransform(length);
        return transform;
    }

    public int Length { get; }

    /// <summary>Transforms in place, kernel exp(−2πi jk/N), no scaling.</summary>
    public void Forward(Span<Vector256<float>> re, Span<Vector256<float>> im)
    {
        Span<Vector256<float>> xr = re, xi = im, yr = _re, yi = _im;
        var passes = 0;
        for (int length = Length, stride = 1; length > 1; passes++)
        {
            var radix = length % 4 == 0 ? 4 : 2;
            if (radix == 4) PassOfFour(xr, xi, yr, yi, length / 4, stride);
            else PassOfTwo(xr, xi, yr, yi, stride);
            (length, stride) = (length / radix, stride * radix);
            Span<Vector256<float>> tr = xr, ti = xi;
            xr = yr;
            xi = yi;
            yr = tr;
            yi = ti;
        }

        if (passes % 2 == 0) return;
        xr.CopyTo(re);
        xi.CopyTo(im);
    }

    /// <summary>Inverse transform without the factor 1/N: the forward one with the two parts exchanged.</summary>
    public void Inverse(Span<Vector256<float>> re, Span<Vector256<float>> im) => Forward(im, re);

    private void PassOfFour(
        ReadOnlySpan<Vector256<float>> xr, ReadOnlySpan<Vector256<float>> xi, Span<Vector256<float>> yr, Span<Vector256<float>> yi, int quarter, int stride)
    {
        var step = stride * quarter;
        for (var p = 0; p < quarter; p++)
        {
            int once = stride * p, at = stride * p, to = 4 * stride * p;
            float c1 = _cos[once], s1 = _sin[once], c2 = _cos[2 * once], s2 = _sin[2 * once], c3 = _cos[3 * once], s3 = _sin[3 * once];
            for (var q = 0; q < stride; q++, at++, to++)
            {
                Vector256<float> ar = xr[at] + xr[at + 2 * step], ai = xi[at] + xi[at + 2 * step];
                Vector256<float> br = xr[at] - xr[at + 2 * step], bi = xi[at] - xi[at + 2 * step];
                Vector256<float> cr = xr[at + step] + xr[at + 3 * step], ci = xi[at + step] + xi[at + 3 * step];
                Vector256<float> dr = xr[at + step] - xr[at + 3 * step], di = xi[at + step] - xi[at + 3 * step];
                (yr[to], yi[to]) = (ar + cr, ai + ci);
                Vector256<float> er = br + di, ei = bi - dr, fr = ar - cr, fi = ai - ci, gr = br - di, gi = bi + dr;
                (yr[to + stride], yi[to + stride]) = (er * c1 - ei * s1, er * s1 + ei * c1);
                (yr[to + 2 * stride], yi[to + 2 * stride]) = (fr * c2 - fi * s2, fr * s2 + fi * c2);
                (yr[to + 3 * stride], yi[to + 3 * stride]) = (gr * c3 - gi * s3, gr * s3 + gi * c3);
            }
        }
    }

    /// <summary>The last pass of a length that is no power of four; its factors are one.</summary>
    private static void PassOfTwo(
        ReadOnlySpan<Vector256<float>> xr, ReadOnlySpan<Vector256<float>> xi, Span<Vector256<float>> yr, Span<Vector256<float>> yi, int stride)
    {
        for (var q = 0; q < stride; q++)
        {
            (yr[q], yi[q]) = (xr[q] + xr[q + stride], xi[q] + xi[q + stride]);
            (yr[q + stride], yi[q + stride]) = (xr[q] - xr[q + stride], xi[q] - xi[q + stride]);
        }
    }
}
