namespace Redshift.Physics.Indices;

/// <summary>How an index compares its bands.</summary>
public enum IndexKind
{
    /// <summary>Equivalent width in angstrom against the line through the side bands, absorption positive.</summary>
    EquivalentWidth,

    /// <summary>Mean depth in magnitudes against the line through the side bands, absorption positive.</summary>
    Magnitude,

    /// <summary>Mean flux per unit frequency in the red band over that in the blue band.</summary>
    Break,

    /// <summary>Mean flux per unit wavelength in the band over that in the side bands.</summary>
    FluxRatio,
}
