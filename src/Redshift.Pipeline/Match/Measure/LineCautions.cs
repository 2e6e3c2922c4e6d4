using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>What the lines tell a person to check.</summary>
internal static class LineCautions
{
    /// <summary>Share of the gain of all lines above which one line carries the answer.</summary>
    private const double OneLineShare = 0.85;

    /// <summary>Principal lines in range below which an answer can hardly be tested.</summary>
    private const int FewLines = 3;

    /// <summary>The cautions.</summary>
    /// <param name="kind">The answered kind.</param>
    /// <param name="principal">How many principal lines fall on usable pixels.</param>
    /// <param name="rows">The rows of the lines.</param>
    public static IEnumerable<string> Of(ObjectKind kind, int principal, IReadOnlyList<LineMeasurement> rows)
    {
        if (kind != ObjectKind.Star && RestsOnOneLine(rows)) yield return "one-line-only";
        if (principal < FewLines) yield return "covers-few-lines";
    }

    private static bool RestsOnOneLine(IReadOnlyList<LineMeasurement> rows)
    {
        var gains = rows.Where(r => r.State == LineState.Matched).Select(r => Math.Max(0, r.LnLikelihoodGain ?? 0)).ToList();
        return gains.Count == 1 || (gains.Count > 1 && gains.Max() > OneLineShare * gains.Sum());
    }
}
