using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Finds the rule of the pipeline file that applies to a file.</summary>
internal static class RuleChoice
{
    /// <summary>The first rule whose conditions all hold in one of the headers, or null.</summary>
    public static LoadRule? Find(LoadSettings settings, HeaderScope allHeaders) =>
        settings.Rules.FirstOrDefault(rule => rule.When.All(condition =>
            allHeaders.Text(condition.Key) is { } value && value.Equals(condition.Value.Trim(), StringComparison.OrdinalIgnoreCase)));
}
