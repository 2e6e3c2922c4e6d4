using System.Globalization;
using System.Text.RegularExpressions;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>
/// A place in a file as a load rule writes it: <c>HDU 1 column FLUX</c>, <c>HDU 0 row 2</c>, <c>HDU 0 axis</c>, <c>HDU B_FLUX</c>, or
/// only the name of a column or HDU.
/// </summary>
/// <param name="Hdu">Index or name of the HDU; null where the rule's own applies.</param>
/// <param name="Column">Name or number of a column.</param>
/// <param name="Row">0-based row or band of an image.</param>
/// <param name="IsAxis">Whether the axis that the header describes is meant.</param>
internal sealed partial record ArrayReference(string? Hdu, string? Column, int? Row, bool IsAxis)
{
    /// <summary>Reads a reference.</summary>
    public static ArrayReference Parse(string text)
    {
        var match = Pattern().Match(text.Trim());
        var hdu = match.Groups["hdu"] is { Success: true } named ? named.Value : null;
        if (match.Groups["row"] is { Success: true } row) return new(hdu, null, int.Parse(row.Value, CultureInfo.InvariantCulture), false);
        if (match.Groups["axis"].Success) return new(hdu, null, null, true);
        return new(hdu, match.Groups["column"] is { Success: true } column ? column.Value.Trim() : null, null, false);
    }

    [GeneratedRegex(@"^(?:HDU\s+(?<hdu>\S+)\s*)?(?:row\s+(?<row>\d{1,9})|(?<axis>axis)|(?:column\s+)?(?<column>.+))?$", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Pattern();
}
