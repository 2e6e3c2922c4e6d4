namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>The unit of wavelengths that stand in a file without one, judged by their size.</summary>
internal static class WavelengthGuess
{
    // log10 of 1000 and of 50000 Å: closer together than any range in micrometres that a spectrograph covers there.
    private const double LowestLogarithm = 3.0;
    private const double HighestLogarithm = 4.7;

    /// <summary>The most likely unit of wavelengths between two values.</summary>
    public static SpectralUnit Unit(double low, double high)
    {
        if (LooksLogarithmic(low, high)) return SpectralUnit.Angstrom.On(AxisScale.Log10);
        if (high < 1e-3) return new(SpectralQuantity.Wavelength, 1e10);
        if (high <= 60) return new(SpectralQuantity.Wavelength, 1e4);
        return LooksNanometre(low, high) ? new(SpectralQuantity.Wavelength, 10) : SpectralUnit.Angstrom;
    }

    /// <summary>Whether values said to be in Å can only be the decimal logarithm of it.</summary>
    public static bool LooksLogarithmic(double low, double high) => low >= LowestLogarithm && high <= HighestLogarithm && high - low < 1.3;

    // Spectra in Å hardly begin below the Lyman limit at 912; those in nm end before 2600 on the ground. From 600 to 1300 it is a
    // toss: a range that crosses the border between red and infrared detectors at 1050 nm, but does not reach the end of the K band
    // at 2300 nm, is an ultraviolet one in Å.
    private static bool LooksNanometre(double low, double high) =>
        high <= 2600 && (low < 600 || (low < 900 && high is < 1300 or > 2300) || (low is >= 900 and < 1100 && high > 1800));
}
