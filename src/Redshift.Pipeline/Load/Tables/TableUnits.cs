using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Tables;

/// <summary>Finds the tables that hold spectra: a pixel a row, or vectors in the cells of one row a spectrum.</summary>
internal static class TableUnits
{
    private const int FewestPixels = 16;

    private static readonly string[] OrderColumns =
        ["SPORDER", "ORDER", "ORDERS", "ECH_ORDER", "SEGMENT", "ARM", "CHIP", "CAMERA", "CHANNEL", "APERTURE"];

    private static readonly string[] StepColumns = ["DELTAW", "DELTA", "STEP", "DW", "DLAMBDA", "DELTA_WAVE", "WAVESTEP", "CDELT"];

    /// <summary>All tables with a flux and its wavelengths.</summary>
    public static IEnumerable<SpectrumUnit> Find(FitsFile file)
    {
        foreach (var table in file.Hdus.OfType<TableHdu>())
            if (table.RowCount > 0 && Form(table) is { } arrays && HoldsSpectra(arrays, table, file))
                yield return new(table, () => Read(table, arrays, file));
    }

    /// <summary>The numeric columns as arrays: cells if any column holds long vectors, whole columns otherwise.</summary>
    public static IReadOnlyList<NumberArray>? Form(TableHdu table)
    {
        var numeric = table.Columns.Where(static column => column.IsNumeric).ToList();
        var vectors = numeric.Where(column => CellLength(column) >= FewestPixels).ToList();
        if (vectors.Count > 0)
            return [.. vectors.Select(column => Cells(table, column))];
        if (table.RowCount < FewestPixels || table.RowCount > Array.MaxLength) return null;
        return [.. numeric.Where(static column => !column.IsVariableLength && column.Repeat == 1)
            .Select(column => new ColumnArray(column, Rows(table)) { Place = Place(table, column), Label = LabelOf(column) })];
    }

    private static CellArray Cells(TableHdu table, TableColumn column) =>
        new(column, CellLength(column), Rows(table)) { Place = Place(table, column), Label = LabelOf(column) };

    private static int Rows(TableHdu table) => (int)Math.Min(table.RowCount, int.MaxValue);

    private static int CellLength(TableColumn column) => column.IsVariableLength ? column.LengthAt(0) : column.Repeat;

    private static string Place(TableHdu table, TableColumn column) => $"HDU {table.Index} column {column.Name}";

    private static Label LabelOf(TableColumn column) =>
        new(column.Name, column.Unit ?? "", column.Ucd ?? "", column.Utype ?? "", column.Comment ?? "");

    private static bool HoldsSpectra(IReadOnlyList<NumberArray> arrays, TableHdu table, FitsFile file)
    {
        var roles = new RoleChoice(arrays, Name(table));
        if (!roles.Has(Role.Flux)) return false;
        if (roles.Has(Role.Wavelength)) return true;
        return arrays[0] is CellArray && (Steps(table) is not null || Axis(table, arrays[0].Length, file) is not null);
    }

    private static string Name(TableHdu table) => $"HDU {table.Index} {table.Name}".TrimEnd();

    private static UnitContent Read(TableHdu table, IReadOnlyList<NumberArray> arrays, FitsFile file)
    {
        var roles = new RoleChoice(arrays, Name(table));
        var flux = roles.Single(Role.Flux)!;
        WavelengthSource wavelength = roles.Has(Role.Wavelength)
            ? new ArrayWavelengths(WavelengthOf(roles, flux))
            : (WavelengthSource?)Steps(table) ?? Axis(table, flux.Length, file)!;
        var sources = new SpectrumSources
        {
            Wavelength = wavelength,
            Flux = flux,
            Noise = roles.NoiseOf(flux),
            Mask = roles.MaskOf(flux),
            Width = roles.WidthOf(flux),
        };
        return Arrange(table, sources, flux) with { ListsWavelengths = true, Notes = Notes(roles, sources) };
    }

    // Where several columns give wavelengths, the flux's own qualifiers decide before the plainest name does.
    private static NumberArray WavelengthOf(RoleChoice roles, NumberArray flux) =>
        RoleGuesser.Qualifiers(flux.Label.Words).Any() ? roles.Belonging(Role.Wavelength, flux)! : roles.Single(Role.Wavelength)!;

    private static UnitContent Arrange(TableHdu table, SpectrumSources sources, NumberArray flux)
    {
        if (flux.Rows == 1) return new([sources], 1) { Targets = flux is CellArray ? TargetsOf(table) : null };
        if (OrderColumns.Select(table.Find).FirstOrDefault(static column => column is not null) is { } order && Distinct(order, flux.Rows))
            return new([.. Enumerable.Range(0, flux.Rows).Select(row => sources.AtRow(row, OrderLabel(order, row)))], 1);
        return new([sources], flux.Rows) { Targets = TargetsOf(table) };
    }

    private static TargetTable? TargetsOf(TableHdu table) => new TargetTable(table) is { TellsTargets: true } targets ? targets : null;

    private static bool Distinct(TableColumn order, int rows) =>
        rows <= 1000 && Enumerable.Range(0, rows).Select(row => OrderLabel(order, row)).Distinct().Count() == rows;

    private static string OrderLabel(TableColumn order, int row) =>
        order.IsText ? order.ReadString(row).Trim() : order.IsNumeric && order.Repeat == 1 ? $"order {order.ReadDoubles(row)[0]:R}" : "";

    private static StepWavelengths? Steps(TableHdu table)
    {
        var step = StepColumns.Select(table.Find).FirstOrDefault(static column => column is { IsNumeric: true, Repeat: 1 });
        var first = table.Columns.FirstOrDefault(static column =>
            column is { IsNumeric: true, Repeat: 1, IsVariableLength: false } && RoleGuesser.Of(LabelOf(column)).Role == Role.Wavelength);
        return step is null || first is null ? null : new(first, step, table.Index);
    }

    private static AxisWavelengths? Axis(TableHdu table, int length, FitsFile file) =>
        AxisReader.Read(new HeaderScope([table.Header, file.Hdus[0].Header]), 1, length, file) is { } axis ? new(axis, table.Index) : null;

    private static IReadOnlyList<ReadingNote> Notes(RoleChoice roles, SpectrumSources sources)
    {
        var unused = string.Join(", ", roles.Unused([.. sources.Places]));
        return unused.Length == 0 ? [] : [new("left aside", unused, "other forms of the same, or not needed")];
    }
}
