using Redshift.Fits;
using Redshift.Pipeline.Load.Images;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Load.Tables;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>The spectra of an arm whose flux a rule names.</summary>
/// <param name="Spectra">One, whose arrays have <paramref name="Rows"/> rows; or its orders.</param>
/// <param name="Rows">Number of observations.</param>
/// <param name="FluxHdu">The unit with the flux.</param>
/// <param name="WavelengthHdu">The unit with the wavelengths.</param>
/// <param name="ListsWavelengths">Whether wavelengths are listed and not computed from an axis.</param>
internal sealed record ExplicitArm(IReadOnlyList<SpectrumSources> Spectra, int Rows, Hdu FluxHdu, Hdu WavelengthHdu, bool ListsWavelengths)
{
    /// <summary>Reads what the rule names.</summary>
    /// <param name="file">The file.</param>
    /// <param name="arrays">Finds the arrays.</param>
    /// <param name="rule">The rule of the arm.</param>
    /// <param name="name">The arm's name, or empty.</param>
    /// <exception cref="LoadException">The file does not have it.</exception>
    public static ExplicitArm Read(FitsFile file, FitsReferences arrays, SpectrumRule rule, string name)
    {
        var (flux, hdu) = arrays.Array(rule.Flux ?? throw FitsReferences.Missing($"no flux of arm {name}"));
        var (wavelength, wavelengthHdu) = Wavelength(file, arrays, rule, flux, hdu);
        var all = RoleRules.Apply(
            new() { Label = name, Arm = name, Flux = flux, Wavelength = wavelength }, rule, text => arrays.Array(text, flux).Array);
        var lists = wavelength is ArrayWavelengths or StepWavelengths;
        return rule.Order is { } order
            ? new([.. new UnitContent(Orders(all, arrays, order, wavelength), 1).Labelled(name)], 1, hdu, wavelengthHdu, lists)
            : new([all], flux.Rows, hdu, wavelengthHdu, lists);
    }

    private static IReadOnlyList<SpectrumSources> Orders(SpectrumSources all, FitsReferences arrays, string order, WavelengthSource wavelength)
    {
        if (ArrayReference.Parse(order).IsAxis && wavelength is ApertureWavelengths apertures) return ApertureReader.Orders(all, apertures);
        return order.Equals(SpectrumSources.RowNumbers, StringComparison.OrdinalIgnoreCase)
            ? all.Numbered()
            : TableUnits.Orders(all, arrays.Column(order));
    }

    private static (WavelengthSource Source, Hdu Hdu) Wavelength(FitsFile file, FitsReferences arrays, SpectrumRule rule, NumberArray flux, Hdu fluxHdu)
    {
        var unit = RoleRules.UnitOf(rule);
        if (rule is { WavelengthStep: { } step, Wavelength: { } first })
        {
            var column = arrays.Column(first);
            return (new StepWavelengths(column, arrays.Column(step), unit), column.Table);
        }
        var reference = rule.Wavelength is { } place ? ArrayReference.Parse(place) : null;
        if (reference is { IsAxis: false })
        {
            var (array, hdu) = arrays.Array(rule.Wavelength!, flux);
            return (new ArrayWavelengths(array, unit), hdu);
        }
        var axisHdu = reference is { Hdu: not null } ? arrays.UnitOf(reference) : fluxHdu;
        return (Axis(file, axisHdu, flux, unit), axisHdu);
    }

    private static WavelengthSource Axis(FitsFile file, Hdu hdu, NumberArray flux, SpectralUnit? unit)
    {
        var header = FitsLayouts.ScopeOf(hdu, file);
        if (ApertureAxis.ReadAll(header) is { Count: > 0 } apertures && apertures.Count >= flux.Rows) return new ApertureWavelengths(apertures, hdu.Index);
        var number = hdu is ImageHdu image && SpectralShape.Of(image) is { } shape ? shape.Axis : 1;
        var found = unit is { } stated && AxisReader.LinearPart(header, number) is { } pixels
            ? new LinearAxis(pixels, stated, null) { Why = "the unit of the pipeline file" }
            : AxisReader.Read(header, number, flux.Length, file);
        return found is null
            ? throw new LoadException($"HDU {hdu.Index}", "no axis", $"CRVAL{number} with CDELT{number} or CD{number}_{number}")
            : new AxisWavelengths(found, hdu.Index, number);
    }
}
