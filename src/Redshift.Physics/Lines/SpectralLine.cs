using Redshift.Physics.Air;

namespace Redshift.Physics.Lines;

/// <summary>
/// A line at rest. Its wavelength is computed (hydrogen, ionized helium) or published; it is never fitted to spectra.
/// </summary>
/// <param name="Name">Standard spectroscopic form in ASCII: "H alpha", "[O III] 5007", "Ca II K".</param>
/// <param name="Family">What makes the line.</param>
/// <param name="VacuumAngstrom">Wavelength in vacuum, angstrom.</param>
/// <param name="Kind">The side of the continuum.</param>
/// <param name="Uses">Where it is commonly met.</param>
/// <param name="OscillatorStrength">Absorption oscillator strength; null where none is kept.</param>
/// <param name="Source">The publication of the wavelength.</param>
public sealed record SpectralLine(
    string Name,
    LineFamily Family,
    double VacuumAngstrom,
    LineKind Kind,
    LineUses Uses,
    double? OscillatorStrength,
    string Source)
{
    /// <summary>Wavelength in standard air, angstrom; the vacuum wavelength below 2000 A.</summary>
    public double AirAngstrom => AirRefraction.ToAir(VacuumAngstrom);
}
