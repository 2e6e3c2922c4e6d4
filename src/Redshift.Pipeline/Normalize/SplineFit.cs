using System.Runtime.Intrinsics;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Normalize;

/// <summary>The smooth spline times a template, fitted by weighted least squares with its prior: what is projected out of all else.</summary>
/// <param name="basis">The spline at the basis.</param>
/// <param name="flux">Flux of each pixel and a vector more.</param>
internal sealed class SplineFit(SplineBasis basis, float[] flux)
{
    private const int Row = BandedCholesky.Band + 1;

    private readonly double[] _matrix = new double[basis.PriorMatrix.Length];
    private readonly double[] _right = new double[basis.Coefficients];
    private readonly double[] _coefficients = new double[basis.Coefficients];
    private readonly BandedCholesky _cholesky = new();
    private float[] _weight = [];
    private float[] _template = [];

    /// <summary>L⁻¹ of the right-hand side, L being the factor of the normal matrix.</summary>
    public ReadOnlySpan<double> Right => _right;

    /// <summary>Solves for the spline; returns its part of the ln evidence.</summary>
    /// <param name="weight">Weights of the basis.</param>
    /// <param name="template">What multiplies the spline; kept for what is projected.</param>
    public double Solve(float[] weight, float[] template)
    {
        (_weight, _template) = (weight, template);
        basis.PriorMatrix.CopyTo(_matrix, 0);
        Array.Clear(_right);
        foreach (var (start, end, first) in basis.Intervals) AddInterval(start, end, _matrix.AsSpan(first * Row), _right.AsSpan(first));
        _cholesky.Factor(_matrix, basis.Coefficients);
        _cholesky.Forward(_right);
        return 0.5 * Kernels.Dot(_right, _right) - _cholesky.HalfLogDeterminant;
    }

    /// <summary>Projects a column: L⁻¹ of its products with the spline.</summary>
    /// <param name="sums">Σ weight·column·template·basis of each coefficient; overwritten.</param>
    /// <param name="first">First coefficient that is not zero.</param>
    public void Project(Span<double> sums, int first) => _cholesky.Forward(sums, first);

    /// <summary>Adds weight·column·template·basis of a stretch of pixels to the coefficients, and writes weight·column.</summary>
    /// <param name="start">First pixel.</param>
    /// <param name="end">Pixel after the last.</param>
    /// <param name="column">Value of each pixel of the stretch and a vector more.</param>
    /// <param name="weighted">Receives weight times value.</param>
    /// <param name="sums">One sum a coefficient.</param>
    /// <returns>Σ weight·column·flux.</returns>
    public float AddProducts(int start, int end, ReadOnlySpan<float> column, Span<float> weighted, Span<double> sums)
    {
        Vector256<float> gradient = default;
        for (var interval = basis.IntervalOf(start); start < end; interval++)
        {
            var (_, stop, first) = basis.Intervals[interval];
            var to = Math.Min(stop, end);
            Vector256<float> r0 = default, r1 = default, r2 = default, r3 = default;
            var (s0, s1, s2, s3) = (basis.Values[0], basis.Values[1], basis.Values[2], basis.Values[3]);
            var at = 0;
            for (var p = start; p < to; p += Kernels.Lanes, at += Kernels.Lanes)
            {
                var product = Vector256.Create(_weight, p) * Vector256.Create(column[at..]);
                if (to - p < Kernels.Lanes) product &= Kernels.Mask(to - p);
                product.CopyTo(weighted[at..]);
                gradient += product * Vector256.Create(flux, p);
                product *= Vector256.Create(_template, p);
                r0 += product * Vector256.Create(s0, p);
                r1 += product * Vector256.Create(s1, p);
                r2 += product * Vector256.Create(s2, p);
                r3 += product * Vector256.Create(s3, p);
            }

            AddSums(sums[first..], r0, r1, r2, r3);
            column = column[(to - start)..];
            weighted = weighted[(to - start)..];
            start = to;
        }

        return Vector256.Sum(gradient);
    }

