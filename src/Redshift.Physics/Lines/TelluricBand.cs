namespace Redshift.Physics.Lines;

/// <summary>A stretch of spectrum absorbed by the Earth's atmosphere, at rest on the ground.</summary>
/// <param name="Name">Customary name, such as "O2 A".</param>
/// <param name="Molecule">The absorber.</param>
/// <param name="StartVacuumAngstrom">First wavelength touched, vacuum, angstrom.</param>
/// <param name="EndVacuumAngstrom">Last wavelength touched, vacuum, angstrom.</param>
/// <param name="Strength">How deep it is.</param>
/// <param name="Source">The atlas the limits come from.</param>
public sealed record TelluricBand(
    string Name,
    string Molecule,
    double StartVacuumAngstrom,
    double EndVacuumAngstrom,
    TelluricStrength Strength,
    string Source)
{
    /// <summary>Whether a wavelength lies in the band.</summary>
    /// <param name="vacuumAngstrom">Vacuum wavelength in the frame of the observatory, angstrom.</param>
    /// <returns>True between the limits, both included.</returns>
    public bool Contains(double vacuumAngstrom)
        => vacuumAngstrom >= StartVacuumAngstrom && vacuumAngstrom <= EndVacuumAngstrom;
}
