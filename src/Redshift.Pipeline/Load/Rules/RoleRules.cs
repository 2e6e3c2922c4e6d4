using Redshift.Pipeline.Load.Assembly;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Fills the roles beside wavelength and flux with what a rule names, whatever the kind of file.</summary>
internal static class RoleRules
{
    /// <summary>The spectrum with what the rule states of it.</summary>
    /// <param name="spectrum">The spectrum as it was found.</param>
    /// <param name="rule">The rule.</param>
    /// <param name="find">Finds the array of a reference.</param>
    public static SpectrumSources Apply(SpectrumSources spectrum, SpectrumRule rule, Func<string, NumberArray> find) => spectrum with
    {
        FluxUnit = rule.FluxUnit ?? spectrum.FluxUnit,
        Noise = NoiseOf(rule, find) ?? spectrum.Noise,
        Mask = MaskOf(rule, find) ?? spectrum.Mask,
        Width = WidthOf(rule, find) ?? spectrum.Width,
        Resolution = StatedResolution.FromPipeline(rule.Resolution, rule.FwhmA) ?? spectrum.Resolution,
    };

    /// <summary>The unit that a rule states for the wavelengths; null where it states none.</summary>
    /// <exception cref="LoadException">It is none.</exception>
    public static SpectralUnit? UnitOf(SpectrumRule rule)
    {
        if (rule.WavelengthUnit is not { } text) return null;
        return SpectralUnit.Parse(text)
            ?? throw new LoadException("pipeline file, wavelength_unit", $"'{text}'", "a unit such as Angstrom, nm or log10(Angstrom)");
    }

    private static (Role, NumberArray)? NoiseOf(SpectrumRule rule, Func<string, NumberArray> find)
    {
        if (rule.InverseVariance is { } inverse) return (Role.InverseVariance, find(inverse));
        if (rule.Variance is { } variance) return (Role.Variance, find(variance));
        return rule.Error is { } error ? (Role.Error, find(error)) : null;
    }

    private static MaskSource? MaskOf(SpectrumRule rule, Func<string, NumberArray> find)
    {
        if (rule.Good is { } good) return new(find(good), zeroIsBad: true);
        return rule.Mask is { } mask ? new(find(mask), zeroIsBad: false) : null;
    }

    private static WidthSource? WidthOf(SpectrumRule rule, Func<string, NumberArray> find)
    {
        if (rule.ResolutionPlace is { } place) return new(find(place), Role.Resolution);
        if (rule.Sigma is { } sigma) return new(find(sigma), Role.Sigma, rule.WidthUnit);
        return rule.Fwhm is { } fwhm ? new(find(fwhm), Role.Fwhm, rule.WidthUnit) : null;
    }
}
