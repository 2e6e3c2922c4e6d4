using Redshift.Fits;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Who the targets are by what a rule names: columns with a row for each spectrum, or header cards.</summary>
internal static class TargetRules
{
    private const string CardPrefix = "card ";

    /// <summary>The targets as found, with the columns that the rule names instead.</summary>
    /// <exception cref="LoadException">The file does not have them.</exception>
    public static TargetTable? Apply(TargetTable? found, FitsReferences arrays, LoadRule rule)
    {
        TableColumn? Column(string? text) => text is null || Keyword(text) is not null ? null : arrays.Column(text);
        var (names, ra, dec, fibres) = (Column(rule.Target), Column(rule.Ra), Column(rule.Dec), Column(rule.Fibre));
        if (found is null && names is null && ra is null && fibres is null) return null;
        var targets = found ?? new TargetTable { Place = "pipeline file, [[load]]" };
        return targets with
        {
            Names = names ?? targets.Names,
            Ra = ra ?? targets.Ra,
            Dec = dec ?? targets.Dec,
            Fibres = fibres ?? targets.Fibres,
            Unit = rule.AngleUnit ?? targets.Unit,
        };
    }

    /// <summary>The keyword of a reference to a header card; null for a column.</summary>
    public static string? Keyword(string text) =>
        text.StartsWith(CardPrefix, StringComparison.OrdinalIgnoreCase) ? text[CardPrefix.Length..].Trim() : null;
}
