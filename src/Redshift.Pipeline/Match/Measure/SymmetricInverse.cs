namespace Redshift.Pipeline.Match.Measure;

/// <summary>Inverse of a small symmetric positive definite matrix.</summary>
internal static class SymmetricInverse
{
    /// <summary>Inverts in place by Gauss–Jordan elimination, which needs no pivoting for such matrices.</summary>
    /// <param name="matrix">n × n values.</param>
    /// <param name="n">Number of rows.</param>
    /// <returns>False where the matrix is singular.</returns>
    public static bool Invert(Span<double> matrix, int n)
    {
        for (var k = 0; k < n; k++)
        {
            var pivot = matrix[k * n + k];
            if (!(pivot > 1e-300)) return false;
            matrix[k * n + k] = 1;
            for (var j = 0; j < n; j++) matrix[k * n + j] /= pivot;
            for (var i = 0; i < n; i++) Eliminate(matrix, n, k, i);
        }

        return true;
    }

    private static void Eliminate(Span<double> matrix, int n, int k, int row)
    {
        if (row == k) return;
        var factor = matrix[row * n + k];
        matrix[row * n + k] = 0;
        for (var j = 0; j < n; j++) matrix[row * n + j] -= factor * matrix[k * n + j];
    }
}
