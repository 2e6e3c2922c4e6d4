namespace Redshift.Physics.Stars;

/// <summary>Constants in the units of stellar-atmosphere work (CGS, Å, eV), CODATA 2022.</summary>
internal static class Constants
{
    public const double BoltzmannErg = 1.380649e-16;
    public const double BoltzmannEv = 8.617333262e-5;
    public const double AtomicMassGram = 1.66053906892e-24;
    public const double LightSpeedCm = 2.99792458e10;

    /// <summary>hc/k in Å·K.</summary>
    public const double SecondRadiation = 1.438776877e8;

    /// <summary>hc/k in cm·K: a term value in cm⁻¹ over kT.</summary>
    public const double WavenumberKelvin = 1.438776877;

    /// <summary>π e² / (m c²) in cm: integrated cross-section per wavenumber and unit oscillator strength.</summary>
    public const double ClassicalCrossSection = 8.8528e-13;

    public static double Theta(double kelvin) => 5039.78 / kelvin;
}
