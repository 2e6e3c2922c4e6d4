namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>Whether an axis holds the coordinate or a logarithm of it.</summary>
internal enum AxisScale
{
    /// <summary>The coordinate itself.</summary>
    Linear,

    /// <summary>Its decimal logarithm.</summary>
    Log10,

    /// <summary>Its natural logarithm.</summary>
    Ln,
}
