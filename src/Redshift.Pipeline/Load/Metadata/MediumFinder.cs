using System.Text.RegularExpressions;
using Redshift.Fits;
using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>The medium of wavelengths: what the header says, or the documented default.</summary>
internal static partial class MediumFinder
{
    /// <summary>Spectroscopists give wavelengths below these 2000 Å in vacuum, and whoever observes there is above the air.</summary>
    public const double AirBegins = 2000;

    // The ozone of the atmosphere lets nothing shorter through: a spectrum that ends below was taken from space.
    private const double AtmosphereBegins = 3200;

    // Sky lines and lamps beyond 9500 Å are tabulated in vacuum by most infrared pipelines.
    private const double InfraredBegins = 9500;

    private static readonly string[] MediumKeywords =
        ["AIRORVAC", "VACORAIR", "AIR_VAC", "AIRVAC", "WAVEMED", "WAVE_MED", "MEDIUM", "WAVETYPE", "VACAIR", "WAVESYS", "WAVETAG"];

    /// <summary>What the type of an array of wavelengths says (FITS Standard 4.0, table 25); null where it has none of these types.</summary>
    public static WavelengthMedium? OfType(HeaderScope header) => header.Text("CTYPE1", "CTYPE")?.ToUpperInvariant() switch
    {
        "AWAV" => WavelengthMedium.Air,
        "WAVE" => WavelengthMedium.Vacuum,
        _ => null,
    };

    /// <summary>What the cards state, and where; null where they are silent.</summary>
    public static (WavelengthMedium Medium, string Where)? Stated(HeaderScope header)
    {
        if (header.Flag("VACUUM") is { } vacuum) return (vacuum ? WavelengthMedium.Vacuum : WavelengthMedium.Air, "keyword VACUUM");
        foreach (var keyword in MediumKeywords)
            if (header.Text(keyword) is { } text && FromWord(text) is { } medium) return (medium, $"keyword {keyword}");
        return FromRemarks(header.Cards);
    }

    /// <summary>The default for a file that does not state its medium, with the reason.</summary>
    /// <param name="shortest">Shortest wavelength in Å.</param>
    /// <param name="longest">Longest wavelength in Å.</param>
    /// <param name="isLogarithmic">Whether the axis is equidistant in the logarithm, as coadded surveys write it.</param>
    /// <param name="listsWavelengths">Whether wavelengths are listed in a binary table or array.</param>
    public static (WavelengthMedium Medium, string Why) Default(double shortest, double longest, bool isLogarithmic, bool listsWavelengths)
    {
        if (longest < AtmosphereBegins) return (WavelengthMedium.Vacuum, "assumed: it ends before the atmosphere lets light through");
        if (shortest > InfraredBegins) return (WavelengthMedium.Vacuum, "assumed: it lies in the infrared");
        if (isLogarithmic) return (WavelengthMedium.Vacuum, "assumed: the axis is logarithmic");
        return listsWavelengths
            ? (WavelengthMedium.Vacuum, "assumed: wavelengths are listed value by value")
            : (WavelengthMedium.Air, "assumed: a plain axis or text, as slit spectrographs on the ground give it");
    }

    private static WavelengthMedium? FromWord(string text)
    {
        if (text.BeginsWithAny("vac")) return WavelengthMedium.Vacuum;
        return text.BeginsWithAny("air") ? WavelengthMedium.Air : null;
    }

    private static (WavelengthMedium Medium, string Where)? FromRemarks(IEnumerable<Card> cards)
    {
        foreach (var card in cards)
        {
            var text = card.Value.Kind == CardValueKind.Text ? card.Value.Literal + " " + card.Comment : card.Comment;
            if (FromText(text) is { } medium) return (medium, $"card {card.Keyword}: {text.Trim()}");
        }
        return null;
    }

    /// <summary>What a line of free text says of the medium.</summary>
    public static WavelengthMedium? FromText(string text)
    {
        var vacuum = text.ContainsAny("vac") && VacuumPattern().IsMatch(text);
        var air = text.ContainsAny("air") && AirPattern().IsMatch(text);
        return vacuum == air ? null : vacuum ? WavelengthMedium.Vacuum : WavelengthMedium.Air;
    }

    [GeneratedRegex(@"(wavelengths?|lambda|wave)\b[^.;]{0,30}\bvac(uum)?\b|\bvac(uum)?[ -_](wavelengths?|lambda|scale)|airtovac|air[ _]?to[ _]?vac|converted to vac",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex VacuumPattern();

    [GeneratedRegex(@"(wavelengths?|lambda|wave)\b[^.;]{0,30}\b(in|to|are|is|scale)\b[^.;]{0,8}\bair\b(?! ?mass)|\bair[ _-]wavelengths?|vactoair|vac[ _]?to[ _]?air|converted to air",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex AirPattern();
}
