using Redshift.Physics.Statistics;
using Redshift.Pipeline.Results;
using Redshift.Simulation;

namespace Redshift.Evaluation;

/// <summary>What an object really is, from a simulation or a truth table.</summary>
/// <param name="Kind">Its kind.</param>
/// <param name="Z">Its redshift, null where there is none to be found.</param>
/// <param name="ObjectClass">Finer class.</param>
/// <param name="Group">Set-up or folder.</param>
/// <param name="Snr">Signal to noise a pixel, where known.</param>
/// <param name="LeastToleranceKmS">What the truth itself is worth.</param>
internal sealed record Truth(TruthKind Kind, double? Z, string ObjectClass, string Group, double Snr, double LeastToleranceKmS = 0);

/// <summary>What the catalogue says.</summary>
internal sealed record Answer(double? Z, double? ZErr, double Confidence, string Kind, double? Resolution, double Milliseconds)
{
    /// <summary>The answer of a run. A confidence that is no number is taken as a claim of certainty, so that it costs what it deserves.</summary>
    public static Answer From(ObservationResult result, double milliseconds) =>
        new(result.Z, result.ZErr, result.Z is null ? 0 : double.IsNaN(result.Confidence) ? 1 : result.Confidence, Lower(result.Kind), result.Resolution, milliseconds);

    /// <summary>The catalogue's word for a kind.</summary>
    public static string Lower(ObjectKind kind) => kind switch
    {
        ObjectKind.Star => "star",
        ObjectKind.Galaxy => "galaxy",
        ObjectKind.Quasar => "quasar",
        ObjectKind.Nebula => "nebula",
        _ => "unknown",
    };
}

/// <summary>An answer held against the truth.</summary>
internal sealed record Judgement(string Source, int Row, Truth Truth, Answer Answer)
{
    private const double C = 299792.458;

    /// <summary>Velocity of the answer against the truth, km/s: c (z − truth) / (1 + truth).</summary>
    public double? DvKmS => Answer.Z is { } z && Truth.Z is { } truth ? C * (z - truth) / (1 + truth) : null;

    /// <summary>Stars 100 km/s or half a resolution element, galaxies and nebulae 1000 km/s, quasars 3000 km/s.</summary>
    public double ToleranceKmS => Math.Max(Truth.LeastToleranceKmS, Truth.Kind switch
    {
        TruthKind.Star => Math.Max(100, 0.5 * C / (Answer.Resolution ?? double.PositiveInfinity)),
        TruthKind.Quasar => 3000,
        _ => 1000,
    });

    /// <summary>Whether the redshift is right.</summary>
    public bool Right => Math.Abs(DvKmS ?? double.PositiveInfinity) <= ToleranceKmS;

    /// <summary>Whether there was a redshift to find.</summary>
    public bool HasTruth => Truth.Z is not null && Truth.Kind is not (TruthKind.Blank or TruthKind.Oddity);

    /// <summary>Error over stated error.</summary>
    public double? Pull => DvKmS is { } dv && Answer.ZErr is > 0 ? dv / (C * Answer.ZErr.Value / (1 + Truth.Z!.Value)) : null;

    /// <summary>The confidence as a forecast of <see cref="Right"/>.</summary>
    public Forecast Forecast => new(Answer.Confidence, Right);
}
