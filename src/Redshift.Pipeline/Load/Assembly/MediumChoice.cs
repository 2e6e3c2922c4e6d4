using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>The medium of the wavelengths, in the order of trust: pipeline file, coordinate, header, default.</summary>
internal static class MediumChoice
{
    /// <summary>Settles the medium of a layout.</summary>
    public static Setting<WavelengthMedium> Make(Layout layout, LoadSettings settings, LoadRule? rule)
    {
        if ((rule?.Medium ?? settings.Medium) is { } given) return new(given, false, "the pipeline file");
        var wavelength = layout.Spectra[0].Wavelength;
        if (wavelength.Medium is { } own) return new(own, false, $"the coordinate itself ({wavelength.Place})");
        if (layout.WavelengthHeader is { } listed && MediumFinder.OfType(listed) is { } typed) return new(typed, false, "CTYPE1 of the wavelengths");
        foreach (var header in layout.WavelengthHeaders)
            if (MediumFinder.Stated(header) is { } stated) return new(stated.Medium, false, stated.Where);
        foreach (var remark in layout.Remarks)
            if (MediumFinder.FromText(remark) is { } medium) return new(medium, false, $"the remark '{remark.Trim()}'");
        return Default(layout);
    }

    private static Setting<WavelengthMedium> Default(Layout layout)
    {
        var (shortest, longest) = Range(layout);
        if (longest < MediumFinder.AirBegins) return new(WavelengthMedium.Vacuum, false, "the convention below 2000 A");
        var logarithmic = layout.Spectra[0].Wavelength.Unit?.BeginsWithAny("log", "ln") == true;
        var (medium, why) = MediumFinder.Default(shortest, longest, logarithmic, layout.ListsWavelengths);
        return new(medium, true, why);
    }

    private static (double Shortest, double Longest) Range(Layout layout)
    {
        double shortest = double.PositiveInfinity, longest = 0;
        foreach (var spectrum in layout.Spectra)
        {
            foreach (var angstrom in spectrum.Wavelength.Angstroms(0, spectrum.Flux.Length))
            {
                if (!(angstrom > 0)) continue;
                shortest = Math.Min(shortest, angstrom);
                longest = Math.Max(longest, angstrom);
            }
        }
        return (shortest, longest);
    }
}
