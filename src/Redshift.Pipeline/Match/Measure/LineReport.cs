using Redshift.Physics.Lines;
using Redshift.Physics.Profiles;
using Redshift.Physics.Units;
using Redshift.Pipeline.Detect;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>Puts fitted lines into the units of the file and of the observer.</summary>
internal sealed class LineReport(double fluxScale, double lnShift, Func<int, string> fluxUnit)
{
    /// <summary>σ that an upper limit stands for.</summary>
    private const double LimitSigma = 3;

    /// <summary>A continuum of less signal to noise gives no equivalent width.</summary>
    private const double FaintestContinuum = 2;

    /// <summary>A measured line, or the limit of a missing one.</summary>
    public LineMeasurement Write(MeasuredLine line, LineState state, double? gain, string note)
    {
        var named = Named(line.Target.Line, state, note) with { LnLikelihoodGain = gain, FluxUnit = fluxUnit(line.Spectrum) };
        return state switch
        {
            LineState.Masked => named,
            LineState.ExpectedMissing => named with { Flux = line.Data!.Flux * fluxScale, FluxErr = LimitSigma * line.Data.FluxErr * fluxScale },
            _ => Measured(named, line.Data!, line.InstrumentSigma) with
            {
                OffsetKmS = OffsetKmS(line),
                OffsetErrKmS = OffsetErrKmS(line),
            },
        };
    }

    /// <summary>A line hidden in another.</summary>
    public static LineMeasurement WriteHidden(SpectralLine line, string note) => Named(line, LineState.Blended, note);

    /// <summary>A feature without a name.</summary>
    public LineMeasurement Write(Feature feature, FittedLine line, double instrument, int spectrum) =>
        Measured(new() { Line = "unidentified", Family = "unidentified", State = LineState.Unexplained, Note = Remark(feature) }, line, instrument)
            with
        { FluxUnit = fluxUnit(spectrum), EquivalentWidthRestA = null, EquivalentWidthErrA = null };

    /// <summary>c(z₁−z₂)/(1+z₂) of the line against the answer, km/s.</summary>
    public static double OffsetKmS(MeasuredLine line) => Velocity.SpeedOfLightKmS * (Math.Exp(line.Data!.Centre - line.Target.Centre) - 1);

    /// <summary>1σ of the offset, km/s.</summary>
    public static double OffsetErrKmS(MeasuredLine line) => Velocity.SpeedOfLightKmS * line.Data!.CentreErr;

    private static LineMeasurement Named(SpectralLine line, LineState state, string note) => new()
    {
        Line = line.Name,
        Family = line.Family.ToString().ToLowerInvariant(),
        RestVacuumA = line.VacuumAngstrom,
        RestAirA = line.VacuumAngstrom < 2000 ? null : line.AirAngstrom,
        State = state,
        Note = note,
    };

    private LineMeasurement Measured(LineMeasurement row, FittedLine line, double instrument)
    {
        var observed = Math.Exp(line.Centre);
        var hasContinuum = line.Continuum > FaintestContinuum * line.ContinuumErr;
        return row with
        {
            ObservedVacuumA = observed,
            ObservedErrA = observed * line.CentreErr,
            Flux = line.Flux * fluxScale,
            FluxErr = line.FluxErr * fluxScale,
            EquivalentWidthRestA = hasContinuum ? line.EquivalentWidth / Math.Exp(lnShift) : null,
            EquivalentWidthErrA = hasContinuum ? line.EquivalentWidthErr / Math.Exp(lnShift) : null,
            FwhmObservedKmS = Velocity.SpeedOfLightKmS * LineWidth.FwhmPerSigma * line.Sigma,
            FwhmIntrinsicKmS = Intrinsic(line, instrument) is { } own ? Velocity.SpeedOfLightKmS * LineWidth.FwhmPerSigma * own : null,
        };
    }

    /// <summary>The width without the instrument's, where the difference of the squares is clear of its error.</summary>
    private static double? Intrinsic(FittedLine line, double instrument)
    {
        var square = line.Sigma * line.Sigma - instrument * instrument;
        var error = 2 * line.Sigma * line.Sigma * line.LnSigmaErr;
        return square > 2 * error ? Math.Sqrt(square) : null;
    }

    private static string Remark(Feature feature) => feature.Origin switch
    {
        FeatureOrigin.Sky => $"at the sky line {feature.OriginName}",
        FeatureOrigin.Telluric => $"in the atmospheric band {feature.OriginName}",
        FeatureOrigin.CosmicRay => "narrower than the line spread: a cosmic ray or bad pixel",
        _ => "",
    };
}
