namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>What a spectral coordinate measures; the unit in which the code carries it stands beside each.</summary>
internal enum SpectralQuantity
{
    /// <summary>Wavelength in Å.</summary>
    Wavelength,

    /// <summary>Frequency in Hz.</summary>
    Frequency,

    /// <summary>Wavenumber in cm⁻¹.</summary>
    Wavenumber,

    /// <summary>Photon energy in eV.</summary>
    Energy,

    /// <summary>Velocity in m/s.</summary>
    Velocity,

    /// <summary>A pure number: redshift or v/c.</summary>
    Ratio,
}
