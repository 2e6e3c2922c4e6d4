using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>The maps from evidence to confidence, by the kind of the answer.</summary>
public sealed record ConfidenceMaps
{
    /// <summary>For answers that are galaxies.</summary>
    public ConfidenceMap Galaxy { get; init; } = Calibration.Galaxies;

    /// <summary>For quasars.</summary>
    public ConfidenceMap Quasar { get; init; } = Calibration.Quasars;

    /// <summary>For stars and all else.</summary>
    public ConfidenceMap Other { get; init; } = Calibration.Others;

    /// <summary>The map of a kind.</summary>
    public ConfidenceMap Of(ObjectKind kind) => kind switch
    {
        ObjectKind.Galaxy => Galaxy,
        ObjectKind.Quasar => Quasar,
        _ => Other,
    };
}
