using System.CommandLine.Parsing;
using System.Globalization;

namespace Redshift.Cli;

/// <summary>Option values that measure something.</summary>
internal static class DecimalNumber
{
    /// <summary>A number that is allowed; otherwise an error on the option and 0.</summary>
    /// <param name="result">What was given.</param>
    /// <param name="isAllowed">Which numbers are allowed.</param>
    /// <param name="expected">The same in words.</param>
    public static double Parse(ArgumentResult result, Func<double, bool> isAllowed, string expected)
    {
        var text = result.Tokens[0].Value;
        if (double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var value) && isAllowed(value))
            return value;
        OptionValue.Refuse(result, expected);
        return 0;
    }
}
