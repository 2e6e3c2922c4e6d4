namespace Redshift.Physics.Hydrogen;

/// <summary>One electric dipole transition between two fine-structure levels.</summary>
/// <param name="Upper">The upper level.</param>
/// <param name="Lower">The lower level.</param>
/// <param name="WaveNumber">Transition energy in cm^-1.</param>
/// <param name="LineStrength">Line strength S in e^2 a_0^2.</param>
/// <param name="EinsteinA">Rate of spontaneous emission in 1/s.</param>
public sealed record FineStructureComponent(
    HydrogenicLevel Upper,
    HydrogenicLevel Lower,
    double WaveNumber,
    double LineStrength,
    double EinsteinA)
{
    /// <summary>Vacuum wavelength in angstrom.</summary>
    public double VacuumAngstrom => 1e8 / WaveNumber;
}
