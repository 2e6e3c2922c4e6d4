namespace Redshift.Physics.Indices;

/// <summary>A stretch of spectrum, in air wavelengths.</summary>
/// <param name="Start">Shortest wavelength, angstrom.</param>
/// <param name="End">Longest wavelength, angstrom.</param>
public readonly record struct WavelengthBand(double Start, double End)
{
    /// <summary>Length in angstrom.</summary>
    public double Width => End - Start;

    /// <summary>Middle in angstrom.</summary>
    public double Centre => (Start + End) / 2;
}
