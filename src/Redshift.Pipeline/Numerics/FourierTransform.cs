using System.Numerics;
using System.Runtime.Intrinsics;

namespace Redshift.Pipeline.Numerics;

/// <summary>
/// Complex fast Fourier transform of one length, a power of two, on separate real and imaginary arrays
/// (Stockham's self-sorting radix-2 form; e.g. Van Loan 1992, Computational Frameworks for the FFT, §1.7).
/// </summary>
/// <remarks>Element-wise arithmetic only, so that the bits do not depend on the vector width. Not thread safe: holds scratch space.</remarks>
internal sealed class FourierTransform
{
    [ThreadStatic]
    private static Dictionary<int, FourierTransform>? _perThread;

    private readonly float[][] _cos;
    private readonly float[][] _sin;
    private readonly float[] _re;
    private readonly float[] _im;

    public FourierTransform(int length)
    {
        if (!BitOperations.IsPow2(length)) throw new ArgumentOutOfRangeException(nameof(length), length, "a power of two is expected");
        Length = length;
        var stages = BitOperations.Log2((uint)length);
        _cos = new float[stages][];
        _sin = new float[stages][];
        for (var stage = 0; stage < stages; stage++) FillTwiddles(stage, length >> (stage + 1));
        _re = new float[length];
        _im = new float[length];
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
    public void Forward(Span<float> re, Span<float> im)
    {
        Span<float> xr = re, xi = im, yr = _re, yi = _im;
        var stride = 1;
        for (int half = Length / 2, stage = 0; half >= 1; half /= 2, stage++)
        {
            Pass(xr, xi, yr, yi, half, stride, _cos[stage], _sin[stage]);
            stride *= 2;
            Span<float> tr = xr, ti = xi;
            xr = yr;
            xi = yi;
            yr = tr;
            yi = ti;
        }

        if (BitOperations.Log2((uint)Length) % 2 == 0) return;
        xr.CopyTo(re);
        xi.CopyTo(im);
    }

    /// <summary>Inverse transform without the factor 1/N: the forward one with the two parts exchanged.</summary>
    public void Inverse(Span<float> re, Span<float> im) => Forward(im, re);

    private void FillTwiddles(int stage, int half)
    {
        _cos[stage] = new float[half];
        _sin[stage] = new float[half];
        for (var p = 0; p < half; p++)
        {
            var angle = -Math.PI * p / half;
            _cos[stage][p] = (float)Math.Cos(angle);
            _sin[stage][p] = (float)Math.Sin(angle);
        }
    }

    private static void Pass(Span<float> xr, Span<float> xi, Span<float> yr, Span<float> yi, int half, int stride, float[] cos, float[] sin)
    {
        if (stride == 1 && half >= 8)
        {
            FirstPass(xr, xi, yr, yi, half, cos, sin);
            return;
        }

        for (var p = 0; p < half; p++)
        {
            int a = stride * p, b = stride * (p + half), c = stride * 2 * p, d = c + stride;
            Butterflies(
                xr.Slice(a, stride), xi.Slice(a, stride), xr.Slice(b, stride), xi.Slice(b, stride),
                yr.Slice(c, stride), yi.Slice(c, stride), yr.Slice(d, stride), yi.Slice(d, stride), cos[p], sin[p]);
        }
    }

    /// <summary>The first pass, whose stride of one leaves its butterflies in neighbouring elements: eight at a time, written interleaved.</summary>
    private static void FirstPass(Span<float> xr, Span<float> xi, Span<float> yr, Span<float> yi, int half, float[] cos, float[] sin)
    {
        Span<float> sums = stackalloc float[32];
        for (var p = 0; p < half; p += 8)
        {
            Vector256<float> ar = Vector256.Create(xr[p..]), ai = Vector256.Create(xi[p..]);
            Vector256<float> br = Vector256.Create(xr[(p + half)..]), bi = Vector256.Create(xi[(p + half)..]);
            Vector256<float> c = Vector256.Create(cos, p), s = Vector256.Create(sin, p), dr = ar - br, di = ai - bi;
            (ar + br).CopyTo(sums);
            (ai + bi).CopyTo(sums[8..]);
            (dr * c - di * s).CopyTo(sums[16..]);
            (dr * s + di * c).CopyTo(sums[24..]);
            for (var q = 0; q < 8; q++)
            {
                yr[2 * (p + q)] = sums[q];
                yi[2 * (p + q)] = sums[8 + q];
                yr[2 * (p + q) + 1] = sums[16 + q];
                yi[2 * (p + q) + 1] = sums[24 + q];
            }
        }
    }

    private static void Butterflies(
        Span<float> ar, Span<float> ai, Span<float> br, Span<float> bi,
        Span<float> sr, Span<float> si, Span<float> tr, Span<float> ti, float c, float s)
    {
        var q = 0;
        for (Vector256<float> vc = Vector256.Create(c), vs = Vector256.Create(s); q <= ar.Length - 8; q += 8)
        {
            Vector256<float> pr = Vector256.Create(ar[q..]), pi = Vector256.Create(ai[q..]), qr = Vector256.Create(br[q..]), qi = Vector256.Create(bi[q..]);
            (pr + qr).CopyTo(sr[q..]);
            (pi + qi).CopyTo(si[q..]);
            Vector256<float> dr = pr - qr, di = pi - qi;
            (dr * vc - di * vs).CopyTo(tr[q..]);
            (dr * vs + di * vc).CopyTo(ti[q..]);
        }

        for (; q < ar.Length; q++)
        {
            float dr = ar[q] - br[q], di = ai[q] - bi[q];
            sr[q] = ar[q] + br[q];
            si[q] = ai[q] + bi[q];
            tr[q] = dr * c - di * s;
            ti[q] = dr * s + di * c;
        }
    }
}
