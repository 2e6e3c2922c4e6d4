namespace Redshift.Physics.Stars;

/// <summary>A computed stellar spectrum at rest, sampled on the grid it was computed for.</summary>
public sealed class StellarSpectrum
{
    internal StellarSpectrum(StellarParameters parameters, float[] relative, float[] continuum)
    {
        Parameters = parameters;
        SpectralType = SpectralTypes.Name(parameters);
        Relative = relative;
        Continuum = continuum;
    }

    /// <summary>The parameters that the spectrum was computed from.</summary>
    public StellarParameters Parameters { get; }

    /// <summary>Spectral type such as <c>G2V</c>, <c>K5III</c>, <c>DA2.5</c>, from the published temperature scales.</summary>
    public string SpectralType { get; }

    /// <summary>
    /// Flux over the flux of the line-free continuum, one value a grid point: line and band transmission; above 1 in emission lines.
    /// </summary>
    public float[] Relative { get; }

    /// <summary>Line-free continuum F_λ with its Balmer and Paschen jumps, one value a grid point, 1 at 5500 Å.</summary>
    public float[] Continuum { get; }
}
