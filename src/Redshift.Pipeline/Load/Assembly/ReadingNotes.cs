using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>What was found in a file and what was chosen, one note a role.</summary>
internal static class ReadingNotes
{
    /// <summary>The notes on the arrays of the first spectrum, and those of the layout.</summary>
    public static IEnumerable<ReadingNote> Of(Layout layout)
    {
        var spectrum = layout.Spectra[0];
        yield return new("wavelength", spectrum.Wavelength.Place, spectrum.Wavelength.Why);
        if (spectrum.Wavelength.Unit is { } unit)
            yield return new("wavelength_unit", unit, spectrum.Wavelength.IsUnitAssumed ? "assumed" : "");
        yield return new("flux", spectrum.Flux.Place, Reason(spectrum.Flux));
        if (spectrum.Noise is { } noise) yield return new(NameOf(noise.Role), noise.Values.Place, Reason(noise.Values));
        else yield return new("error", "none", "nothing in the file is one");
        if (spectrum.Mask is { } mask) yield return new(mask.Key, mask.Place, mask.Why);
        if (layout is { Rows: > 1, Targets: { } targets }) yield return new("targets", targets.Place, "a row for each spectrum");
        if (layout.Spectra.Count > 1)
            yield return new("spectra of the object", string.Join(", ", layout.Spectra.Select(static one => one.Label)), "all of one observation");
        foreach (var note in layout.Notes) yield return note;
    }

    /// <summary>The note on the resolution.</summary>
    public static IEnumerable<ReadingNote> OfResolution(Layout layout, StatedResolution? resolution)
    {
        if (layout.Spectra[0].Width is { } width && resolution is not { From: ResolutionSource.Pipeline })
            yield return new(width.Key, width.Place, width.Unit is { } unit ? $"a value for each pixel, in {unit}" : "a value or a response for each pixel");
        else if (resolution is { } stated)
            yield return new("resolution", stated.Power is { } power ? $"{power:0.#}" : $"{stated.FwhmA:0.###} A", stated.Where);
        else yield return new("resolution", "none", "nobody states it: it is estimated");
    }

    /// <summary>The key of a load rule for noise of a role.</summary>
    public static string NameOf(Role role) => role switch
    {
        Role.InverseVariance => "inverse_variance",
        Role.Variance => "variance",
        _ => "error",
    };

    private static string Reason(NumberArray array)
    {
        var why = RoleGuesser.Of(array.Label).Why;
        var unit = array.Label.Unit.Length > 0 ? $"unit {array.Label.Unit}" : "no unit";
        return why.Length > 0 ? $"{why}, {unit}" : unit;
    }
}
