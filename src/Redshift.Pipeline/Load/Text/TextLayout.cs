using System.Globalization;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Text;

/// <summary>The roles of the columns of a text file: by their names, else the first is the wavelength and the second the flux.</summary>
internal static class TextLayout
{
    /// <summary>The layout of a table.</summary>
    /// <exception cref="LoadException">There is no flux, or the first column is no wavelength.</exception>
    public static Layout Find(TextTable table, IReadOnlyList<NumberArray> arrays)
    {
        if (arrays.Count < 2) throw new LoadException("text", "one column of numbers", "wavelengths and fluxes");
        var sources = ByName(arrays) ?? ByPlace(arrays, table);
        return new() { Spectra = [sources], Header = HeaderScope.Empty, Remarks = table.Remarks, Notes = Notes(table) };
    }

    /// <summary>The columns as arrays.</summary>
    public static IReadOnlyList<NumberArray> Arrays(TextTable table) => [.. table.Columns.Select((values, i) => new HeldArray(values)
    {
        Place = $"column {(table.Names[i].Length > 0 ? table.Names[i] : (i + 1).ToString(CultureInfo.InvariantCulture))}",
        Label = new(table.Names[i], table.Units[i]),
    })];

    private static SpectrumSources? ByName(IReadOnlyList<NumberArray> arrays)
    {
        var roles = new RoleChoice(arrays, "text");
        if (!roles.Has(Role.Wavelength) || !roles.Has(Role.Flux)) return null;
        var flux = roles.Single(Role.Flux)!;
        return new()
        {
            Wavelength = new ArrayWavelengths(roles.Single(Role.Wavelength)!),
            Flux = flux,
            Noise = roles.NoiseOf(flux),
            Mask = roles.MaskOf(flux),
            Width = roles.WidthOf(flux),
        };
    }

    private static SpectrumSources ByPlace(IReadOnlyList<NumberArray> arrays, TextTable table)
    {
        RequireWavelengths(table.Columns[0]);
        return new()
        {
            Wavelength = new ArrayWavelengths(arrays[0]),
            Flux = arrays[1],
            Noise = arrays.Count == 3 && LooksLikeError(table.Columns[1], table.Columns[2]) ? (Role.Error, arrays[2]) : null,
        };
    }

    private static void RequireWavelengths(double[] values)
    {
        int rising = 0, falling = 0;
        for (var i = 1; i < values.Length; i++)
        {
            if (values[i] > values[i - 1]) rising++;
            if (values[i] < values[i - 1]) falling++;
        }
        var isOrdered = Math.Min(rising, falling) * 10 <= values.Length && Math.Max(rising, falling) * 2 >= values.Length;
        if (!isOrdered || values.Any(static value => value <= 0))
            throw new LoadException("column 1", "numbers that are not in order or not positive", "wavelengths");
    }

    // A third column without a name is an error if it is positive and speaks of the scatter from pixel to pixel.
    private static bool LooksLikeError(double[] flux, double[] third)
    {
        if (third.Any(static value => value < 0) || third.Count(static value => value > 0) * 2 < third.Length) return false;
        var ratios = new List<double>();
        for (var i = 2; i < flux.Length; i++)
            if (third[i - 1] > 0) ratios.Add(Math.Abs(flux[i - 1] - (flux[i - 2] + flux[i]) / 2) / third[i - 1]);
        ratios.Sort();
        return ratios.Count > 0 && ratios[ratios.Count / 2] is > 0.05 and < 5;
    }

    private static IReadOnlyList<ReadingNote> Notes(TextTable table) =>
        [new("columns", Described(table), "the lines above the numbers")];

    private static string Described(TextTable table) =>
        table.Names.Any(static name => name.Length > 0) ? string.Join(", ", table.Names) : $"{table.Columns.Count} without names";
}
