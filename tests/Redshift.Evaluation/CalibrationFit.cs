using MathNet.Numerics;
using MathNet.Numerics.LinearAlgebra;
using Redshift.Pipeline.Match.Posterior;

namespace Redshift.Evaluation;

/// <summary>
/// Fits the map from evidence to confidence anew, kind by kind, by maximum likelihood: the numbers for the pipeline's calibration.
/// </summary>
internal static class CalibrationFit
{
    private const int Folds = 5;

    /// <summary>Prints the coefficients of each kind, with the score that they reach and that of answers left out of the fit.</summary>
    public static void Print(IReadOnlyList<CalibrationCase> cases, TextWriter writer)
    {
        writer.WriteLine("kind         n   offset     near      far   misfit    score  cross-validated");
        foreach (var kind in cases.GroupBy(c => c.Kind).OrderBy(g => g.Key, StringComparer.Ordinal))
        {
            var all = kind.ToList();
            var b = Fit(all);
            writer.WriteLine(FormattableString.Invariant(
                $"{kind.Key,-8}{all.Count,6}{b[0],9:0.00}{b[1],9:0.00}{b[2],9:0.00}{b[3],9:0.00}{Score(all, b),9:0.000}{CrossValidated(all),17:0.000}"));
        }
    }

    /// <summary>Mean of −ln of the probability that was given to what happened.</summary>
    private static double Score(IEnumerable<CalibrationCase> cases, Vector<double> b) => cases.Average(c =>
    {
        var stated = Math.Clamp(Confidence(c, b), 1e-4, Calibration.Greatest);
        return -Math.Log(c.Right ? stated : 1 - stated);
    });

    private static double CrossValidated(List<CalibrationCase> cases) => Enumerable.Range(0, Folds).Sum(fold =>
    {
        bool Out(CalibrationCase c, int i) => i % Folds == fold;
        var left = cases.Where(Out).ToList();
        return left.Count * Score(left, Fit([.. cases.Where((c, i) => !Out(c, i))])) / cases.Count;
    });

    private static Vector<double> Fit(IReadOnlyList<CalibrationCase> cases) =>
        FindMinimum.OfFunction(b => Score(cases, b) + 1e-4 * b.DotProduct(b), Vector<double>.Build.Dense([0, 0.1, 1, 0.1]), 1e-9, 20000);

    private static double Confidence(CalibrationCase c, Vector<double> b) => c.Within * new Calibration.Map(b[0], b[1], b[2], b[3]).Probability(c.LnOdds, c.Misfit);
}
