using System.Globalization;
using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Metadata;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>Reads the coordinate array of a -TAB axis (Greisen et al. 2006, A&amp;A 446, 747, section 6.1).</summary>
internal static class TableAxisReader
{
    /// <summary>The axis of a header whose CTYPE ends in -TAB.</summary>
    /// <exception cref="LoadException">The table or its columns are not there.</exception>
    public static TableAxis Read(HeaderScope header, int axis, SpectralVariable variable, FitsFile? file)
    {
        var table = FindTable(header, axis, file);
        var column = FindColumn(table, header, axis, 1) ?? throw Missing(axis, $"no column that PS{axis}_1 names", "the coordinate array");
        var coordinates = column.ReadDoubles(0);
        var unit = SpectralUnit.Parse(column.Unit ?? "") is { } stated && stated.Quantity == SpectralScale.QuantityOf(variable)
            ? stated
            : UnitText.Find(header, axis)?.Unit ?? Guess(coordinates);
        var pixels = AxisReader.LinearPart(header, axis) ?? new LinearPixels(1, 1, 1);
        return new(pixels, InAngstrom(coordinates, unit, variable), FindColumn(table, header, axis, 2)?.ReadDoubles(0), MediumOf(variable))
        {
            Why = $"coordinate array {table.Name} column {column.Name}",
        };
    }

    private static TableHdu FindTable(HeaderScope header, int axis, FitsFile? file)
    {
        var name = header.Text($"PS{axis}_0") ?? throw Missing(axis, $"no PS{axis}_0", "the name of the coordinate table");
        var version = (int)(header.Number($"PV{axis}_1") ?? 1);
        return file?.Hdus.OfType<TableHdu>().FirstOrDefault(hdu =>
                hdu.Name.Equals(name, StringComparison.OrdinalIgnoreCase) && hdu.Version == version && hdu.RowCount > 0)
            ?? throw Missing(axis, $"no table {name}", "the coordinate table");
    }

    private static TableColumn? FindColumn(TableHdu table, HeaderScope header, int axis, int parameter) =>
        header.Text(string.Create(CultureInfo.InvariantCulture, $"PS{axis}_{parameter}")) is { } name ? table.Find(name) : null;

    private static double[] InAngstrom(double[] coordinates, SpectralUnit unit, SpectralVariable variable)
    {
        if (SpectralScale.NeedsRest(variable))
            throw new LoadException("coordinate table", "velocities", "wavelengths, frequencies, wavenumbers or energies");
        return Array.ConvertAll(coordinates, unit.ToAngstrom);
    }

    private static SpectralUnit Guess(double[] coordinates) => WavelengthGuess.Unit(coordinates.Min(), coordinates.Max());

    private static WavelengthMedium? MediumOf(SpectralVariable variable) =>
        variable == SpectralVariable.Awav ? WavelengthMedium.Air : WavelengthMedium.Vacuum;

    private static LoadException Missing(int axis, string found, string expected) => new($"keyword CTYPE{axis} with -TAB", found, expected);
}
