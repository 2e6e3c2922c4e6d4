using System.CommandLine.Parsing;

namespace Redshift.Cli;

/// <summary>How the value of an option is refused, the same for all.</summary>
internal static class OptionValue
{
    /// <summary>An error that names the option, what was found and what was expected.</summary>
    public static void Refuse(ArgumentResult result, string expected) =>
        result.AddError($"{(result.Parent as OptionResult)?.Option.Name}: found '{string.Join(' ', result.Tokens.Select(static token => token.Value))}'; expected {expected}");
}
