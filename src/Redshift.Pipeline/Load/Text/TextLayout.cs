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
        var sources = ByName(arrays) ?? ColumnsByPlace.Read(arrays);
        return new() { Spectra = [sources], Header = RemarkCards.Read(table.Remarks), Remarks = table.Remarks, Notes = Notes(table) };
    }

    /// <summary>The columns as arrays.</summary>
    public static IReadOnlyList<NumberArray> Arrays(TextTable table) => [.. table.Columns.Select((values, i) => new HeldArray(values)
    {
        Place = $"column {(IsName(table, i) ? table.Names[i] : (i + 1).ToString(CultureInfo.InvariantCulture))}",
        Label = new(table.Names[i], table.Units[i]),
    })];

    private static bool IsName(TextTable table, int column) =>
        table.Names[column].Length > 0 && table.Names.Count(name => name.Equals(table.Names[column], StringComparison.OrdinalIgnoreCase)) == 1;

    private static SpectrumSources? ByName(IReadOnlyList<NumberArray> arrays)
    {
        var roles = new RoleChoice(arrays, "text");
        if (!roles.Has(Role.Wavelength) || !roles.Has(Role.Flux)) return null;
        return roles.SpectrumOf(roles.Single(Role.Flux)!, new ArrayWavelengths(roles.Single(Role.Wavelength)!));
    }

    private static IReadOnlyList<ReadingNote> Notes(TextTable table) =>
        [new("columns", Described(table), "the lines above the numbers")];

    private static string Described(TextTable table) =>
        table.Names.Any(static name => name.Length > 0) ? string.Join(", ", table.Names) : $"{table.Columns.Count} without names";
}
