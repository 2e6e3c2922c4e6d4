using System.Globalization;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>Reads right ascensions and declinations in degrees, hours, radians or sexagesimal form.</summary>
internal static class SkyAngle
{
    /// <summary>Degrees of a right ascension, 0 to 360; null where the text is none.</summary>
    /// <param name="text">The value as written.</param>
    /// <param name="unit">Unit or comment that may name hours or radians.</param>
    public static double? RightAscension(string text, string unit)
    {
        var isSexagesimal = Sexagesimal(text) is { } parts && parts.Count > 1;
        if (Value(text) is not { } value) return null;
        var degrees = isSexagesimal ? value * 15 : value * DegreesPerUnit(unit);
        return degrees is >= -360 and <= 720 ? (degrees % 360 + 360) % 360 : null;
    }

    /// <summary>Degrees of a declination; null where the text is none.</summary>
    public static double? Declination(string text, string unit)
    {
        if (Value(text) is not { } value) return null;
        var degrees = IsRadian(unit) ? double.RadiansToDegrees(value) : value;
        return degrees is >= -90 and <= 90 ? degrees : null;
    }

    private static double DegreesPerUnit(string unit)
    {
        if (IsRadian(unit)) return 180 / Math.PI;
        var lower = unit.Trim().ToLowerInvariant();
        return lower is "h" or "hr" or "hrs" or "hour" or "hours" || lower.ContainsAny("[h", "decimal hour") ? 15 : 1;
    }

    private static bool IsRadian(string unit) => unit.Trim().ToLowerInvariant() is "rad" or "radian" or "radians";

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
}
