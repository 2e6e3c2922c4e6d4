using Redshift.Physics.Units;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>What is expected before the spectrum is seen; broad, and not the object mix of any survey.</summary>
internal static class RedshiftPrior
{
    /// <summary>Resolving power of the surveys of faint objects, at most.</summary>
    private const double OrdinaryResolution = 4000;

    /// <summary>
    /// A window so narrow in ln λ, or an echelle order, at high resolving power is laid on a line that is known beforehand: on a star. Nobody
    /// looks there for a galaxy of unknown redshift, whose broad lines moreover would be as wide as the order and its blaze (common practice).
    /// </summary>
    private const double NarrowRange = 0.08;
    private const double NarrowPenalty = 60;

    /// <summary>Prior weight of reflected sunlight with cometary bands: few of the bodies that look like the Sun are comets.</summary>
    private const double CometShare = 0.002;

    /// <summary>ln prior of a galaxy or quasar at the velocities of stars.</summary>
    private const double NearestPenalty = -5000;

    private const double KmSPerLn = Velocity.SpeedOfLightKmS;

    /// <summary>ln of the prior density in ln(1+z) of a kind at a redshift, weight of the kind included.</summary>
    /// <param name="kind">The kind.</param>
    /// <param name="lnShift">ln(1+z).</param>
    /// <param name="light">How the light was spread.</param>
    /// <param name="settings">Shares of the kinds, and what the user expects.</param>
    public static double LnDensity(ObjectKind kind, double lnShift, SpreadOfLight light, MatchSettings settings) => kind switch
    {
        ObjectKind.Star => Math.Log(settings.PriorStar) + Velocities(lnShift * KmSPerLn, 60, 200),
        ObjectKind.Nebula => Math.Log(settings.PriorNebula) + Velocities(lnShift * KmSPerLn, 40, 120),
        ObjectKind.Galaxy => Math.Log(settings.PriorGalaxy) + Flat(lnShift, 1.2) + Distant(lnShift, settings) + Faint(light),
        ObjectKind.Quasar => Math.Log(settings.PriorQuasar) + Flat(lnShift, 0.4) + Distant(lnShift, settings) + Faint(light),
        _ => Math.Log(CometShare) + Velocities(lnShift * KmSPerLn, 40, 120),
    };

    /// <summary>Disc and halo: two normal distributions of equal weight.</summary>
    private static double Velocities(double kmS, double narrow, double wide) =>
        Math.Log(KmSPerLn * (0.5 * Normal(kmS, narrow) + 0.5 * Normal(kmS, wide)) + 1e-12);

    /// <summary>
    /// Next to nothing extragalactic is found among the velocities of stars (a few members of the Local Group), while a mixture of stars fits
    /// a star better than one computed star does: such redshifts are stars' unless the user expects otherwise.
    /// </summary>
    private static double Distant(double lnShift, MatchSettings settings)
    {
        var kmS = lnShift * KmSPerLn;
        if (settings.Expect is not null || kmS > 900) return 0;
        return kmS < 600 ? NearestPenalty : NearestPenalty * (900 - kmS) / 300;
    }

    /// <summary>
    /// High resolving power spreads the light thin and is spent on bright objects, which are stars. The share of others falls faster the higher
    /// it is, and the plainer the light is seen: a faint object may well be a galaxy on a large telescope (common practice; the numbers are rough,
    /// and small against the evidence of a real galaxy's lines).
    /// </summary>
    private static double Faint(SpreadOfLight light)
    {
        var excess = Math.Max(0, Math.Log(light.Resolution / OrdinaryResolution));
        var narrow = light.Range < NarrowRange ? NarrowPenalty * Math.Min(1, excess) : 0;
        return -(12 * excess * excess + narrow) * Math.Min(1, light.Snr / 10);
    }

    private static double Normal(double x, double sigma) => Math.Exp(-0.5 * x * x / (sigma * sigma)) / (sigma * 2.5066282746310002);

    /// <summary>Exponential in ln(1+z), so gentle that it only breaks ties: fainter objects are observed less often.</summary>
    private static double Flat(double lnShift, double slope) => -slope * Math.Max(0, lnShift) + Math.Log(slope / (1 - Math.Exp(-slope * 2.14)));
}
