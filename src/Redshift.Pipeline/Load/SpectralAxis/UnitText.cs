using System.Text.RegularExpressions;
using Redshift.Pipeline.Load.Metadata;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>Finds where a header states the unit of a spectral axis: CUNIT, or one of the places that stand in for it.</summary>
internal static partial class UnitText
{
    /// <summary>The unit of an axis and where it stands; null where nothing states it.</summary>
    public static (SpectralUnit Unit, string Where)? Find(HeaderScope header, int axis)
    {
        foreach (var (where, text) in Statements(header, axis))
            if (SpectralUnit.Parse(text) is { } unit) return (unit, where);
        foreach (var keyword in (ReadOnlySpan<string>)["CRVAL", "CDELT", "CTYPE"])
            if (InComment(header, HeaderScope.Indexed(keyword, axis)) is { } found) return found;
        return null;
    }

    private static IEnumerable<(string Where, string Text)> Statements(HeaderScope header, int axis)
    {
        var unit = HeaderScope.Indexed("CUNIT", axis);
        if (header.Text(unit) is { } text) yield return (unit, text);
        var type = HeaderScope.Indexed("CTYPE", axis);
        if (header.Text(type) is { } ctype)
        {
            yield return (type, ctype);
            if (BracketPattern().Match(ctype) is { Success: true } bracket) yield return (type, bracket.Groups[1].Value);
        }
        var attributes = HeaderScope.Indexed("WAT", axis) + "_001";
        if (header.Text(attributes) is { } wat && UnitsPattern().Match(wat) is { Success: true } units)
            yield return (attributes, units.Groups[1].Value);
        foreach (var keyword in new[] { "XUNITS", "XUNIT", "WAVEUNIT", "WUNIT", "WAVE_UNI" })
            if (header.Text(keyword) is { } other) yield return (keyword, other);
    }

    // One-letter words in a sentence are articles more often than angstroms, so they count only as the whole comment.
    private static (SpectralUnit Unit, string Where)? InComment(HeaderScope header, string keyword)
    {
        if (header.Find(keyword)?.Comment.Trim() is not { Length: > 0 } comment) return null;
        var where = $"comment of {keyword}";
        if (SpectralUnit.Parse(comment) is { } whole) return (whole, where);
        foreach (System.Text.RegularExpressions.Match word in WordPattern().Matches(comment))
            if (SpectralUnit.Parse(word.Value) is { Quantity: SpectralQuantity.Wavelength } unit) return (unit, where);
        return null;
    }

    [GeneratedRegex(@"[\[\(]\s*([^\]\)]+?)\s*[\]\)]", RegexOptions.CultureInvariant)]
    private static partial Regex BracketPattern();

    [GeneratedRegex(@"units=""?([A-Za-z0-9_.^/-]+)", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex UnitsPattern();

    [GeneratedRegex(@"\b[A-Za-zÅåµ]{2,}\b", RegexOptions.CultureInvariant)]
    private static partial Regex WordPattern();
}
