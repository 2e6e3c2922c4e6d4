using System.Globalization;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Load.Text;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Applies the rules of the pipeline file to text files: columns by name or by number from 1.</summary>
internal static class TextRules
{
    /// <summary>The layout of a table and the rule that applies to it.</summary>
    public static (Layout, LoadRule?) Find(TextTable table, LoadSettings settings)
    {
        var rule = RuleChoice.Find(settings, HeaderScope.Empty);
        var arrays = TextLayout.Arrays(table);
        if (rule?.Flux is null) return (TextLayout.Find(table, arrays), rule);
        var unit = rule.WavelengthUnit is { } text ? SpectralUnit.Parse(text) : null;
        var spectrum = new SpectrumSources
        {
            Wavelength = new ArrayWavelengths(Column(arrays, rule.Wavelength ?? "1"), unit),
            Flux = Column(arrays, rule.Flux),
            Noise = rule.InverseVariance is { } inverse ? (Role.InverseVariance, Column(arrays, inverse))
                : rule.Error is { } error ? (Role.Error, Column(arrays, error)) : null,
            Mask = rule.Mask is { } mask ? new(Column(arrays, mask)) : null,
        };
        return (new() { Spectra = [spectrum], Header = HeaderScope.Empty, Remarks = table.Remarks }, rule);
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
