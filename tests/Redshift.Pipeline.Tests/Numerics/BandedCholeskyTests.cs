using CsCheck;
using MathNet.Numerics.LinearAlgebra;
using Redshift.Pipeline.Numerics;
using Xunit;

namespace Redshift.Pipeline.Tests.Numerics;

public class BandedCholeskyTests
{
    private const int Row = BandedCholesky.Band + 1;

    /// <summary>A matrix L·Lᵀ of random size and band L, and a right-hand side.</summary>
    private static readonly Gen<(Matrix<double> Matrix, Vector<double> Right)> Systems =
        from size in Gen.Int[1, 40]
        from elements in Gen.Double[-1, 1].Array[size * Row]
        from right in Gen.Double[-5, 5].Array[size]
        select (Product(size, elements), Vector<double>.Build.Dense(right));

    [Fact]
    public void Factor_solves_and_measures_as_a_dense_one_does() => Systems.Sample(system =>
    {
        var dense = system.Matrix.Cholesky();
        var banded = new BandedCholesky();
        banded.Factor(Bands(system.Matrix), system.Right.Count);
        AssertSolves(banded, dense.Solve(system.Right), system.Right);
        Assert.Equal(0.5 * dense.DeterminantLn, banded.HalfLogDeterminant, 1e-10);
    });

    [Fact]
    public void An_instance_forgets_the_matrix_before() => Gen.Select(Systems, Systems).Sample((first, second) =>
    {
        var banded = new BandedCholesky();
        banded.Factor(Bands(first.Matrix), first.Right.Count);
        banded.Factor(Bands(second.Matrix), second.Right.Count);
        AssertSolves(banded, second.Matrix.Cholesky().Solve(second.Right), second.Right);
    });

    [Fact]
    public void Forward_halves_give_the_quadratic_form() => Systems.Sample(system =>
    {
        var banded = new BandedCholesky();
        banded.Factor(Bands(system.Matrix), system.Right.Count);
        var half = system.Right.ToArray();
        banded.Forward(half);
        var form = system.Right * system.Matrix.Cholesky().Solve(system.Right);
        Assert.Equal(form, half.Sum(x => x * x), 1e-9 * (1 + form));
    });

    private static void AssertSolves(BandedCholesky banded, Vector<double> expected, Vector<double> right)
    {
        var solution = right.ToArray();
        banded.Forward(solution);
        banded.Backward(solution);
        Assert.InRange((Vector<double>.Build.Dense(solution) - expected).L2Norm(), 0, 1e-9 * (1 + expected.L2Norm()));
    }

    private static Matrix<double> Product(int size, double[] elements)
    {
        // A diagonal of two and more against three neighbours below one keeps the condition of the product small.
        var lower = Matrix<double>.Build.Dense(size, size, (i, j) => i - j is var d and >= 0 and < Row ? elements[i * Row + d] + (d == 0 ? 3 : 0) : 0);
        return lower * lower.Transpose();
    }

    private static double[] Bands(Matrix<double> matrix)
    {
        var bands = new double[matrix.RowCount * Row];
        for (var i = 0; i < matrix.RowCount; i++)
            for (var d = 0; d <= Math.Min(i, BandedCholesky.Band); d++) bands[i * Row + d] = matrix[i, i - d];
        return bands;
    }
}
