using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>The arms of a spectrograph that stand side by side in one table, each with its own wavelengths: <c>WAVE_B</c>, <c>FLUX_B</c>, <c>WAVE_R</c>, ...</summary>
internal static class ColumnArms
{
    /// <summary>A spectrum for each arm; null where the columns are no arms.</summary>
    public static IReadOnlyList<SpectrumSources>? Read(RoleChoice roles)
    {
        var fluxes = roles.Closest(Role.Flux);
        var arms = fluxes.Select(ArmOf).ToList();
        if (fluxes.Count < 2 || arms.Contains(null) || arms.Distinct().Count() < arms.Count) return null;
        var wavelengths = fluxes.Select(flux => roles.Belonging(Role.Wavelength, flux)).ToList();
        if (wavelengths.Contains(null) || wavelengths.Distinct().Count() < arms.Count) return null;
        return
        [
            .. fluxes.Select((flux, i) =>
                roles.SpectrumOf(flux, new ArrayWavelengths(wavelengths[i]!)) with { Label = arms[i]!.ToUpperInvariant(), Arm = arms[i]!.ToUpperInvariant() }),
        ];
    }

    private static string? ArmOf(NumberArray flux) =>
        RoleGuesser.Qualifiers(flux.Label.Words).ToList() is [var only] && ArmNames.Contains(only) ? only : null;
}
