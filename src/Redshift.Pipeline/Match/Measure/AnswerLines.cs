using Redshift.Pipeline.Detect;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>Measures every line of an answer, says how each stands, and accounts for the evidence.</summary>
internal sealed class AnswerLines
{
    /// <summary>Stars show a line nearly everywhere; only the listed ones that are strongest in the computed spectrum are reported.</summary>
    private const int MostStellarLines = 40;

    /// <summary>A rung so many σ and km/s off the ladder is remarked on.</summary>
    private const double OffLadderSigma = 5;
    private const double OffLadderKmS = 50;

    /// <summary>A feature that its own fit does not find at this signal to noise was a wave of the continuum.</summary>
    private const double LeastFeature = 4;

    /// <summary>
    /// The lines of the ladder: not H epsilon, which blends with Ca II H, nor H8 with He I 3889 and what follows, nor Paschen lines that
    /// blend with Ca II and crowd to their limit.
    /// </summary>
    private static readonly HashSet<string> LadderLines =
        ["Ly alpha", "H alpha", "H beta", "H gamma", "H delta", "Pa alpha", "Pa beta", "Pa gamma", "Pa delta", "Br alpha", "Br beta", "Br gamma", "Br delta"];

    private readonly NormalizedObservation _observation;
    private readonly MatchResult _match;
    private readonly NativeModel _native;
    private readonly Refined _answer;
    private readonly LineMeasurer _measurer;
    private readonly LineReport _report;

    private AnswerLines(NormalizedObservation observation, MatchResult match, NativeModel native)
    {
        (_observation, _match, _native, _answer) = (observation, match, native, match.Decision.Answer.Fit);
        _measurer = new(observation, native);
        _report = new(observation.FluxScale, _answer.LnShift, s => observation.Spectra[s].Original.FluxUnit);
    }

    private bool IsStar => _answer.Model.Kind == ObjectKind.Star;

    private string SpectralType => _answer.Model.Template?.SpectralType ?? "";

    /// <summary>Measures an answer.</summary>
    /// <param name="observation">The observation.</param>
    /// <param name="match">The answer.</param>
    /// <param name="native">The answer's model at native pixels.</param>
    public static Measurement Measure(NormalizedObservation observation, MatchResult match, NativeModel native) => new AnswerLines(observation, match, native).Measure();

    private Measurement Measure()
    {
        var blends = Blends.Group(LineSelection.For(_answer), _measurer.InstrumentSigma, Rank);
        var measured = Strongest(_measurer.Measure([.. blends.Select(b => b.Leader)]));
        var standing = measured.ConvertAll(m => (Line: m, State: LineStates.Of(m, IsStar && !SpectralType.EndsWith('e'))));
        var present = standing.FindAll(s => s.State is LineState.Matched or LineState.ExpectedMissing);
        var ladder = LadderFit.Of([.. present.Where(s => s.State == LineState.Matched).Select(s => RungOf(s.Line)).OfType<Rung>()]);
        var (gains, other) = Reasons.Divide(_native.Pixels.LnWavelength, _native.PixelGains(), present.ConvertAll(s => WindowOf(s.Line)));

        var rows = present.Select((s, i) => _report.Write(s.Line, s.State!.Value, gains[i] / _match.Excess, Remark(s.Line, s.State.Value, ladder))).ToList();
        var known = PrincipalLines.Of(_answer.Model.Kind);
        var cautions = LineCautions.Of(_answer.Model.Kind, measured.Count(m => m.Data is not null && known.Contains(m.Target.Line.Name)), rows).ToList();
        var counted = rows.Sum(r => r.LnLikelihoodGain!.Value) + other / _match.Excess;
        rows.AddRange(Masked(measured));
        rows.AddRange(Hidden(blends, present));
        rows.AddRange(Unexplained([.. present.Where(s => s.State == LineState.Matched).Select(s => s.Line.Data!)]));
        var expected = standing.FindAll(s => LineStates.IsExpected(s.Line));
        return new(
            [.. rows.OrderBy(r => r.RestVacuumA ?? r.ObservedVacuumA / Math.Exp(_answer.LnShift)).ThenBy(r => r.Line, StringComparer.Ordinal)],
            expected.Count, expected.Count(s => s.State == LineState.Matched), ladder,
            other / _match.Excess, _match.Decision.Candidates[0].LnEvidence - counted, cautions);
    }

    private int Rank(LineTarget target) => LineSelection.Rank(target.Line, _measurer.IsEmission(target.Centre), _answer);

    private List<MeasuredLine> Strongest(List<MeasuredLine> lines) => !IsStar || lines.Count <= MostStellarLines ? lines
        : [.. lines.OrderByDescending(l => Math.Abs(l.Predicted?.EquivalentWidth ?? 0)).Take(MostStellarLines).OrderBy(l => l.Target.Centre)];

    private static LineWindow WindowOf(MeasuredLine line) => new(line.Target.Centre, line.Sigma, line.Predicted?.Amplitude ?? line.Data?.Amplitude ?? 0);

    private static Rung? RungOf(MeasuredLine line) => !LadderLines.Contains(line.Target.Line.Name) ? null
        : new(line.Target.Line.VacuumAngstrom, Math.Exp(line.Data!.Centre), Math.Exp(line.Data.Centre) * line.Data.CentreErr);

    private string Remark(MeasuredLine line, LineState state, LadderFit? ladder)
    {
        if (state == LineState.ExpectedMissing) return "";
        if (IsStar && line.Expected < -5 && line.Data!.Amplitude > 0) return "in emission";
        if (ladder is null || RungOf(line) is not { } rung) return "";
        double off = ladder.ResidualKmS(rung), error = LineReport.OffsetErrKmS(line);
        return Math.Abs(off) < Math.Max(OffLadderKmS, OffLadderSigma * error) ? "" : string.Create(
            System.Globalization.CultureInfo.InvariantCulture, $"off the ladder by {off:+0;-0} km/s");
    }

    private IEnumerable<LineMeasurement> Masked(List<MeasuredLine> measured)
    {
        var known = PrincipalLines.Of(_answer.Model.Kind);
        return measured.Where(m => m.Data is null && known.Contains(m.Target.Line.Name)).Select(m => _report.Write(m, LineState.Masked, null, ""));
    }

    private static IEnumerable<LineMeasurement> Hidden(List<Blend> blends, List<(MeasuredLine Line, LineState? State)> present)
    {
        var matched = present.Where(s => s.State == LineState.Matched).Select(s => s.Line.Target).ToHashSet();
        return blends.Where(b => matched.Contains(b.Leader)).SelectMany(b => b.Others.Select(o => LineReport.WriteHidden(o, $"with {b.Leader.Line.Name}")));
    }

    private IEnumerable<LineMeasurement> Unexplained(List<FittedLine> matched)
    {
        foreach (var feature in UnexplainedFeatures.Select(FeatureFinder.Find(_observation), _native, matched))
            if (_measurer.MeasureFeature(feature.LnWavelength, feature.SigmaLn) is var (line, instrument, spectrum) && Math.Abs(line.Significance) > LeastFeature)
                yield return _report.Write(feature, line, instrument, spectrum);
    }
}
