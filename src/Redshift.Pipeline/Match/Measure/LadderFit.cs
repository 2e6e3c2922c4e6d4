using Redshift.Physics.Units;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>A hydrogen line of the ladder.</summary>
/// <param name="RestA">Computed rest wavelength in vacuum, Å.</param>
/// <param name="ObservedA">Measured wavelength in vacuum, Å.</param>
/// <param name="ErrA">1σ of the measured wavelength, Å.</param>
internal readonly record struct Rung(double RestA, double ObservedA, double ErrA);

/// <summary>
/// Observed against computed wavelengths of hydrogen: a straight line whose slope is 1+z and whose intercept is the error of the wavelength
/// zero point, in Å alike for all lines; a constant error in velocity cannot be told from a redshift.
/// </summary>
internal sealed record LadderFit
{
    /// <summary>Fewest lines: two unknowns and one check.</summary>
    public const int FewestRungs = 3;

    /// <summary>1+z from the slope.</summary>
    public required double Slope { get; init; }

    /// <summary>Zero-point error in Å.</summary>
    public required double InterceptA { get; init; }

    /// <summary>1σ of the slope.</summary>
    public required double SlopeErr { get; init; }

    /// <summary>1σ of the zero point in Å.</summary>
    public required double InterceptErrA { get; init; }

    /// <summary>Mean observed wavelength, Å: where the zero point is expressed as a velocity.</summary>
    public required double MeanA { get; init; }

    /// <summary>The zero point as a velocity at the mean wavelength, km/s.</summary>
    public double ZeroPointKmS => Velocity.SpeedOfLightKmS * InterceptA / MeanA;

    /// <summary>1σ of the zero point, km/s.</summary>
    public double ZeroPointErrKmS => Velocity.SpeedOfLightKmS * InterceptErrA / MeanA;

    /// <summary>How far a rung is off the ladder, km/s.</summary>
    public double ResidualKmS(Rung rung) => Velocity.SpeedOfLightKmS * (rung.ObservedA - InterceptA - Slope * rung.RestA) / (Slope * rung.RestA);

    /// <summary>Fits the ladder by weighted least squares; errors grow where the rungs scatter more than they say.</summary>
    /// <returns>The fit, or null with fewer than three lines.</returns>
    public static LadderFit? Of(IReadOnlyList<Rung> rungs)
    {
        if (rungs.Count < FewestRungs) return null;
        double weight = rungs.Sum(Weight), rest = rungs.Sum(r => Weight(r) * r.RestA) / weight, observed = rungs.Sum(r => Weight(r) * r.ObservedA) / weight;
        var spread = rungs.Sum(r => Weight(r) * (r.RestA - rest) * (r.RestA - rest));
        var slope = rungs.Sum(r => Weight(r) * (r.RestA - rest) * (r.ObservedA - observed)) / spread;
        var intercept = observed - slope * rest;
        var chi2 = rungs.Sum(r => Weight(r) * Math.Pow(r.ObservedA - intercept - slope * r.RestA, 2));
        var excess = Math.Sqrt(Math.Max(1, chi2 / (rungs.Count - 2)));
        return new()
        {
            Slope = slope,
            InterceptA = intercept,
            SlopeErr = excess / Math.Sqrt(spread),
            InterceptErrA = excess * Math.Sqrt(1 / weight + rest * rest / spread),
            MeanA = observed,
        };
    }

    private static double Weight(Rung rung) => 1 / (rung.ErrA * rung.ErrA);
}
