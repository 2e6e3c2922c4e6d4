using Redshift.Pipeline.Load.Metadata;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>
/// Axes without the standard's names: a reference value and a step in some unit, linear or logarithmic by flag cards, by the name
/// of the axis or, where the header contradicts itself, by the size of the numbers.
/// </summary>
internal static class LegacyAxis
{
    /// <summary>Reads the axis.</summary>
    /// <exception cref="LoadException">It is none of wavelengths.</exception>
    public static PixelAxis Read(HeaderScope header, int axis, LinearPixels pixels, int length)
    {
        if (CountsPixels(pixels))
            throw new LoadException($"keyword CRVAL{axis}", "an axis that counts the pixels", "wavelengths");
        var (low, high) = AxisReader.Ends(pixels, length);
        var stated = UnitText.Find(header, axis);
        var logarithm = LogarithmOf(header, axis, pixels, low, high, stated?.Unit);
        if (logarithm != AxisScale.Linear)
        {
            var why = $"a {logarithm.ToString().ToLowerInvariant()} axis by {LogarithmWitness(header, pixels)}";
            return new LinearAxis(pixels, SpectralUnit.Angstrom.On(logarithm), null) { Why = why };
        }
        if (stated is { } found && IsPlausible(found.Unit, low, high))
            return new LinearAxis(pixels, found.Unit, null) { Why = $"unit from {found.Where}" };
        return new LinearAxis(pixels, WavelengthGuess.Unit(low, high), null) { Why = GuessedWhy };
    }

    /// <summary>Whether an axis says no more than that pixel n is at n, as in frames without calibration.</summary>
    public static bool CountsPixels(LinearPixels pixels) => pixels.Increment == 1 && pixels.At(1) is 0 or 1;

    /// <summary>The reason given where a unit was judged by the size of the values.</summary>
    public const string GuessedWhy = "unit judged by the size of the values";

    /// <summary>Whether cards say that the axis is log10 of wavelength.</summary>
    public static bool IsFlaggedLogarithmic(HeaderScope header, LinearPixels pixels) =>
        header.Number("DC-FLAG") == 1 || IsCoefficientPair(header, pixels)
        || (header.Text("WFITTYPE") ?? "").ContainsAny("LOG");

    private static bool IsCoefficientPair(HeaderScope header, LinearPixels pixels) =>
        header.Number("COEFF0") is { } zero && Math.Abs(zero - pixels.ReferenceValue) < 1e-6 * Math.Abs(zero);

    private static string LogarithmWitness(HeaderScope header, LinearPixels pixels) =>
        header.Number("DC-FLAG") == 1 ? "DC-FLAG = 1"
        : IsCoefficientPair(header, pixels) ? "COEFF0 and COEFF1"
        : "name or size of the values";

    private static AxisScale LogarithmOf(HeaderScope header, int axis, LinearPixels pixels, double low, double high, SpectralUnit? unit)
    {
        if (unit is { Scale: not AxisScale.Linear } said) return said.Scale;
        var type = header.Text(HeaderScope.Indexed("CTYPE", axis))?.ToUpperInvariant() ?? "";
        var named = type.ContainsAny("LOG") || IsFlaggedLogarithmic(header, pixels);
        if (named && IsPlausible(SpectralUnit.Angstrom.On(AxisScale.Log10), low, high)) return AxisScale.Log10;
        if ((named || type is "LN" or "LNLAMBDA" or "LN-WAVE") && IsPlausible(SpectralUnit.Angstrom.On(AxisScale.Ln), low, high))
            return AxisScale.Ln;
        var fitsAngstroms = unit is null or { Quantity: SpectralQuantity.Wavelength, Factor: 1 };
        return fitsAngstroms && WavelengthGuess.LooksLogarithmic(low, high) ? AxisScale.Log10 : AxisScale.Linear;
    }

    // From soft X-rays to the far infrared; wavelengths outside mean that the unit was misunderstood.
    private static bool IsPlausible(SpectralUnit unit, double low, double high)
    {
        var (first, last) = (unit.ToAngstrom(low), unit.ToAngstrom(high));
        return Math.Min(first, last) > 1 && Math.Max(first, last) < 1e7;
    }
}
