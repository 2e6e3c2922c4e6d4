namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>The spectral variables of the FITS Standard 4.0, table 25 (first four letters of CTYPE).</summary>
internal enum SpectralVariable
{
    /// <summary>Vacuum wavelength.</summary>
    Wave,

    /// <summary>Wavelength in air.</summary>
    Awav,

    /// <summary>Frequency.</summary>
    Freq,

    /// <summary>Wavenumber.</summary>
    Wavn,

    /// <summary>Photon energy.</summary>
    Ener,

    /// <summary>Radio velocity c(ν₀ − ν)/ν₀.</summary>
    Vrad,

    /// <summary>Optical velocity c(λ − λ₀)/λ₀.</summary>
    Vopt,

    /// <summary>Redshift.</summary>
    Zopt,

    /// <summary>Apparent radial (relativistic) velocity.</summary>
    Velo,

    /// <summary>Apparent radial velocity over c.</summary>
    Beta,
}