    /// <summary>The spline at the pixels, without the template.</summary>
    /// <param name="forward">L⁻¹ of the right-hand side, columns taken out of it or not.</param>
    /// <param name="into">Receives one value a pixel.</param>
    public void Smooth(ReadOnlySpan<double> forward, float[] into)
    {
        forward.CopyTo(_coefficients);
        _cholesky.Backward(_coefficients);
        var (s0, s1, s2, s3) = (basis.Values[0], basis.Values[1], basis.Values[2], basis.Values[3]);
        foreach (var (start, end, first) in basis.Intervals)
        {
            Vector256<float> c0 = Vector256.Create((float)_coefficients[first]), c1 = Vector256.Create((float)_coefficients[first + 1]);
            Vector256<float> c2 = Vector256.Create((float)_coefficients[first + 2]), c3 = Vector256.Create((float)_coefficients[first + 3]);
            // Writes beyond the interval are overwritten by the next one's.
            for (var p = start; p < end; p += Kernels.Lanes)
                (Vector256.Create(s0, p) * c0 + Vector256.Create(s1, p) * c1 + Vector256.Create(s2, p) * c2 + Vector256.Create(s3, p) * c3).CopyTo(into, p);
        }
    }

    private void AddInterval(int start, int end, Span<double> matrix, Span<double> right)
    {
        Vector256<float> m00 = default, m10 = default, m11 = default, m20 = default, m21 = default;
        Vector256<float> m22 = default, m30 = default, m31 = default, m32 = default, m33 = default;
        Vector256<float> r0 = default, r1 = default, r2 = default, r3 = default;
        var (b0, b1, b2, b3) = (basis.Values[0], basis.Values[1], basis.Values[2], basis.Values[3]);
        for (var p = start; p < end; p += Kernels.Lanes)
        {
            Vector256<float> s0 = Vector256.Create(b0, p), s1 = Vector256.Create(b1, p), s2 = Vector256.Create(b2, p), s3 = Vector256.Create(b3, p);
            var template = Vector256.Create(_template, p);
            var product = Vector256.Create(_weight, p) * template;
            if (end - p < Kernels.Lanes) product &= Kernels.Mask(end - p);
            var data = product * Vector256.Create(flux, p);
            r0 += data * s0;
            r1 += data * s1;
            r2 += data * s2;
            r3 += data * s3;
            product *= template;
            m00 += product * s0 * s0;
            var row = product * s1;
            m10 += row * s0;
            m11 += row * s1;
            row = product * s2;
            m20 += row * s0;
            m21 += row * s1;
            m22 += row * s2;
            row = product * s3;
            m30 += row * s0;
            m31 += row * s1;
            m32 += row * s2;
            m33 += row * s3;
        }

        AddSums(right, r0, r1, r2, r3);
        matrix[0] += Vector256.Sum(m00);
        matrix[Row] += Vector256.Sum(m11);
        matrix[Row + 1] += Vector256.Sum(m10);
        matrix[2 * Row] += Vector256.Sum(m22);
        matrix[2 * Row + 1] += Vector256.Sum(m21);
        matrix[2 * Row + 2] += Vector256.Sum(m20);
        matrix[3 * Row] += Vector256.Sum(m33);
        matrix[3 * Row + 1] += Vector256.Sum(m32);
        matrix[3 * Row + 2] += Vector256.Sum(m31);
        matrix[3 * Row + 3] += Vector256.Sum(m30);
    }

    private static void AddSums(Span<double> sums, Vector256<float> r0, Vector256<float> r1, Vector256<float> r2, Vector256<float> r3)
    {
        sums[0] += Vector256.Sum(r0);
        sums[1] += Vector256.Sum(r1);
        sums[2] += Vector256.Sum(r2);
        sums[3] += Vector256.Sum(r3);
    }
}
