using System.Globalization;
using System.Text.RegularExpressions;

namespace Redshift.Pipeline.Load.Text;

/// <summary>Splits a line of text into numbers, or into words.</summary>
internal static partial class NumberLine
{
    private static readonly char[] Blanks = [' ', '\t', '\r', '\f', '\u00a0'];

    /// <summary>
    /// The fields of a line: split at commas, semicolons or bars where there are any, else at blanks. Between separators a field can
    /// be empty; bars at the ends are a frame.
    /// </summary>
    public static string[] Fields(string line)
    {
        foreach (var separator in (ReadOnlySpan<char>)[';', '|', ','])
            if (line.Contains(separator, StringComparison.Ordinal))
                return [.. line.Trim().Trim('|').Split(separator).Select(static field => field.Trim().Trim('"'))];
        return line.Split(Blanks, StringSplitOptions.RemoveEmptyEntries);
    }

    /// <summary>The numbers of a line that holds nothing but plain numbers between blanks; false for any other line.</summary>
    public static bool TryReadPlain(ReadOnlySpan<char> line, List<double> into)
    {
        into.Clear();
        foreach (var range in line.SplitAny(Blanks))
        {
            var field = line[range];
            if (field.IsEmpty) continue;
            if (!double.TryParse(field, NumberStyles.Float, CultureInfo.InvariantCulture, out var number)) return false;
            into.Add(number);
        }
        return into.Count > 0;
    }

    /// <summary>The numbers of a line into a list; false where one of its fields is none.</summary>
    /// <remarks>Two numbers run together at a minus sign are taken apart: "5000.00-0.12" has one reading only.</remarks>
    public static bool TryRead(string[] fields, List<double> into)
    {
        into.Clear();
        foreach (var field in fields)
        {
            if (TryNumber(field, out var number)) into.Add(number);
            else if (TrySplitAtMinus(field, out var left, out var right)) into.AddRange([left, right]);
            else return false;
        }
        return into.Count > 0;
    }

    /// <summary>Whether a field could be a number with a comma for the decimal point.</summary>
    public static bool IsDecimalComma(string text) => DecimalCommaPattern().IsMatch(text);

    // Fortran writes D for the exponent of double precision.
    private static bool TryNumber(string field, out double number)
    {
        if (double.TryParse(field, NumberStyles.Float, CultureInfo.InvariantCulture, out number)) return true;
        if (IsMissing(field))
        {
            number = double.NaN;
            return true;
        }
        return field.AsSpan().IndexOfAny('D', 'd') > 0
            && double.TryParse(field.Replace('D', 'E').Replace('d', 'e'), NumberStyles.Float, CultureInfo.InvariantCulture, out number);
    }

    // Fortran fills a field with asterisks where a number does not fit.
    private static bool IsMissing(string field) =>
        field.Length == 0 || field.ToUpperInvariant() is "NULL" or "--" or "INDEF" or "-" or "N/A" or "INF" or "+INF" or "-INF" || field.All(static letter => letter == '*');

    private static bool TrySplitAtMinus(string field, out double left, out double right)
    {
        (left, right) = (0, 0);
        return JoinedPattern().Match(field) is { Success: true } match
            && TryNumber(match.Groups[1].Value, out left) && TryNumber(match.Groups[2].Value, out right);
    }

    [GeneratedRegex(@"^([+-]?\d+\.\d*(?:[eE][+-]?\d+)?)(-\d+\.\d*(?:[eE][+-]?\d+)?)$", RegexOptions.CultureInvariant)]
    private static partial Regex JoinedPattern();

    [GeneratedRegex(@"^\s*[+-]?\d+,\d+(\s*[;\t ]\s*[+-]?\d+(,\d+)?([eE][+-]?\d+)?)+\s*$", RegexOptions.CultureInvariant)]
    private static partial Regex DecimalCommaPattern();
}
