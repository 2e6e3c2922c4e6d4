using System.Globalization;

namespace Redshift.Physics.Stars;

/// <summary>Spectral types from temperature and gravity, and where they stand in their sequence.</summary>
public static class SpectralTypes
{
    private const string Letters = "OBAFGKM";

    // Dwarfs: Pecaut & Mamajek 2013, ApJS 208, 9; subtype counted from O0 in tenths of a class.
    private static readonly (double Subtype, double Kelvin)[] Dwarfs =
    [
        (3, 44900), (5, 41400), (7, 36500), (9, 33300), (10, 31400), (11, 26000), (12, 20600), (13, 17000), (15, 15700), (18, 12500),
        (20, 9700), (22, 8800), (25, 8080), (30, 7220), (32, 6820), (35, 6550), (38, 6180), (40, 5930), (42, 5770), (45, 5660),
        (48, 5480), (50, 5270), (52, 5100), (55, 4440), (57, 4050), (60, 3850), (62, 3550), (63, 3400), (64, 3200), (65, 3050),
        (66, 2810), (68, 2570), (69, 2380),
    ];

    // Giants: van Belle et al. 1999, AJ 117, 521 for G5 and later; hotter ones as dwarfs.
    private static readonly (double Subtype, double Kelvin)[] Giants =
    [
        (20, 9700), (25, 8080), (30, 7220), (35, 6550), (40, 5800), (45, 5100), (48, 4950), (50, 4800), (52, 4500), (53, 4350),
        (55, 3980), (60, 3850), (62, 3700), (63, 3600), (64, 3500), (65, 3380), (66, 3250), (68, 2950),
    ];

    /// <summary>
    /// Place of a type in its sequence, in subclasses: from O0 on for O to M (G2 is 42), for white dwarfs the number after their letters.
    /// Null for types outside both sequences, such as carbon stars.
    /// </summary>
    public static double? Subclass(string type)
    {
        if (type.Length > 2 && IsWhiteDwarf(type))
            return double.TryParse(type.AsSpan(2), NumberStyles.Float, CultureInfo.InvariantCulture, out var number) ? number : null;
        return type.Length > 1 && char.IsAsciiDigit(type[1]) && Letters.IndexOf(type[0], StringComparison.Ordinal) is >= 0 and var letter
            ? (10 * letter) + (type[1] - '0')
            : null;
    }

    /// <summary>Whether a type is that of a white dwarf.</summary>
    public static bool IsWhiteDwarf(string type) => type.StartsWith('D');

    internal static string Name(StellarParameters p) => p.Variant switch
    {
        StellarVariant.WhiteDwarfDA => "DA" + WhiteDwarfSubtype(p.TemperatureK),
        StellarVariant.WhiteDwarfDB => "DB" + WhiteDwarfSubtype(p.TemperatureK),
        StellarVariant.Carbon => "C-N",
        _ => Class(p.TemperatureK, ScaleOf(p)) + Luminosity(p) + Suffix(p.Variant),
    };

    // 50400 K / T to the nearest half: Sion et al. 1983, ApJ 269, 253.
    private static string WhiteDwarfSubtype(double kelvin) =>
        (Math.Round(2 * 50400 / kelvin) / 2).ToString("0.#", CultureInfo.InvariantCulture);

    private static (double Subtype, double Kelvin)[] ScaleOf(StellarParameters p) =>
        p.LogGravity >= 3.3 || p.TemperatureK > Giants[0].Kelvin ? Dwarfs : Giants;

    // Red giants reach gravities at which hotter stars are supergiants.
    private static string Luminosity(StellarParameters p) =>
        p.LogGravity >= 3.3 ? "V" : p.LogGravity >= (p.TemperatureK > 6000 ? 2.6 : 0) ? "III" : "I";

    private static string Suffix(StellarVariant variant) =>
        variant is StellarVariant.EmissionLine or StellarVariant.ActiveM ? "e" : "";

    private static string Class(double kelvin, (double Subtype, double Kelvin)[] scale)
    {
        var subtype = (int)Math.Round(Subtype(kelvin, scale));
        return $"{Letters[subtype / 10]}{subtype % 10}";
    }

    private static double Subtype(double kelvin, (double Subtype, double Kelvin)[] scale)
    {
        var next = Array.FindIndex(scale, s => s.Kelvin <= kelvin);
        if (next <= 0)
            return next == 0 ? scale[0].Subtype : scale[^1].Subtype;
        var (hot, cool) = (scale[next - 1], scale[next]);
        return hot.Subtype + ((cool.Subtype - hot.Subtype) * Math.Log(hot.Kelvin / kelvin) / Math.Log(hot.Kelvin / cool.Kelvin));
    }
}
