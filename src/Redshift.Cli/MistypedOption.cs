using System.CommandLine;

namespace Redshift.Cli;

/// <summary>Arguments would take a mistyped option for a value; this says what it is.</summary>
internal static class MistypedOption
{
    /// <summary>Makes an argument refuse values with a dash in front.</summary>
    public static void Refuse(Argument argument) => argument.Validators.Add(result =>
    {
        foreach (var token in result.Tokens.Where(token => token.Value.StartsWith('-')))
            result.AddError($"there is no option {token.Value}");
    });
}
