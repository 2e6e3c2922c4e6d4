namespace Redshift.Physics.Stars;

/// <summary>The parameters that a stellar spectrum is computed from.</summary>
/// <param name="TemperatureK">Effective temperature in kelvin, 2000 to 80000.</param>
/// <param name="LogGravity">Decimal logarithm of the surface gravity in cm/s².</param>
/// <param name="Metallicity">[M/H]: decimal logarithm of the metal abundance over the solar one.</param>
/// <param name="Variant">What sets the star apart from a normal one.</param>
public sealed record StellarParameters(
    double TemperatureK,
    double LogGravity,
    double Metallicity,
    StellarVariant Variant = StellarVariant.Normal);
