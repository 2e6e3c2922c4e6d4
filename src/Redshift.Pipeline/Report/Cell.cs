using System.Globalization;

namespace Redshift.Pipeline.Report;

/// <summary>One value of a report, already rounded and made harmless; every output format is made from it.</summary>
/// <param name="Text">Plain printable ASCII; empty where the value is unknown.</param>
/// <param name="IsNumber">Whether <paramref name="Text"/> is a number.</param>
public readonly record struct Cell(string Text, bool IsNumber)
{
    /// <summary>An unknown value.</summary>
    public static Cell Empty { get; } = new("", false);

    /// <summary>Text from anywhere, cleaned (<see cref="HarmlessText"/>).</summary>
    public static Cell Of(string text) => new(HarmlessText.ForTable(text), false);

    /// <summary>A whole number.</summary>
    public static Cell Of(int value) => new(value.ToString(CultureInfo.InvariantCulture), true);

    /// <summary>A number with fixed decimals; not finite counts as unknown.</summary>
    public static Cell Fixed(double? value, int decimals) => Number(value, "F" + decimals.ToString(CultureInfo.InvariantCulture));

    /// <summary>A number of unforeseeable magnitude (fluxes) with six significant digits; not finite counts as unknown.</summary>
    public static Cell Significant(double? value) => Number(value, "0.00000E+00");

    /// <summary>A time to the millisecond in the form of ISO 8601.</summary>
    public static Cell Of(DateTime? time) =>
        new(time?.ToString("yyyy-MM-dd'T'HH:mm:ss.fff", CultureInfo.InvariantCulture) ?? "", false);

    private static Cell Number(double? value, string format)
    {
        if (value is not { } number || !double.IsFinite(number))
            return Empty;
        var text = number.ToString(format, CultureInfo.InvariantCulture);
        // A small negative number must not come out as -0.000: the sign would say something that the digits do not.
        return new(text[0] == '-' && IsZero(text) ? text[1..] : text, true);
    }

    private static bool IsZero(string text) => double.Parse(text, CultureInfo.InvariantCulture) == 0;
}
