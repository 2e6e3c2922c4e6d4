namespace Redshift.Pipeline.Match.Measure;

/// <summary>A Gaussian over a straight local continuum, fitted in ln λ.</summary>
internal sealed record FittedLine
{
    /// <summary>ln λ of the centre.</summary>
    public required double Centre { get; init; }

    /// <summary>1σ of the centre.</summary>
    public required double CentreErr { get; init; }

    /// <summary>σ of the profile in ln λ, the instrument's included.</summary>
    public required double Sigma { get; init; }

    /// <summary>1σ of ln σ.</summary>
    public required double LnSigmaErr { get; init; }

    /// <summary>Height over the continuum, negative in absorption.</summary>
    public required double Amplitude { get; init; }

    /// <summary>Local continuum at the centre.</summary>
    public required double Continuum { get; init; }

    /// <summary>1σ of the continuum.</summary>
    public required double ContinuumErr { get; init; }

    /// <summary>∫ over the profile, flux × Å.</summary>
    public required double Flux { get; init; }

    /// <summary>1σ of the flux.</summary>
    public required double FluxErr { get; init; }

    /// <summary>Observed equivalent width in Å, positive in absorption.</summary>
    public required double EquivalentWidth { get; init; }

    /// <summary>1σ of the equivalent width.</summary>
    public required double EquivalentWidthErr { get; init; }

    /// <summary>Signed flux over its error.</summary>
    public double Significance => Flux / FluxErr;

    /// <summary>Value of the profile at ln λ, 1 at its centre.</summary>
    public double Profile(double lnWavelength)
    {
        var t = (lnWavelength - Centre) / Sigma;
        return Math.Exp(-0.5 * t * t);
    }
}
