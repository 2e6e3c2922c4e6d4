using Redshift.Physics.Statistics;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Inject;

/// <summary>What the pipeline knew of one answer, and whether the answer was right.</summary>
/// <param name="Kind">Kind of the answer.</param>
/// <param name="LnOdds">ln odds of the answer against its rivals.</param>
/// <param name="Misfit">How badly the best model fits.</param>
/// <param name="Within">Chance that the stated error keeps within the tolerance.</param>
/// <param name="Right">Whether the redshift was right.</param>
internal sealed record CalibrationCase(ObjectKind Kind, double LnOdds, double Misfit, double Within, bool Right)
{
    /// <summary>The kinds that have a map of their own; all others share that of stars.</summary>
    public ObjectKind MapKind => Kind is ObjectKind.Galaxy or ObjectKind.Quasar ? Kind : ObjectKind.Star;

    /// <summary>What a map would say of the answer.</summary>
    public Forecast Forecast(ConfidenceMap map) => new(map.Confidence(LnOdds, Misfit, Within), Right);
}
