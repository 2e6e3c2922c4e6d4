using Redshift.Physics.Air;

namespace Redshift.Physics.Hydrogen;

/// <summary>A line between two shells of a one-electron atom, its fine structure unresolved.</summary>
/// <param name="Name">Standard spectroscopic form, such as "H alpha", "Pa9", "He II 4686".</param>
/// <param name="Upper">Principal quantum number of the upper shell.</param>
/// <param name="Lower">Principal quantum number of the lower shell.</param>
/// <param name="VacuumAngstrom">Vacuum wavelength in angstrom: the centroid weighted by line strength.</param>
/// <param name="OscillatorStrength">Absorption oscillator strength averaged over the lower shell.</param>
/// <param name="EinsteinA">Rate of spontaneous emission averaged over the upper shell, 1/s.</param>
/// <param name="UpperTermEnergy">Energy of the upper shell above the ground level, cm^-1, the mean by statistical weight.</param>
public sealed record HydrogenicLine(
    string Name,
    int Upper,
    int Lower,
    double VacuumAngstrom,
    double OscillatorStrength,
    double EinsteinA,
    double UpperTermEnergy)
{
    /// <summary>Wavelength in standard air, in angstrom; the vacuum wavelength below 2000 A.</summary>
    public double AirAngstrom => AirRefraction.ToAir(VacuumAngstrom);
}
