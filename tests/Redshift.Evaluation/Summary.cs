using Redshift.Physics.Statistics;

namespace Redshift.Evaluation;

/// <summary>Figures of one group of judgements.</summary>
internal sealed record Summary(string Name, IReadOnlyList<Judgement> Members)
{
    public const string Heading = "group                              n   good  med dv    NMAD  |pull|<1 width  c>=.9  pure c>=.99   pure    log   skill";

    /// <summary>One line of the table.</summary>
    public override string ToString()
    {
        var right = Members.Where(m => m.Right).ToArray();
        double[] dv = [.. right.Select(m => m.DvKmS!.Value)];
        double[] pulls = [.. right.Where(m => m.Pull is not null).Select(m => m.Pull!.Value)];
        Forecast[] forecasts = [.. Members.Select(m => m.Forecast)];
        var (complete9, pure9) = Cut(0.9);
        var (complete99, pure99) = Cut(0.99);
        return FormattableString.Invariant(
            $"{Name,-30}{Members.Count,6}{(double)right.Length / Members.Count,7:0.000}{Measures.Median(dv),8:0.0}{Measures.RobustWidth(dv),8:0.0}{Measures.ShareWithin(pulls, 1),9:0.000}{Measures.RobustWidth(pulls),7:0.00}{complete9,7:0.000}{pure9,6:0.000}{complete99,7:0.000}{pure99,7:0.000}{Measures.LogLoss(forecasts),7:0.000}{Measures.BrierSkill(forecasts),8:0.000}");
    }

    /// <summary>Right answers at or above a confidence as a share of all objects, and as a share of the answers there.</summary>
    public (double Completeness, double Purity) Cut(double confidence)
    {
        var kept = Members.Where(m => m.Answer.Confidence >= confidence).ToArray();
        var right = kept.Count(m => m.Right);
        return ((double)right / Members.Count, kept.Length == 0 ? double.NaN : (double)right / kept.Length);
    }
}
