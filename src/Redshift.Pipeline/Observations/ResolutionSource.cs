namespace Redshift.Pipeline.Observations;

/// <summary>Where the instrumental resolution comes from, in the order of trust.</summary>
public enum ResolutionSource
{
    /// <summary>Stated by nobody: estimated from the sampling.</summary>
    Estimate,

    /// <summary>A header keyword.</summary>
    Keyword,

    /// <summary>A column or matrix with a value a pixel.</summary>
    File,

    /// <summary>The pipeline file.</summary>
    Pipeline,
}
