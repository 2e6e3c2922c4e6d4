namespace Redshift.Pipeline.Numerics;

/// <summary>
/// Cholesky factor of a symmetric positive definite band matrix (Golub &amp; Van Loan, Matrix Computations, §4.3.5),
/// as the normal equations of a B-spline have. Row i holds its diagonal and the <see cref="Band"/> elements left of it.
/// </summary>
internal sealed class BandedCholesky
{
    public const int Band = 3;

    private double[] _lower = [];
    private double[] _inverse = [];

    public int Size { get; private set; }

    /// <summary>½ ln det of the factored matrix.</summary>
    public double HalfLogDeterminant { get; private set; }

    /// <summary>Factors a matrix given as size × (Band+1) values: element [i, d] is A(i, i−d).</summary>
    public void Factor(ReadOnlySpan<double> matrix, int size)
    {
        Size = size;
        if (_inverse.Length < size) (_lower, _inverse) = (new double[size * (Band + 1)], new double[size]);
        var half = 0.0;
        for (var i = 0; i < size; i++)
        {
            for (var j = Math.Max(0, i - Band); j <= i; j++) FactorElement(matrix, i, j);
            half += Math.Log(_lower[i * (Band + 1)]);
            _inverse[i] = 1 / _lower[i * (Band + 1)];
        }

        HalfLogDeterminant = half;
    }

    /// <summary>Solves L y = x in place.</summary>
    /// <param name="x">The right-hand side; receives the solution.</param>
    /// <param name="first">Elements before this one are zero, and stay so.</param>
    public void Forward(Span<double> x, int first = 0)
    {
        double one = 0, two = 0, three = 0;
        for (var i = first; i < Size; i++)
        {
            var row = _lower.AsSpan(i * (Band + 1), Band + 1);
            var value = (x[i] - row[3] * three - row[2] * two - row[1] * one) * _inverse[i];
            (three, two, one) = (two, one, value);
            x[i] = value;
        }
    }

    /// <summary>Solves Lᵀ x = y in place.</summary>
    public void Backward(Span<double> y)
    {
        for (var i = Size - 1; i >= 0; i--)
        {
            var sum = y[i];
            for (var d = 1; d <= Band && i + d < Size; d++) sum -= _lower[(i + d) * (Band + 1) + d] * y[i + d];
            y[i] = sum * _inverse[i];
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
