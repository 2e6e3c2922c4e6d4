using System.Globalization;
using System.Text.RegularExpressions;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>A unit of flux as far as it matters for the shape of a spectrum: whether it is per frequency.</summary>
/// <param name="Text">The unit after conversion, else as the file writes it.</param>
/// <param name="ErgPerSecondCm2Hz">Size of a unit per frequency in erg/s/cm²/Hz; null for units per wavelength, counts and pure numbers.</param>
internal readonly partial record struct FluxUnit(string Text, double? ErgPerSecondCm2Hz)
{
    private const double Jansky = 1e-23;

    /// <summary>Reads a unit; what is not known to be per frequency stays as it is.</summary>
    public static FluxUnit Parse(string text)
    {
        var unit = text.Trim();
        return PerFrequency(unit) is { } size ? new("erg/s/cm2/Angstrom", size) : new(unit, null);
    }

    /// <summary>Factor to flux per Å at a vacuum wavelength: f(λ) = f(ν) c/λ².</summary>
    public double PerAngstrom(double angstrom) => ErgPerSecondCm2Hz!.Value * SpectralUnit.LightAngstromPerSecond / (angstrom * angstrom);

    /// <summary>Whether values in the unit are logarithms, as magnitudes are, of a flux that their zero point would have to tell.</summary>
    public static bool IsLogarithmic(string unit) => LogarithmPattern().IsMatch(unit);

    private static double? PerFrequency(string unit)
    {
        var lower = unit.ToLowerInvariant();
        var factor = Multiplier(lower);
        if (JanskyPattern().Match(unit) is { Success: true } match) return factor * Prefix(match.Groups[1].Value) * Jansky;
        if (lower is "fnu") return 1;
        // W/m2/Hz is 1000 erg/s/cm2/Hz.
        return lower.ContainsAny("hz") && !lower.ContainsAny("ang")
            ? factor * (WattPattern().IsMatch(unit) ? 1e3 : 1)
            : null;
    }

    private static double Multiplier(string lower)
    {
        if (PowerPattern().Match(lower) is { Success: true } power)
            return Math.Pow(10, int.Parse(power.Groups[1].Value, CultureInfo.InvariantCulture));
        return NumberPattern().Match(lower) is { Success: true } number && double.TryParse(number.Groups[1].Value, CultureInfo.InvariantCulture, out var value) && value > 0
            ? value
            : 1;
    }

    private static double Prefix(string prefix) => prefix switch
    {
        "M" => 1e6,
        "k" => 1e3,
        "m" => 1e-3,
        "u" or "µ" or "\u03bc" or "micro" => 1e-6,
        "n" => 1e-9,
        _ => 1,
    };

    [GeneratedRegex(@"(?:^|[\s\d*.\(])(M|k|m|u|µ|μ|n|micro)?(?:Jy|jy|JY|Jansky|jansky|JANSKY)", RegexOptions.CultureInvariant)]
    private static partial Regex JanskyPattern();

    [GeneratedRegex(@"\b(?:AB|ST|Vega|m)?mag(?:nitude)?s?\b|^\s*(?:log(?:10)?|ln|dex)\b|^\s*dB$", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex LogarithmPattern();

    [GeneratedRegex(@"\bW(att)?\b", RegexOptions.CultureInvariant)]
    private static partial Regex WattPattern();

    [GeneratedRegex(@"^10\s*(?:\*\*|\^)?\s*\(?([+-]\d{1,3})\)?", RegexOptions.CultureInvariant)]
    private static partial Regex PowerPattern();

    [GeneratedRegex(@"^(\d*\.?\d+\.?(?:e[+-]?\d{1,3})?)", RegexOptions.CultureInvariant)]
    private static partial Regex NumberPattern();
}
