using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Fit;

namespace Redshift.Pipeline.Match.Search;

/// <summary>A place worth fitting exactly.</summary>
/// <param name="Model">The model that did best there.</param>
/// <param name="LnShift">ln(1+z).</param>
/// <param name="LnEvidence">ln evidence of the search.</param>
internal readonly record struct Peak(FitModel Model, double LnShift, double LnEvidence)
{
    /// <summary>The peaks from the highest down, without those nearer than a separation in km/s to a higher one.</summary>
    public static List<Peak> OnePerPlace(IEnumerable<Peak> peaks, double separationKmS)
    {
        var kept = new List<Peak>();
        foreach (var peak in peaks.OrderByDescending(p => p.LnEvidence))
            if (!kept.Exists(k => Math.Abs(k.LnShift - peak.LnShift) * Velocity.SpeedOfLightKmS < separationKmS)) kept.Add(peak);
        return kept;
    }
}
