using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Results;

/// <summary>Everything the pipeline says about one observation; the reports only format it.</summary>
public sealed record ObservationResult
{
    /// <summary>What was observed.</summary>
    public required Observation Observation { get; init; }

    /// <summary>The verdict.</summary>
    public required Verdict Verdict { get; init; }

    /// <summary>The answered kind.</summary>
    public required ObjectKind Kind { get; init; }

    /// <summary>Redshift in <see cref="Observation.Frame"/>; null with the verdict <see cref="Results.Verdict.Nothing"/>.</summary>
    public double? Z { get; init; }

    /// <summary>1σ of <see cref="Z"/>.</summary>
    public double? ZErr { get; init; }

    /// <summary>Redshift as the file's wavelengths stand.</summary>
    public double? ZFile { get; init; }

    /// <summary>Velocity correction applied to the file's wavelengths, km/s.</summary>
    public double? VelocityCorrectionKmS { get; init; }

    /// <summary>Calibrated probability that the redshift is right within the tolerance of the answered kind.</summary>
    public double Confidence { get; init; }

    /// <summary>Probability of the kind.</summary>
    public double KindConfidence { get; init; }

    /// <summary>Raw ln odds of the answer against everything else, before calibration.</summary>
    public double LnOdds { get; init; }

    /// <summary>Raw ln odds of the answer's redshift against a featureless spectrum, before calibration.</summary>
    public double LnOddsFeatures { get; init; }

    /// <summary>How badly the best model fits where it fits worst: ln of the model error over its stated least value.</summary>
    public double Misfit { get; init; }

    /// <summary>Spectral type of the best computed star, for stars.</summary>
    public string SpectralType { get; init; } = "";

    /// <summary>1σ of the spectral type in subclasses.</summary>
    public double? SpectralTypeErr { get; init; }

    /// <summary>Median signal to noise a pixel.</summary>
    public double SnrPixel { get; init; }

    /// <summary>Median signal to noise an Å.</summary>
    public double SnrAngstrom { get; init; }

    /// <summary>Factor by which the file's errors were multiplied.</summary>
    public double NoiseScale { get; init; } = 1;

    /// <summary>Median resolving power λ/FWHM.</summary>
    public double? Resolution { get; init; }

    /// <summary>Where the resolution comes from.</summary>
    public ResolutionSource ResolutionFrom { get; init; }

    /// <summary>Lines of the answer inside the spectrum that should be detectable.</summary>
    public int LinesExpected { get; init; }

    /// <summary>How many of them were measured.</summary>
    public int LinesMatched { get; init; }

    /// <summary>Wavelength zero-point error from the ladder fit, km/s.</summary>
    public double? ZeroPointKmS { get; init; }

    /// <summary>1σ of the zero point, km/s.</summary>
    public double? ZeroPointErrKmS { get; init; }

    /// <summary>The ranked candidates, the answer first.</summary>
    public IReadOnlyList<Candidate> Candidates { get; init; } = [];

    /// <summary>The best rival outside the window of the answer.</summary>
    public Candidate? Next { get; init; }

    /// <summary>Calibrated probability of the rival.</summary>
    public double? NextConfidence { get; init; }

    /// <summary>The lines.</summary>
    public IReadOnlyList<LineMeasurement> Lines { get; init; } = [];

    /// <summary>
    /// Gain in ln likelihood, over the smooth model, of the pixels outside all lines of <see cref="Lines"/>: breaks, unlisted lines.
    /// With the gains of the lines and <see cref="PriorAndVolumeLnGain"/> it adds up to the ln evidence of the first candidate.
    /// </summary>
    public double? OtherFeaturesLnGain { get; init; }

    /// <summary>What priors and the volume of the posterior add to the ln evidence of the first candidate.</summary>
    public double? PriorAndVolumeLnGain { get; init; }

    /// <summary>What a person should do, words such as <c>check-medium</c>.</summary>
    public IReadOnlyList<string> Cautions { get; init; } = [];

    /// <summary>Continuum and model of each spectrum, for pictures; same order as <see cref="Observation.Spectra"/>.</summary>
    public IReadOnlyList<ModelCurve> Curves { get; init; } = [];
}

/// <summary>The fit of one spectrum on its own pixels, in the flux unit of the spectrum.</summary>
/// <param name="Continuum">Smooth continuum.</param>
/// <param name="Model">The answer's full model.</param>
/// <param name="Sigma">Noise per pixel after rescaling; infinite where unusable.</param>
public sealed record ModelCurve(double[] Continuum, double[] Model, double[] Sigma);
