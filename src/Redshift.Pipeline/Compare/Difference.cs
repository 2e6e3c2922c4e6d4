using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Compare;

/// <summary>A row of either table, or of both.</summary>
/// <param name="Old">The old row; null where the row was added.</param>
/// <param name="New">The new row; null where it is missing.</param>
public sealed record Difference(ComparedRow? Old, ComparedRow? New)
{
    /// <summary>Velocity of the new redshift against the old, c(z−z_old)/(1+z_old); null where one of them is unknown.</summary>
    public double? OffsetKmS { get; } = Old?.Z is { } old && New?.Z is { } z
        ? Velocity.Between(RedshiftValue.FromZ(z), RedshiftValue.FromZ(old)).KmS
        : null;

    /// <summary>How far the redshifts may lie apart and still be the same, by the kind that the new row answers, or else the old one.</summary>
    public double ToleranceKmS { get; } = PosteriorSum.ToleranceKmS(Kind(New, Old), New?.Resolution ?? Old?.Resolution ?? double.PositiveInfinity);

    /// <summary>Whether the redshifts are not the same.</summary>
    public bool IsOutlier => Math.Abs(OffsetKmS ?? 0) > ToleranceKmS;

    /// <summary>What changed, in words; empty where nothing did.</summary>
    public IReadOnlyList<string> Changes => [.. Words()];

    private IEnumerable<string> Words()
    {
        if (Old is null || New is null)
        {
            yield return Old is null ? "added" : "missing";
            yield break;
        }

        if (IsOutlier)
            yield return "outlier";
        else if (OffsetKmS is not null and not 0)
            yield return "moved";
        else if (Old.Z is null != New.Z is null)
            yield return Old.Z is null ? "z-gained" : "z-lost";
        if (Differ(Old.Kind, New.Kind))
            yield return "kind";
        if (Differ(Old.Verdict, New.Verdict))
            yield return "verdict";
    }

    // A table of known redshifts may say nothing of kinds and verdicts.
    private static bool Differ(string old, string now) => old.Length > 0 && now.Length > 0 && old != now;

    private static ObjectKind Kind(params ReadOnlySpan<ComparedRow?> rows)
    {
        foreach (var row in rows)
        {
            if (row is not null && Report.Words.Kinds.TryGetValue(row.Kind, out var kind))
                return kind;
        }

        return ObjectKind.Unknown;
    }
}
