using Redshift.Pipeline.Results;

namespace Redshift.Evaluation;

/// <summary>Writes what the pipeline knew of each answer beside whether it was right, to fit the map from evidence to confidence.</summary>
internal sealed class FeatureFile : IDisposable
{
    private readonly StreamWriter _writer;

    public FeatureFile(string path)
    {
        _writer = new(path) { NewLine = "\n" };
        _writer.WriteLine(
            "name,row,setup,object_class,truth_kind,truth_z,true_snr,z,z_err,kind,kind_confidence,confidence,ln_odds,ln_odds_features,misfit,snr_pixel,snr_angstrom,noise_scale,resolution,lines_expected,lines_matched,"
            + "best_ln_evidence,second_ln_evidence,next_kind,next_z,next_ln_evidence,next_confidence,has_errors,arms,pixels,first_a,last_a,template,cautions,dv_km_s,right,kind_right,milliseconds");
    }

    public void Add(ObservationResult result, Judgement judgement)
    {
        var (truth, answer, observation) = (judgement.Truth, judgement.Answer, result.Observation);
        var kindRight = string.Equals(answer.Kind, truth.Kind.ToString(), StringComparison.OrdinalIgnoreCase);
        _writer.WriteLine(FormattableString.Invariant(
            $"{judgement.Source},{judgement.Row},{truth.Group},{truth.ObjectClass},{truth.Kind},{truth.Z:R},{truth.Snr:0.###},{answer.Z:R},{answer.ZErr:R},{answer.Kind},{result.KindConfidence:R},{answer.Confidence:R},{result.LnOdds:R},{result.LnOddsFeatures:R},{result.Misfit:R},")
            + FormattableString.Invariant(
            $"{result.SnrPixel:0.####},{result.SnrAngstrom:0.####},{result.NoiseScale:0.####},{result.Resolution:0.#},{result.LinesExpected},{result.LinesMatched},{Evidence(result, 0):R},{Evidence(result, 1):R},")
            + FormattableString.Invariant(
            $"{result.Next?.Kind},{result.Next?.Z:R},{result.Next?.LnEvidence:R},{result.NextConfidence:R},{(observation.Spectra[0].HasErrors ? 1 : 0)},{observation.Spectra.Count},{observation.Spectra.Sum(s => s.Count)},{observation.Spectra[0].Wavelength[0]:0.#},{observation.Spectra[^1].Wavelength[^1]:0.#},")
            + FormattableString.Invariant(
            $"{(result.Candidates.Count > 0 ? result.Candidates[0].Template.Replace(',', ' ') : "")},{string.Join(';', result.Cautions)},{judgement.DvKmS:0.#},{(judgement.Right ? 1 : 0)},{(kindRight ? 1 : 0)},{answer.Milliseconds:0.###}"));
    }

    public void Dispose() => _writer.Dispose();

    private static double? Evidence(ObservationResult result, int i) => result.Candidates.Count > i ? result.Candidates[i].LnEvidence : null;
}
