using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;

namespace Redshift.Cli;

/// <summary>Option values that count something.</summary>
internal static class WholeNumber
{
    /// <summary>Makes an option.</summary>
    public static Option<int?> Option(string name, string description, int least) => new(name)
    {
        Description = description,
        HelpName = "N",
        CustomParser = result => Parse(result, least),
    };

    /// <summary>A whole number of at least <paramref name="least"/>; otherwise an error on the option.</summary>
    public static int? Parse(ArgumentResult result, int least)
    {
        var text = result.Tokens.Count == 1 ? result.Tokens[0].Value : "";
        if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var value) && value >= least)
            return value;
        OptionValue.Refuse(result, $"a whole number, {least} or more");
        return null;
    }
}
