using System.Globalization;
using System.Text.RegularExpressions;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>Reads right ascensions and declinations in degrees, hours, radians or sexagesimal form.</summary>
internal static partial class SkyAngle
{
    private const double HoursOfCircle = 24;

    /// <summary>The unit that a unit string or a comment names; degrees where it names none.</summary>
    public static AngleUnit UnitOf(string text)
    {
        if (RadianPattern().IsMatch(text)) return AngleUnit.Radian;
        return HourPattern().IsMatch(text) ? AngleUnit.Hour : AngleUnit.Degree;
    }

    /// <summary>Degrees of a right ascension, 0 to 360; null where the text is none. Sexagesimal ones are in hours.</summary>
    /// <param name="text">The value as written.</param>
    /// <param name="unit">Unit of a plain number.</param>
    public static double? RightAscension(string text, AngleUnit unit)
    {
        if (Value(text) is not { } value) return null;
        var isSexagesimal = Sexagesimal(text)!.Count > 1 && !text.Contains('d', StringComparison.Ordinal);
        return RightAscension(value, isSexagesimal ? AngleUnit.Hour : unit);
    }

    /// <summary>Degrees of a right ascension, 0 to 360; null where the number is none.</summary>
    public static double? RightAscension(double value, AngleUnit unit)
    {
        var degrees = value * DegreesPerUnit(unit, value);
        return degrees is >= -360 and <= 720 ? (degrees % 360 + 360) % 360 : null;
    }

    /// <summary>Degrees of a declination; null where the text is none.</summary>
    public static double? Declination(string text, AngleUnit unit) => Value(text) is { } value ? Declination(value, unit) : null;

    /// <summary>Degrees of a declination; null where the number is none.</summary>
    public static double? Declination(double value, AngleUnit unit)
    {
        var degrees = unit == AngleUnit.Radian ? double.RadiansToDegrees(value) : value;
        return degrees is >= -90 and <= 90 ? degrees : null;
    }

    // More than 24 are no hours, whatever a comment such as "[hh:mm:ss]" says.
    private static double DegreesPerUnit(AngleUnit unit, double value) => unit switch
    {
        AngleUnit.Radian => 180 / Math.PI,
        AngleUnit.Hour when Math.Abs(value) <= HoursOfCircle => 15,
        _ => 1,
    };

    private static double? Value(string text)
    {
        if (Sexagesimal(text) is not { } parts) return null;
        double value = 0, scale = 1;
        foreach (var part in parts)
        {
            value += part / scale;
            scale *= 60;
        }
        return text.TrimStart().StartsWith('-') ? -value : value;
    }

    private static List<double>? Sexagesimal(string text)
    {
        var words = text.Trim().TrimStart('+', '-').Split([':', ' ', 'h', 'd', 'm', 's', '\'', '"', '°'], StringSplitOptions.RemoveEmptyEntries);
        if (words.Length is 0 or > 3) return null;
        var parts = new List<double>(3);
        foreach (var word in words)
        {
            if (!double.TryParse(word, NumberStyles.Float, CultureInfo.InvariantCulture, out var part) || !double.IsFinite(part))
                return null;
            parts.Add(parts.Count == 0 ? Math.Abs(part) : part);
        }
        return parts.Skip(1).All(static part => part is >= 0 and <= 60) ? parts : null;
    }

    [GeneratedRegex(@"\brad(?:ian)?s?\b", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex RadianPattern();

    [GeneratedRegex(@"^\s*(?:h|hrs?|hours?)\s*$|\bhours?\b|\[h", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex HourPattern();
}
