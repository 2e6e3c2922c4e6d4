using System.Globalization;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Text;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Applies the rules of the pipeline file to text files: columns by name or by number from 1.</summary>
internal static class TextRules
{
    /// <summary>The layout of a table and the rule that applies to it.</summary>
    public static (Layout, LoadRule?) Find(TextTable table, LoadSettings settings)
    {
        var header = RemarkCards.Read(table.Remarks);
        var rule = RuleChoice.Find(settings, header);
        var arrays = TextLayout.Arrays(table);
        if (rule is null) return (TextLayout.Find(table, arrays), null);
        NumberArray Column(string text) => TextRules.Column(arrays, text);
        var layout = rule.Flux is { } flux
            ? new Layout { Spectra = [new() { Flux = Column(flux), Wavelength = new ArrayWavelengths(Column(rule.Wavelength ?? "1")) }], Header = header, Remarks = table.Remarks }
            : TextLayout.Find(table, arrays);
        return (layout with { Spectra = [.. layout.Spectra.Select(spectrum => Override(spectrum, rule, Column))] }, rule);
    }

    private static SpectrumSources Override(SpectrumSources spectrum, LoadRule rule, Func<string, NumberArray> column)
    {
        var unit = RoleRules.UnitOf(rule);
        if (rule.Wavelength is { } place) spectrum = spectrum with { Wavelength = new ArrayWavelengths(column(place), unit) };
        else if (unit is { } stated) spectrum = spectrum with { Wavelength = spectrum.Wavelength.In(stated, HeaderScope.Empty) };
        return RoleRules.Apply(spectrum, rule, column);
    }

    private static NumberArray Column(IReadOnlyList<NumberArray> arrays, string text)
    {
        var name = ArrayReference.Parse(text).Column ?? text;
        var byName = arrays.FirstOrDefault(array => array.Label.Name.Equals(name, StringComparison.OrdinalIgnoreCase));
        if (byName is not null) return byName;
        return int.TryParse(name, NumberStyles.None, CultureInfo.InvariantCulture, out var number) && number >= 1 && number <= arrays.Count
            ? arrays[number - 1]
            : throw new LoadException("pipeline file, [[load]]", $"column {name}, which the file does not have", "a name or a number from 1");
    }
}
