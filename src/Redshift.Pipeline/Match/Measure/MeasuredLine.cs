namespace Redshift.Pipeline.Match.Measure;

/// <summary>A line as the model predicts it and as the data show it, in one spectrum of the observation.</summary>
/// <param name="Target">What was looked for.</param>
/// <param name="Spectrum">Index of the spectrum.</param>
/// <param name="InstrumentSigma">σ of the line spread there, ln λ.</param>
/// <param name="Predicted">The same fit made to the answer's model.</param>
/// <param name="Data">The fit to the data; null where pixels are unusable.</param>
internal sealed record MeasuredLine(LineTarget Target, int Spectrum, double InstrumentSigma, FittedLine? Predicted, FittedLine? Data)
{
    /// <summary>Flux of the model over the error of the data: signal to noise at which the line should be seen.</summary>
    public double Expected => Predicted is null || Data is null ? 0 : Predicted.Flux / Data.FluxErr;

    /// <summary>Full resolved width, σ in ln λ: of the data where seen, else as predicted.</summary>
    public double Sigma => Data?.Sigma ?? Predicted?.Sigma ?? Math.Sqrt(Target.Sigma * Target.Sigma + InstrumentSigma * InstrumentSigma);
}
