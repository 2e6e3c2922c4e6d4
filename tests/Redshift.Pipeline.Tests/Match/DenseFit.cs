using MathNet.Numerics.LinearAlgebra;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Tests.Match;

/// <summary>A column of the dense fit with the normal prior of its amplitude.</summary>
internal sealed record DenseColumn(float[] Values, double Mean, double Spread);

/// <summary>
/// The same linear model as the fit under test, written down as one matrix and solved at once:
/// a spline times a template, and columns with normal priors.
/// </summary>
internal sealed class DenseFit
{
    private readonly Matrix<double> _design;
    private readonly Vector<double> _solution;
    private readonly int _coefficients;

    public DenseFit(FitPixels pixels, float[] template, params DenseColumn[] columns)
    {
        _coefficients = pixels.Basis.Coefficients;
        _design = Matrix<double>.Build.Dense(pixels.Count, _coefficients + columns.Length);
        for (var p = 0; p < pixels.Count; p++)
        {
            for (var j = 0; j < 4; j++) _design[p, pixels.Basis.First[p] + j] = pixels.Basis.Values[j][p] * template[p];
            for (var c = 0; c < columns.Length; c++) _design[p, _coefficients + c] = columns[c].Values[p];
        }

        var weighted = _design.Transpose() * Matrix<double>.Build.DiagonalOfDiagonalArray([.. pixels.Weight.Take(pixels.Count).Select(w => (double)w)]);
        var (precision, mean) = Prior(pixels, columns);
        var normal = (weighted * _design + precision).Cholesky();
        var right = weighted * Vector<double>.Build.DenseOfEnumerable(pixels.Flux.Take(pixels.Count).Select(f => (double)f)) + precision * mean;
        _solution = normal.Solve(right);
        LnEvidence = 0.5 * (right * _solution) - 0.5 * normal.DeterminantLn - columns.Sum(c => Math.Log(c.Spread)) - 0.5 * (mean * (precision * mean));
    }

    /// <summary>ln evidence but for what all models share.</summary>
    public double LnEvidence { get; }

    /// <summary>The whole model at the pixels.</summary>
    public double[] Model => (_design * _solution).ToArray();

    /// <summary>Amplitude of a column.</summary>
    public double Amplitude(int column) => _solution[_coefficients + column];

    /// <summary>The spline alone, without the template.</summary>
    public float[] Smooth(FitPixels pixels) =>
        [.. Enumerable.Range(0, pixels.Count).Select(p => (float)Enumerable.Range(0, 4).Sum(j => pixels.Basis.Values[j][p] * _solution[pixels.Basis.First[p] + j]))];

    private static (Matrix<double> Precision, Vector<double> Mean) Prior(FitPixels pixels, DenseColumn[] columns)
    {
        const int Row = BandedCholesky.Band + 1;
        var size = pixels.Basis.Coefficients + columns.Length;
        var precision = Matrix<double>.Build.Dense(size, size);
        for (var i = 0; i < pixels.Basis.Coefficients; i++)
            for (var d = 0; d <= Math.Min(i, BandedCholesky.Band); d++) precision[i, i - d] = precision[i - d, i] = pixels.Basis.PriorMatrix[i * Row + d];
        for (var c = 0; c < columns.Length; c++) precision[pixels.Basis.Coefficients + c, pixels.Basis.Coefficients + c] = 1 / (columns[c].Spread * columns[c].Spread);
        return (precision, Vector<double>.Build.Dense(size, i => i < pixels.Basis.Coefficients ? 0 : columns[i - pixels.Basis.Coefficients].Mean));
    }
}
