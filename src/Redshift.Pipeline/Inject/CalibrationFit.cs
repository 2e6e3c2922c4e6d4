using MathNet.Numerics;
using MathNet.Numerics.LinearAlgebra;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Match.Posterior;

namespace Redshift.Pipeline.Inject;

/// <summary>
/// Fits the map from evidence to confidence to answers of one kind: maximum likelihood, drawn to a known map as by normal priors around its
/// coefficients, so that few answers change it little.
/// </summary>
/// <param name="known">The map that holds as long as the answers do not say otherwise.</param>
/// <param name="latitude">Factor on the widths of the priors.</param>
/// <param name="onlyLower">Whether evidence may count for less than in the known map, but not for more.</param>
internal sealed class CalibrationFit(ConfidenceMap known, double latitude = 1, bool onlyLower = false)
{
    private const int Folds = 5;
    private const double Precision = 1e-7;
    private const int MostSteps = 5000;

    /// <summary>σ of the priors: about as much as the maps of the kinds differ from each other.</summary>
    private static readonly Vector<double> Widths = Vector<double>.Build.Dense([0.7, 0.15, 0.2, 0.25]);

    private readonly Vector<double> _centre = Vector<double>.Build.Dense([known.Offset, known.Near, known.Far, known.Misfit]);

    /// <summary>The map that the answers support.</summary>
    public ConfidenceMap Fit(IReadOnlyList<CalibrationCase> cases) => ToMap(FindMinimum.OfFunction(b => Cost(cases, b), _centre, Precision, MostSteps));

    /// <summary>What maps that were fitted to the others say of every answer: each fifth is left out in turn.</summary>
    public IReadOnlyList<Forecast> CrossValidated(IReadOnlyList<CalibrationCase> cases)
    {
        var maps = Enumerable.Range(0, Folds).Select(fold => Fit([.. cases.Where((_, i) => i % Folds != fold)])).ToArray();
        return [.. cases.Select((c, i) => c.Forecast(maps[i % Folds]))];
    }

    private double Cost(IReadOnlyList<CalibrationCase> cases, Vector<double> b)
    {
        var map = ToMap(b);
        var pull = (b - _centre).PointwiseDivide(latitude * Widths);
        var loss = 0.0;
        foreach (var c in cases) loss += Measures.LogLoss(c.Forecast(map));
        return (loss + 0.5 * pull.DotProduct(pull)) / cases.Count;
    }

    /// <summary>Better evidence never means less confidence.</summary>
    private ConfidenceMap ToMap(Vector<double> b)
    {
        var map = known with { Offset = b[0], Near = Math.Max(0, b[1]), Far = Math.Max(0, b[2]), Misfit = Math.Max(0, b[3]) };
        return onlyLower ? Lower(map) : map;
    }

    private ConfidenceMap Lower(ConfidenceMap map) => map with
    {
        Offset = Math.Min(known.Offset, map.Offset),
        Near = Math.Min(known.Near, map.Near),
        Far = Math.Min(known.Far, map.Far),
        Misfit = Math.Max(known.Misfit, map.Misfit),
    };
}
