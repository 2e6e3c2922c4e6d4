using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>What measuring at the answer gives.</summary>
/// <param name="Lines">The rows, by rising rest wavelength.</param>
/// <param name="Expected">Lines that should be seen.</param>
/// <param name="Matched">How many of those are.</param>
/// <param name="Ladder">The ladder fit, where there are enough hydrogen lines.</param>
/// <param name="OtherFeatures">Gain in ln likelihood outside all line windows.</param>
/// <param name="PriorAndVolume">What is left of the answer's ln evidence: priors and the volume of the posterior.</param>
/// <param name="Cautions">What a person should check.</param>
internal sealed record Measurement(
    IReadOnlyList<LineMeasurement> Lines, int Expected, int Matched, LadderFit? Ladder, double OtherFeatures, double PriorAndVolume,
    IReadOnlyList<string> Cautions)
{
    /// <summary>The result with the measurements.</summary>
    public ObservationResult AddTo(ObservationResult result) => result with
    {
        Lines = Lines,
        LinesExpected = Expected,
        LinesMatched = Matched,
        ZeroPointKmS = Ladder?.ZeroPointKmS,
        ZeroPointErrKmS = Ladder?.ZeroPointErrKmS,
        OtherFeaturesLnGain = OtherFeatures,
        PriorAndVolumeLnGain = PriorAndVolume,
        Cautions = [.. result.Cautions, .. Cautions],
    };
}
