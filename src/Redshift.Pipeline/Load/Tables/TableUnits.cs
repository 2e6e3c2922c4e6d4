using System.Globalization;
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

    private static readonly string[] OrderColumns = ["SPORDER", "ORDER", "ORDERS", "ECH_ORDER"];

    // Parts of a spectrograph, or of a field with a target each.
    private static readonly string[] PartColumns = ["SEGMENT", "ARM", "CHIP", "CAMERA", "CHANNEL", "APERTURE", "EXPNUM", "EXPID", "EXP_ID", "VISIT", "EPOCH"];

    private static readonly string[] StepColumns = ["DELTAW", "DELTA", "STEP", "DW", "DLAMBDA", "DELTA_WAVE", "WAVESTEP", "CDELT"];

    /// <summary>All tables with a flux and its wavelengths.</summary>
    public static IEnumerable<SpectrumUnit> Find(FitsFile file)
    {
        foreach (var table in file.Hdus.OfType<TableHdu>())
            if (table.RowCount > 0 && Form(table) is { } arrays && HoldsSpectra(arrays, table, file))
                yield return new(table, () => Read(table, arrays, file));
    }

    /// <summary>The columns as arrays: cells if any column holds long vectors, whole columns otherwise.</summary>
    public static IReadOnlyList<NumberArray>? Form(TableHdu table)
    {
        var columns = table.Columns.Where(static column => column.IsNumeric || IsFlags(column)).ToList();
        if (columns.Exists(IsVector)) return [.. columns.Where(IsVector).Select(ArrayOf)];
        if (table.RowCount < FewestPixels || table.RowCount > Array.MaxLength) return null;
        return [.. columns.Where(static column => !IsCell(column)).Select(ArrayOf)];
    }

    /// <summary>A column as an array: a spectrum in each cell, or one value a row.</summary>
    public static NumberArray ArrayOf(TableColumn column)
    {
        var (place, label, rows) = (PlaceOf(column), LabelOf(column), (int)Math.Min(column.Table.RowCount, Array.MaxLength));
        if (IsFlags(column))
            return new FlagArray(column, IsCell(column) ? CellLength(column) : rows, IsCell(column) ? rows : null) { Place = place, Label = label };
        return IsCell(column)
            ? new CellArray(column, CellLength(column), rows) { Place = place, Label = label }
            : new ColumnArray(column, rows) { Place = place, Label = label };
    }

    /// <summary>The columns of wavelengths, as many as the pixels of an image, that tables beside it hold.</summary>
    public static IReadOnlyList<(NumberArray Array, Hdu Table)> Wavelengths(FitsFile file, int length) =>
    [
        .. from table in file.Hdus.OfType<TableHdu>()
           where table.RowCount == length || table.RowCount == 1
           from array in Form(table) ?? []
           where array.Length == length && RoleGuesser.Of(array.Label).Role == Role.Wavelength
           select (array, (Hdu)table),
    ];

    private static bool IsVector(TableColumn column) => IsCell(column) && CellLength(column) >= FewestPixels;

    // The bits of a cell are the several flags of one pixel, unless they are more than an integer would hold.
    private static bool IsCell(TableColumn column) => column.IsVariableLength || column.Repeat > (column.Type == ColumnType.Bit ? 64 : 1);

    private static bool IsFlags(TableColumn column) => column.Type is ColumnType.Logical or ColumnType.Bit;

    private static int CellLength(TableColumn column) => column.IsVariableLength ? column.LengthAt(0) : column.Repeat;

    /// <summary>The place of a column in the words of a load rule: by its name, or by its number where that does not tell it.</summary>
    public static string PlaceOf(TableColumn column)
    {
        var name = column.Name.Length > 0 && column.Table.Find(column.Name) == column
            ? column.Name
            : (column.Index + 1).ToString(CultureInfo.InvariantCulture);
        return $"HDU {column.Table.Index} column {name}";
    }

    /// <summary>What the file says of a column.</summary>
    public static Label LabelOf(TableColumn column) =>
        new(column.Name, column.Unit ?? "", column.Ucd ?? "", column.Utype ?? "", column.Comment ?? "");

    private static bool HoldsSpectra(IReadOnlyList<NumberArray> arrays, TableHdu table, FitsFile file)
    {
        if (ColumnsByPlace.AreNameless(arrays)) return true;
        var roles = new RoleChoice(arrays, Name(table));
        if (!roles.Has(Role.Flux)) return false;
        if (roles.Has(Role.Wavelength)) return true;
        return arrays[0] is CellArray && (Steps(table) is not null || Axis(table, arrays[0].Length, file) is not null);
    }

    private static string Name(TableHdu table) => $"HDU {table.Index} {table.Name}".TrimEnd();

    private static UnitContent Read(TableHdu table, IReadOnlyList<NumberArray> arrays, FitsFile file)
    {
        if (ColumnsByPlace.AreNameless(arrays)) return new([ColumnsByPlace.Read(arrays)], arrays[1].Rows) { ListsWavelengths = true };
        var roles = new RoleChoice(arrays, Name(table));
        if (ColumnArms.Read(roles) is { } arms) return WithNotes(new(arms, arms[0].Flux.Rows) { Targets = TargetsOf(table, arms[0].Flux, file) }, roles);
        var flux = roles.Single(Role.Flux)!;
        var listed = roles.Has(Role.Wavelength) ? WavelengthOf(roles, flux) : null;
        WavelengthSource wavelength = listed is not null
            ? new ArrayWavelengths(listed)
            : (WavelengthSource?)Steps(table) ?? Axis(table, flux.Length, file)!;
        return WithNotes(Arrange(table, roles.SpectrumOf(flux, wavelength), listed, file), roles);
    }

    private static UnitContent WithNotes(UnitContent content, RoleChoice roles)
    {
        var unused = string.Join(", ", roles.Unused([.. content.Spectra.SelectMany(static spectrum => spectrum.Places)]));
        return content with
        {
            ListsWavelengths = true,
            Notes = unused.Length == 0 ? [] : [new("left aside", unused, "other forms of the same, or not needed")],
        };
    }

    // Where several columns give wavelengths, the flux's own qualifiers decide before the plainest name does.
    private static NumberArray WavelengthOf(RoleChoice roles, NumberArray flux) =>
        RoleGuesser.Qualifiers(flux.Label.Words).Any() ? roles.Belonging(Role.Wavelength, flux)! : roles.Single(Role.Wavelength)!;

    private static UnitContent Arrange(TableHdu table, SpectrumSources sources, NumberArray? wavelengths, FitsFile file)
    {
        var rows = sources.Flux.Rows;
        if (rows > 1 && OrderColumn(table, rows) is { } order) return new(Orders(sources, order), 1);
        var targets = TargetsOf(table, sources.Flux, file);
        return targets is null && rows > 1 && wavelengths is not null && OrderRanges.AreOrders(wavelengths)
            ? new(sources.Numbered(), 1)
            : new([sources], rows) { Targets = targets };
    }

    private static TargetTable? TargetsOf(TableHdu table, NumberArray flux, FitsFile file) =>
        flux is CellArray ? TargetTable.For(table, file, flux.Rows) : null;

    private static TableColumn? OrderColumn(TableHdu table, int rows)
    {
        var names = TargetTable.HasSeveralTargets(table) ? OrderColumns : [.. OrderColumns, .. PartColumns];
        return names.Select(table.Find).FirstOrDefault(static column => column is not null) is { } order && Distinct(order, rows) ? order : null;
    }

    /// <summary>The rows of an array as the orders of one object.</summary>
    /// <param name="sources">The arrays.</param>
    /// <param name="names">Column with a name or number of each.</param>
    public static IReadOnlyList<SpectrumSources> Orders(SpectrumSources sources, TableColumn names) =>
        [.. Enumerable.Range(0, sources.Flux.Rows).Select(row => sources.AtRow(row, OrderLabel(names, row), PlaceOf(names)))];

    private static bool Distinct(TableColumn order, int rows) =>
        rows <= 1000 && Enumerable.Range(0, rows).Select(row => OrderLabel(order, row)).Distinct().Count() == rows;

    private static string OrderLabel(TableColumn order, int row) =>
        order.IsText ? order.ReadString(row).Trim() : order.IsNumeric && order.Repeat == 1 ? string.Create(CultureInfo.InvariantCulture, $"{WordOf(order)} {order.ReadDoubles(row)[0]:R}") : "";

    private static string WordOf(TableColumn order) =>
        PartColumns.Contains(order.Name, StringComparer.OrdinalIgnoreCase) ? order.Name.ToLowerInvariant() : "order";

    private static StepWavelengths? Steps(TableHdu table)
    {
        var step = StepColumns.Select(table.Find).FirstOrDefault(static column => column is { IsNumeric: true, Repeat: 1 });
        var first = table.Columns.FirstOrDefault(static column =>
            column is { IsNumeric: true, Repeat: 1, IsVariableLength: false } && RoleGuesser.Of(LabelOf(column)).Role == Role.Wavelength);
        return step is null || first is null ? null : new(first, step);
    }

    private static AxisWavelengths? Axis(TableHdu table, int length, FitsFile file) =>
        AxisReader.Read(new HeaderScope([table.Header, file.Hdus[0].Header]), 1, length, file) is { } axis ? new(axis, table.Index) : null;
}
