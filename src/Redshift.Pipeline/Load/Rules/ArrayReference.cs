using System.Globalization;
using System.Text.RegularExpressions;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>
/// A place in a file as a load rule writes it: <c>HDU 1 column FLUX</c>, <c>HDU 0 row 2</c>, <c>HDU 0 band 3</c>, <c>HDU 0 axis</c>,
/// <c>HDU B_FLUX</c>, or only the name of a column or HDU.
/// </summary>
/// <param name="Hdu">Index or name of the HDU; null where the rule's own applies.</param>
/// <param name="Column">Name of a column, or its number from 1.</param>
/// <param name="Row">0-based row of an image.</param>
/// <param name="Band">0-based plane along the third axis of an image.</param>
/// <param name="IsAxis">Whether the axis that the header describes is meant.</param>
internal sealed partial record ArrayReference(string? Hdu, string? Column, int? Row, int? Band, bool IsAxis)
{
    /// <summary>Reads a reference.</summary>
    public static ArrayReference Parse(string text)
    {
        var match = Pattern().Match(text.Trim());
        return new(Text(match, "hdu"), Text(match, "column"), Number(match, "row"), Number(match, "band"), match.Groups["axis"].Success);
    }

    private static string? Text(System.Text.RegularExpressions.Match match, string group) => match.Groups[group] is { Success: true } found ? found.Value.Trim() : null;

    private static int? Number(System.Text.RegularExpressions.Match match, string group) =>
        Text(match, group) is { } digits ? int.Parse(digits, CultureInfo.InvariantCulture) : null;

    [GeneratedRegex(@"^(?:HDU\s+(?<hdu>\S+)\s*)?(?:row\s+(?<row>\d{1,9})|band\s+(?<band>\d{1,9})|(?<axis>axis)|(?:column\s+)?(?<column>.+))?$", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Pattern();
}
