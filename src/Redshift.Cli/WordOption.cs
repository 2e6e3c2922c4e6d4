using System.CommandLine;

namespace Redshift.Cli;

/// <summary>Options that take one of several words.</summary>
internal static class WordOption
{
    /// <summary>Makes an option that refuses other words, in one line, and offers them for completion.</summary>
    public static Option<string?> Create(string name, string description, IReadOnlyCollection<string> words)
    {
        var option = new Option<string?>(name)
        {
            Description = $"{description}: {string.Join(", ", words)}",
            HelpName = "WORD",
            CustomParser = result =>
            {
                var word = result.Tokens[0].Value;
                if (!words.Contains(word))
                    OptionValue.Refuse(result, $"one of {string.Join(", ", words)}");
                return word;
            },
        };
        option.CompletionSources.Add([.. words]);
        return option;
    }
}
