using System.Text.RegularExpressions;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Text;

/// <summary>Makes column names and units from the lines above the numbers.</summary>
internal static partial class HeaderLines
{
    /// <summary>The table with its names.</summary>
    /// <param name="columns">The numbers.</param>
    /// <param name="header">The line of words before them, or null.</param>
    /// <param name="units">A second line of words, or null.</param>
    /// <param name="remarks">The comment lines.</param>
    public static TextTable Assemble(List<List<double>> columns, string[]? header, string[]? units, List<string> remarks)
    {
        var count = columns.Count;
        var names = Matching(header, count) ?? Matching(units, count) ?? FromRemarks(remarks, count) ?? new string[count];
        var parts = names.Select(static name => UnitPattern().Match(name ?? "")).ToList();
        var unitLine = Matching(units, count) is { } line && line != names ? line : null;
        return new(
            [.. columns.Select(static column => column.ToArray())],
            [.. names.Select((name, i) => parts[i].Success ? parts[i].Groups[1].Value.Trim() : (name ?? "").Trim())],
            [.. names.Select((_, i) => parts[i].Success ? parts[i].Groups[2].Value.Trim() : unitLine?[i].Trim('(', ')', '[', ']') ?? UnitsOfRemarks(remarks, names[i] ?? "", i))],
            remarks);
    }

    private static string[]? Matching(string[]? words, int count) => words?.Length == count ? words : null;

    // The names often stand in the last comment line that has a word for each column.
    private static string[]? FromRemarks(List<string> remarks, int count)
    {
        for (var i = remarks.Count - 1; i >= 0; i--)
        {
            var fields = NumberLine.Fields(remarks[i]);
            if (WithUnits(remarks[i]) is { } pairs && pairs.Length == count) return pairs;
            if (fields.Length == count && fields.All(static field => field.Length > 0 && char.IsLetter(field[0]))) return fields;
        }
        return null;
    }

    // "wavelength (micron)  flux density (mJy)": names of several words, told apart by their units.
    private static string[]? WithUnits(string remark) =>
        NamedUnitPattern().Matches(remark) is { Count: > 1 } pairs && pairs.Sum(static pair => pair.Length) == remark.Trim().Length
            ? [.. pairs.Select(static pair => pair.Value.Trim(' ', '\t', ',', ';'))]
            : null;

    private static string UnitsOfRemarks(List<string> remarks, string name, int column)
    {
        foreach (var remark in remarks)
            if (DescribedColumnPattern().Match(remark) is { Success: true } described && described.Groups[1].Value == name)
                return described.Groups[2].Value.Trim();
        if (column != 0) return "";
        foreach (var remark in remarks)
            if (WavelengthUnitPattern().Match(remark) is { Success: true } match && SpectralUnit.Parse(match.Groups[1].Value) is not null)
                return match.Groups[1].Value;
        return "";
    }

    [GeneratedRegex(@"^(.*?)\s*[\(\[](.+)[\)\]]\s*$", RegexOptions.CultureInvariant)]
    private static partial Regex UnitPattern();

    [GeneratedRegex(@"\s*[A-Za-z][\w ]*?\s*[\(\[][^\)\]]+[\)\]]\s*[,;]?", RegexOptions.CultureInvariant)]
    private static partial Regex NamedUnitPattern();

    // A column in the YAML lines of an enhanced CSV file.
    [GeneratedRegex(@"\{\s*name:\s*([^,}]+?)\s*,\s*unit:\s*([^,}]+)", RegexOptions.CultureInvariant)]
    private static partial Regex DescribedColumnPattern();

    [GeneratedRegex(@"(?:wave|lambda)\w*[^\w]{1,4}(?:in |units? |are in )?[\(\[]?([A-Za-z0-9^-]+)", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex WavelengthUnitPattern();
}
