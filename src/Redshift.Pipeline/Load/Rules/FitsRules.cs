using Redshift.Fits;
using Redshift.Pipeline.Load.Images;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Load.Tables;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Applies the rules of the pipeline file to FITS files: what a rule names is taken, the rest is found as without it.</summary>
internal static class FitsRules
{
    /// <summary>The layouts of a file and the rule that applies to it.</summary>
    public static IReadOnlyList<(Layout, LoadRule?)> Find(FitsFile file, LoadSettings settings)
    {
        if (RuleChoice.Find(settings, new([.. file.Hdus.Select(static hdu => hdu.Header)])) is not { } rule)
            return [.. FitsLayouts.Find(file).Select(static layout => (layout, (LoadRule?)null))];
        if (rule.Flux is not null || rule.Arms.Any(static arm => arm.Flux is not null))
            return [.. Units(file, rule).Select(own => (Explicit(file, rule, own), (LoadRule?)rule))];
        return [.. FitsLayouts.Find(file, rule.Hdus).Select(layout => (Override(layout, file, rule), (LoadRule?)rule))];
    }

    private static IReadOnlyList<Hdu?> Units(FitsFile file, LoadRule rule) => rule.Hdus.Count == 0
        ? [null]
        : [.. rule.Hdus.SelectMany(name => FitsReferences.Units(file, name) is { Count: > 0 } units ? units : throw FitsReferences.Missing($"HDU {name}"))];

    private static Layout Explicit(FitsFile file, LoadRule rule, Hdu? own)
    {
        var arrays = new FitsReferences(file, own);
        var arms = rule.Arms.Count == 0 ? [("", rule)] : rule.Arms.Select(static arm => (arm.Name, (SpectrumRule)arm));
        var read = arms.Select(arm => ExplicitArm.Read(file, arrays, arm.Item2, arm.Item1)).ToList();
        var rows = read.Select(static arm => arm.Rows).Distinct().ToList();
        if (rows.Count > 1) throw new LoadException("pipeline file, [[load]]", $"arms with {string.Join(" and ", rows)} rows", "as many in each arm");
        return new()
        {
            Spectra = [.. read.SelectMany(static arm => arm.Spectra)],
            Rows = rows[0],
            Header = FitsLayouts.ScopeOf(read[0].FluxHdu, file),
            WavelengthHeader = read[0] is { ListsWavelengths: true } first && first.WavelengthHdu != first.FluxHdu
                ? FitsLayouts.ScopeOf(first.WavelengthHdu, file)
                : null,
            Targets = TargetRules.Apply(TargetTable.For(read[0].FluxHdu, file, rows[0]), arrays, rule),
            ListsWavelengths = read[0].ListsWavelengths,
        };
    }

    private static Layout Override(Layout layout, FitsFile file, LoadRule rule)
    {
        var arrays = new FitsReferences(file, rule.Hdus is [var name, ..] && FitsReferences.Units(file, name) is [var own, ..] ? own : null);
        return layout with
        {
            Spectra = [.. layout.Spectra.Select(spectrum => Override(spectrum, arrays, rule, layout.Header))],
            Targets = TargetRules.Apply(layout.Targets, arrays, rule),
        };
    }

    private static SpectrumSources Override(SpectrumSources spectrum, FitsReferences arrays, LoadRule rule, HeaderScope header)
    {
        var whole = Override(spectrum, arrays, (SpectrumRule)rule, header);
        return rule.Arms.FirstOrDefault(arm => arm.Name == spectrum.Label || arm.Name == spectrum.Arm) is { } own
            ? Override(whole, arrays, own, header)
            : whole;
    }

    private static SpectrumSources Override(SpectrumSources spectrum, FitsReferences arrays, SpectrumRule rule, HeaderScope header)
    {
        var unit = RoleRules.UnitOf(rule);
        if (rule.Wavelength is { } place && !ArrayReference.Parse(place).IsAxis)
            spectrum = spectrum with { Wavelength = new ArrayWavelengths(arrays.Array(place, spectrum.Flux).Array, unit) };
        else if (unit is { } stated) spectrum = spectrum with { Wavelength = spectrum.Wavelength.In(stated, header) };
        return RoleRules.Apply(spectrum, rule, text => arrays.Array(text, spectrum.Flux).Array);
    }
}
