using System.Text.RegularExpressions;
using Redshift.Fits;
using Redshift.Pipeline.Load.Metadata;

namespace Redshift.Pipeline.Load.Text;

/// <summary>Reads remarks such as <c># OBJECT = HD 123</c> or <c># EXPTIME: 600 / s</c> as the header cards they stand for.</summary>
internal static partial class RemarkCards
{
    /// <summary>The cards of all remarks that have the form of one.</summary>
    public static HeaderScope Read(IReadOnlyList<string> remarks)
    {
        var cards = remarks.Select(static remark => CardPattern().Match(remark)).Where(static match => match.Success)
            .Select(static match => Card.Of(match.Groups["key"].Value.ToUpperInvariant(), match.Groups["value"].Value.Trim(' ', '\'', '"'), match.Groups["comment"].Value))
            .ToList();
        return cards.Count == 0 ? HeaderScope.Empty : new([Header.Of(cards)]);
    }

    [GeneratedRegex(@"^(?<key>[A-Za-z][A-Za-z0-9_-]{0,7})\s*[=:]\s*(?<value>.+?)\s*(?:\s/\s*(?<comment>.*))?$", RegexOptions.CultureInvariant)]
    private static partial Regex CardPattern();
}
