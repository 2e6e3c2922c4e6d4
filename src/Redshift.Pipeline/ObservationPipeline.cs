using Redshift.Physics.Units;
using Redshift.Pipeline.Match;
using Redshift.Pipeline.Match.Measure;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline;

/// <summary>The stages between reading and reporting: normalize, detect, match. One instance serves one worker thread.</summary>
public sealed class ObservationPipeline(PipelineSettings settings)
{
    private readonly Matcher _matcher = new(settings.Match);

    /// <summary>Analyses one observation; the result depends on nothing but the observation and the settings.</summary>
    /// <param name="observation">The observation as read.</param>
    /// <returns>The answer, or the verdict that there is nothing.</returns>
    public ObservationResult Analyze(Observation observation)
    {
        var normalized = Normalizer.Normalize(observation);
        var result = Describe(normalized);
        return normalized.Spectra.Count > 0 && _matcher.Match(normalized) is { } match ? Answer(result, normalized, match) : result;
    }

    private static ObservationResult Describe(NormalizedObservation normalized) => new()
    {
        Observation = normalized.Observation,
        Verdict = Verdict.Nothing,
        Kind = ObjectKind.Unknown,
        SnrPixel = normalized.SnrPixel,
        SnrAngstrom = normalized.SnrAngstrom,
        NoiseScale = normalized.NoiseScale,
        Resolution = normalized.Resolution,
        ResolutionFrom = normalized.Spectra.Count > 0 ? normalized.Spectra[0].Original.ResolutionFrom : ResolutionSource.Estimate,
        Cautions = [.. normalized.Observation.Cautions, .. NoiseCautions(normalized)],
    };

    private static IEnumerable<string> NoiseCautions(NormalizedObservation normalized)
    {
        if (normalized.Spectra.Any(s => !s.Original.HasErrors)) yield return "noise-from-residuals";
        if (normalized.Spectra.Any(s => s.Noise.Scale != 1)) yield return "errors-rescaled";
        if (normalized.Spectra.Any(s => s.Original.FwhmKmS is null)) yield return "resolution-estimated";
    }

    private ObservationResult Answer(ObservationResult result, NormalizedObservation normalized, MatchResult match)
    {
        var decision = match.Decision;
        var fit = decision.Answer.Fit;
        var error = RedshiftError.Of(fit, normalized.Resolution, result.ResolutionFrom != ResolutionSource.Estimate);
        var tolerance = PosteriorSum.ToleranceKmS(fit.Model.Kind, normalized.Resolution);
        var within = Calibration.Within(error * Velocity.SpeedOfLightKmS, tolerance);
        var confidence = settings.Match.Confidence.Of(fit.Model.Kind).Confidence(decision.LnOdds, match.Misfit, within);
        var verdict = Calibration.Verdict(confidence, decision.LnOddsFeatures, normalized.HasContinuum);
        result = result with { Verdict = verdict, Confidence = confidence, LnOdds = decision.LnOdds, LnOddsFeatures = decision.LnOddsFeatures, Misfit = match.Misfit, Candidates = decision.Candidates };
        if (verdict == Verdict.Nothing) return result;
        var z = Math.Exp(fit.LnShift) - 1;
        var native = NativeModel.Fit(normalized, fit, match.Error);
        return AnswerLines.Measure(normalized, match, native).AddTo(result with
        {
            Kind = fit.Model.Kind,
            KindConfidence = confidence * decision.KindShare,
            Z = z,
            ZFile = z,
            ZErr = error * (1 + z),
            SpectralType = fit.Model.Template?.SpectralType ?? "",
            SpectralTypeErr = SpectralTypeError.Of(match, normalized.Spectra, tolerance),
            Next = decision.Next,
            NextConfidence = decision.Next is null ? null : (1 - confidence) * decision.NextShare,
            Curves = Curves(normalized, native),
            Cautions = [.. result.Cautions, .. AnswerCautions(confidence, decision)],
        });
    }

    private static IEnumerable<string> AnswerCautions(double confidence, Decision decision)
    {
        if (confidence < 0.99 && decision.LnOdds < 3) yield return "rival-redshift";
    }

    /// <summary>The answer's model at the native pixels of every spectrum.</summary>
    private static List<ModelCurve> Curves(NormalizedObservation normalized, NativeModel native)
    {
        var curves = new List<ModelCurve>();
        for (var s = 0; s < normalized.Spectra.Count; s++) curves.Add(Curve(normalized.Spectra[s], native.ModelOf(s), normalized.FluxScale));
        return curves;
    }

    private static ModelCurve Curve(NormalizedSpectrum spectrum, ReadOnlySpan<float> model, double scale)
    {
        var count = spectrum.Original.Count;
        double[] continuum = new double[count], full = new double[count], sigma = new double[count];
        Array.Fill(sigma, double.PositiveInfinity);
        var nearest = spectrum.NearestToOriginal();
        for (var i = 0; i < count; i++)
        {
            var near = nearest[i];
            continuum[i] = spectrum.Continuum[near] * scale;
            full[i] = model[near] * scale;
            if (spectrum.Original.InverseVariance[i] > 0 && spectrum.Weight[near] > 0) sigma[i] = scale / Math.Sqrt(spectrum.Weight[near]);
        }

        return new(continuum, full, sigma);
    }
}
