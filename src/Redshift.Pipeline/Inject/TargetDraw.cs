using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Inject;

/// <summary>What is put into a spectrum.</summary>
/// <param name="Kind">The kind.</param>
/// <param name="Z">The redshift.</param>
internal readonly record struct TargetDraw(ObjectKind Kind, double Z)
{
    /// <summary>Stars of our Galaxy: σ of their velocities along the line of sight.</summary>
    private const double StarsKmS = 120;

    // A spectrum that shows nothing longward of these wavelengths at rest says nothing of a redshift.
    private const double GalaxyNeedsA = 1500;
    private const double QuasarNeedsA = 1400;

    private const double HighestGalaxy = 5;
    private const double HighestQuasar = 6.5;

    /// <summary>
    /// Draws a kind (stars, galaxies and quasars in the shares of their priors; or the one that is expected) and its redshift: normal for
    /// what belongs to our Galaxy, else even in ln(1+z) over the redshifts that are searched and that the spectrum covers.
    /// </summary>
    public static TargetDraw Draw(Observation observation, MatchSettings settings, RandomSource random)
    {
        var kind = settings.Expect ?? DrawKind(settings, random.Uniform());
        var (low, high) = Range(kind, observation, settings);
        return high > low
            ? new(kind, (1 + low) * Math.Pow((1 + high) / (1 + low), random.Uniform()) - 1)
            : new(kind, Math.Clamp(random.Normal(0, StarsKmS / Velocity.SpeedOfLightKmS), settings.ZMin, settings.ZMax));
    }

    private static ObjectKind DrawKind(MatchSettings settings, double share)
    {
        var all = settings.PriorStar + settings.PriorGalaxy + settings.PriorQuasar;
        return share * all < settings.PriorStar ? ObjectKind.Star : share * all < settings.PriorStar + settings.PriorGalaxy ? ObjectKind.Galaxy : ObjectKind.Quasar;
    }

    private static (double Low, double High) Range(ObjectKind kind, Observation observation, MatchSettings settings)
    {
        var longest = observation.Spectra.Max(s => s.Wavelength[^1]);
        var (low, high) = kind switch
        {
            ObjectKind.Galaxy => (0.002, Math.Min(HighestGalaxy, longest / GalaxyNeedsA - 1)),
            ObjectKind.Quasar => (0.05, Math.Min(HighestQuasar, longest / QuasarNeedsA - 1)),
            _ => (0, 0),
        };
        return (Math.Max(low, settings.ZMin), Math.Min(high, settings.ZMax));
    }
}
