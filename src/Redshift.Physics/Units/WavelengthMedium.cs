namespace Redshift.Physics.Units;

/// <summary>The medium in which a wavelength is measured: the same line has two wavelengths, some 80 km/s apart.</summary>
public enum WavelengthMedium
{
    /// <summary>Vacuum wavelengths; everything inside the pipeline is in vacuum.</summary>
    Vacuum,

    /// <summary>Wavelengths in dry air at 15 °C and 101325 Pa.</summary>
    Air,
}
