namespace Redshift.Pipeline.Load.Roles;

/// <summary>What an array of a file is to a spectrum.</summary>
internal enum Role
{
    /// <summary>Nothing that is needed, or not recognised.</summary>
    Other,

    /// <summary>Wavelength or another spectral coordinate.</summary>
    Wavelength,

    /// <summary>Flux, counts or normalised intensity.</summary>
    Flux,

    /// <summary>Standard deviation of the flux.</summary>
    Error,

    /// <summary>Variance of the flux.</summary>
    Variance,

    /// <summary>Inverse variance of the flux.</summary>
    InverseVariance,

    /// <summary>Quality flags.</summary>
    Mask,

    /// <summary>Sky or background.</summary>
    Sky,

    /// <summary>Instrumental full width at half maximum.</summary>
    Fwhm,

    /// <summary>Instrumental standard deviation.</summary>
    Sigma,

    /// <summary>Resolving power, or a matrix where it stands in an image of its own.</summary>
    Resolution,
}
