namespace Redshift.Pipeline.Numerics;

/// <summary>
/// Cholesky factor of a symmetric positive definite band matrix (Golub &amp; Van Loan, Matrix Computations, §4.3.5),
/// as the normal equations of a B-spline have. Row i holds its diagonal and the <see cref="Band"/> elements left of it.
/// </summary>
internal sealed class BandedCholesky
{
    public const int Band = 3;

    private double[] _lower = [];

    public int Size { get; private set; }

    /// <summary>½ ln det of the factored matrix.</summary>
    public double HalfLogDeterminant { get; private set; }

    /// <summary>Factors a matrix given as size × (Band+1) values: element [i, d] is A(i, i−d).</summary>
    public void Factor(ReadOnlySpan<double> matrix, int size)
    {
        Size = size;
        if (_lower.Length < size * (Band + 1)) _lower = new double[size * (Band + 1)];
        var half = 0.0;
        for (var i = 0; i < size; i++)
        {
            for (var j = Math.Max(0, i - Band); j <= i; j++) FactorElement(matrix, i, j);
            half += Math.Log(_lower[i * (Band + 1)]);
        }

        HalfLogDeterminant = half;
    }

    /// <summary>Solves L y = x in place.</summary>
    public void Forward(Span<double> x)
    {
        for (var i = 0; i < Size; i++)
        {
            var sum = x[i];
            for (var d = Math.Min(Band, i); d >= 1; d--) sum -= _lower[i * (Band + 1) + d] * x[i - d];
            x[i] = sum / _lower[i * (Band + 1)];
        }
    }

    /// <summary>Solves Lᵀ x = y in place.</summary>
    public void Backward(Span<double> y)
    {
        for (var i = Size - 1; i >= 0; i--)
        {
            var sum = y[i];
            for (var d = 1; d <= Band && i + d < Size; d++) sum -= _lower[(i + d) * (Band + 1) + d] * y[i + d];
            y[i] = sum / _lower[i * (Band + 1)];
        }
    }

    private void FactorElement(ReadOnlySpan<double> matrix, int i, int j)
    {
        var sum = matrix[i * (Band + 1) + (i - j)];
        for (var k = Math.Max(0, i - Band); k < j; k++)
            sum -= _lower[i * (Band + 1) + (i - k)] * _lower[j * (Band + 1) + (j - k)];
        _lower[i * (Band + 1) + (i - j)] = i == j ? Math.Sqrt(Math.Max(sum, 1e-300)) : sum / _lower[j * (Band + 1)];
    }
}
