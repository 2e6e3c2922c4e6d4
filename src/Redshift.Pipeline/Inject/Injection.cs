using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Inject;

/// <summary>What became of one object that was put into a spectrum.</summary>
public sealed record Injection
{
    /// <summary>Which injection, from 0.</summary>
    public required int Index { get; init; }

    /// <summary>File of the spectrum that gave the instrument.</summary>
    public required string Source { get; init; }

    /// <summary>Spectrum of the file.</summary>
    public required int Row { get; init; }

    /// <summary>What was put in.</summary>
    public required ObjectKind Kind { get; init; }

    /// <summary>The same in a few words.</summary>
    public required string Description { get; init; }

    /// <summary>Its redshift, in the frame of the spectrum.</summary>
    public required double Z { get; init; }

    /// <summary>Median signal to noise a pixel.</summary>
    public required double Snr { get; init; }

    /// <summary>The kind that was found.</summary>
    public required ObjectKind FoundKind { get; init; }

    /// <summary>The redshift that was found; null for none.</summary>
    public required double? FoundZ { get; init; }

    /// <summary>1σ of it.</summary>
    public required double? FoundZErr { get; init; }

    /// <summary>Stated probability that the redshift is right; 0 without a redshift.</summary>
    public required double Confidence { get; init; }

    /// <summary>The verdict.</summary>
    public required Verdict Verdict { get; init; }

    /// <summary>How far off the redshift of this kind may be and still count as right, km/s.</summary>
    public required double ToleranceKmS { get; init; }

    /// <summary>ln odds of the answer against its rivals.</summary>
    public double LnOdds { get; init; }

    /// <summary>How badly the best model fits.</summary>
    public double Misfit { get; init; }

    /// <summary>Chance that the stated error keeps within the tolerance of the kind that was found.</summary>
    public double Within { get; init; }

    /// <summary>c (found − z) / (1 + z) in km/s.</summary>
    public double? OffsetKmS => Velocity.SpeedOfLightKmS * (FoundZ - Z) / (1 + Z);

    /// <summary>Offset over its stated error.</summary>
    public double? Pull => FoundZErr is > 0 ? (FoundZ - Z) / FoundZErr : null;

    /// <summary>Whether the redshift is right.</summary>
    public bool IsGood => OffsetKmS is { } offset && Math.Abs(offset) <= ToleranceKmS;

    /// <summary>Whether the answer was to be relied upon: likely or firm.</summary>
    public bool IsConfident => Verdict is Verdict.Likely or Verdict.Firm;

    /// <summary>The confidence as a forecast of <see cref="IsGood"/>.</summary>
    public Forecast Forecast => new(Confidence, IsGood);

    /// <summary>What the confidence rests on; null without a redshift.</summary>
    internal CalibrationCase? Answer => FoundZ is null ? null : new(FoundKind, LnOdds, Misfit, Within, IsGood);

    internal static Injection Of(Injected injected, ObservationResult result) => new()
    {
        Index = injected.Index,
        Source = injected.Giver.Source,
        Row = injected.Giver.Row,
        Kind = injected.Target.Kind,
        Description = injected.Description,
        Z = injected.Target.Z,
        Snr = injected.Snr,
        FoundKind = result.Kind,
        FoundZ = result.ZFile,
        FoundZErr = result.ZErr,
        Confidence = result.ZFile is null ? 0 : result.Confidence,
        Verdict = result.Verdict,
        ToleranceKmS = Tolerance(injected.Target.Kind, result),
        LnOdds = result.LnOdds,
        Misfit = result.Misfit,
        Within = result is { ZFile: { } z, ZErr: { } error } ? Calibration.Within(Velocity.SpeedOfLightKmS * error / (1 + z), Tolerance(result.Kind, result)) : 0,
    };

    private static double Tolerance(ObjectKind kind, ObservationResult result) =>
        PosteriorSum.ToleranceKmS(kind, result.Resolution ?? double.PositiveInfinity);
}
