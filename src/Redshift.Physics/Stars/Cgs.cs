using Redshift.Physics.Constants;

namespace Redshift.Physics.Stars;

/// <summary>Constants in the units of stellar-atmosphere work: CGS, Å, eV.</summary>
internal static class Cgs
{
    /// <summary>Speed of light in cm/s.</summary>
    public const double LightSpeed = 1e5 * Codata2022.SpeedOfLightKmS;

    /// <summary>π e²/(m c²) in cm: cross-section integrated over wavenumber, for an oscillator strength of one.</summary>
    public const double ClassicalCrossSection = 8.8528e-13;

    /// <summary>Boltzmann constant in erg/K.</summary>
    public static readonly double Boltzmann = 1e7 * Codata2022.Boltzmann.Value;

    /// <summary>Boltzmann constant in eV/K.</summary>
    public static readonly double BoltzmannEv = Codata2022.Boltzmann.Value / Codata2022.ElementaryCharge.Value;

    /// <summary>Planck constant in erg s.</summary>
    public static readonly double Planck = 1e7 * Codata2022.Planck.Value;

    /// <summary>Atomic mass unit in g.</summary>
    public static readonly double AtomicMass = 1e3 * Codata2022.AtomicMass.Value;

    /// <summary>hc/k in cm K: a wavenumber in cm⁻¹ over a temperature.</summary>
    public static readonly double WavenumberKelvin = Planck * LightSpeed / Boltzmann;

    /// <summary>hc/k in Å K: the exponent of Planck's law times wavelength and temperature.</summary>
    public static readonly double SecondRadiation = 1e8 * WavenumberKelvin;

    /// <summary>θ = 5040/T, the reciprocal temperature of decimal exponents in eV.</summary>
    public static double Theta(double kelvin) => Math.Log10(Math.E) / (BoltzmannEv * kelvin);
}
