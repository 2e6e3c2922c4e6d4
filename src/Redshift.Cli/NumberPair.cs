using System.CommandLine.Parsing;
using System.Globalization;

namespace Redshift.Cli;

/// <summary>Option values of the form <c>LO,HI</c>.</summary>
internal static class NumberPair
{
    /// <summary>Two numbers within limits, the lower first; otherwise an error on the option.</summary>
    public static (double Low, double High)? Parse(ArgumentResult result, double lowest, double highest)
    {
        var text = result.Tokens.Count == 1 ? result.Tokens[0].Value : "";
        var parts = text.Split(',');
        if (parts.Length == 2 && TryNumber(parts[0], out var low) && TryNumber(parts[1], out var high)
            && low >= lowest && low < high && high <= highest)
            return (low, high);
        OptionValue.Refuse(result, FormattableString.Invariant(
            $"two numbers from {lowest} to {highest}, the lower first, with a comma between, such as 0,1.5"));
        return null;
    }

    private static bool TryNumber(string text, out double value) =>
        double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out value) && double.IsFinite(value);
}
