using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Applies the rules of the pipeline file to FITS files: what a rule names is taken, the rest is found as without it.</summary>
internal static class FitsRules
{
    /// <summary>The layouts of a file and the rule that applies to it.</summary>
    public static IReadOnlyList<(Layout, LoadRule?)> Find(FitsFile file, LoadSettings settings)
    {
        var rule = RuleChoice.Find(settings, new([.. file.Hdus.Select(static hdu => hdu.Header)]));
        if (rule?.Flux is not null) return [(Explicit(file, rule), rule)];
        return [.. FitsLayouts.Find(file, rule?.Hdu).Select(layout => (rule is null ? layout : Override(layout, file, rule), rule))];
    }

    private static Layout Explicit(FitsFile file, LoadRule rule)
    {
        var arrays = new FitsReferences(file, rule.Hdu);
        var (flux, hdu) = arrays.Resolve(rule.Flux!);
        var header = FitsLayouts.ScopeOf(hdu, file);
        var spectrum = new SpectrumSources { Flux = flux, Wavelength = Wavelength(arrays, rule, file, hdu, flux.Length) };
        return new()
        {
            Spectra = [WithNoise(spectrum, arrays, rule)],
            Rows = flux.Rows,
            Header = header,
            Targets = flux.Rows > 1 ? TargetTable.For(file, flux.Rows) : null,
        };
    }

    private static Layout Override(Layout layout, FitsFile file, LoadRule rule)
    {
        var arrays = new FitsReferences(file, rule.Hdu);
        return layout with { Spectra = [.. layout.Spectra.Select(spectrum => Override(spectrum, arrays, rule, layout.Header))] };
    }

    private static SpectrumSources Override(SpectrumSources spectrum, FitsReferences arrays, LoadRule rule, HeaderScope header)
    {
        var unit = UnitOf(rule);
        if (rule.Wavelength is { } place && !ArrayReference.Parse(place).IsAxis)
            spectrum = spectrum with { Wavelength = new ArrayWavelengths(arrays.Resolve(place).Array, unit) };
        else if (unit is { } stated) spectrum = spectrum with { Wavelength = spectrum.Wavelength.In(stated, header) };
        return WithNoise(spectrum, arrays, rule);
    }

    private static SpectrumSources WithNoise(SpectrumSources spectrum, FitsReferences arrays, LoadRule rule) => spectrum with
    {
        Noise = rule.InverseVariance is { } inverse ? (Role.InverseVariance, arrays.Resolve(inverse).Array)
            : rule.Error is { } error ? (Role.Error, arrays.Resolve(error).Array)
            : spectrum.Noise,
        Mask = rule.Mask is { } mask ? new MaskSource(arrays.Resolve(mask).Array) : spectrum.Mask,
    };

    private static WavelengthSource Wavelength(FitsReferences arrays, LoadRule rule, FitsFile file, Hdu fluxHdu, int length)
    {
        var unit = UnitOf(rule);
        if (rule.Wavelength is { } place && !ArrayReference.Parse(place).IsAxis)
            return new ArrayWavelengths(arrays.Resolve(place).Array, unit);
        var hdu = rule.Wavelength is { } axis ? arrays.HduOf(ArrayReference.Parse(axis), fluxHdu) : fluxHdu;
        var header = FitsLayouts.ScopeOf(hdu, file);
        var found = unit is { } stated && AxisReader.LinearPart(header, 1) is { } pixels
            ? new LinearAxis(pixels, stated, null) { Why = "the unit of the pipeline file" }
            : AxisReader.Read(header, 1, length, file);
        return found is null
            ? throw new LoadException($"HDU {hdu.Index}", "no axis", "CRVAL1 with CDELT1 or CD1_1")
            : new AxisWavelengths(found, hdu.Index);
    }

    private static SpectralUnit? UnitOf(LoadRule rule)
    {
        if (rule.WavelengthUnit is not { } text) return null;
        return SpectralUnit.Parse(text)
            ?? throw new LoadException("pipeline file, wavelength_unit", $"'{text}'", "a unit such as Angstrom, nm or log10(Angstrom)");
    }
}
