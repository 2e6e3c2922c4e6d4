namespace Redshift.Physics.Stars;

/// <summary>A line of an atom or ion, with a strength that holds for every star.</summary>
/// <param name="Ion">Place of its ion in the list of the tables.</param>
/// <param name="Wavelength">Vacuum wavelength in Å.</param>
/// <param name="Excitation">Energy of the lower level in eV.</param>
/// <param name="Weight">Statistical weight of the lower level times oscillator strength, g f.</param>
internal readonly record struct AtomicLine(int Ion, double Wavelength, double Excitation, double Weight)
{
    /// <summary>Natural logarithm of the wavelength.</summary>
    public double LnWavelength { get; } = Math.Log(Wavelength);
}
