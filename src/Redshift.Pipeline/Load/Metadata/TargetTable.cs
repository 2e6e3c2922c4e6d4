using System.Globalization;
using System.Text.RegularExpressions;
using Redshift.Fits;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>A table with one row a spectrum that names the targets: a fibre table, or the table of the spectra itself.</summary>
internal sealed partial record TargetTable
{
    private static readonly string[] NameColumns =
    [
        "TARGETID", "TARGET", "OBJECT", "NAME", "OBJNAME", "TARGNAME", "CNAME", "OBJID", "SOURCE_ID", "DESIGNATION", "ID", "TARGID",
        "FIBREID", "FIBERID",
    ];

    private static readonly string[] RaColumns =
    [
        "TARGET_RA", "RA", "PLUG_RA", "TARGRA", "RA_TARG", "RAJ2000", "RA_ICRS", "OBJ_RA", "FIBRERA", "FIBER_RA", "RAOBJ", "ALPHA",
        "ALPHA_J2000",
    ];

    private static readonly string[] DecColumns =
    [
        "TARGET_DEC", "DEC", "PLUG_DEC", "TARGDEC", "DEC_TARG", "DEJ2000", "DECJ2000", "DE_ICRS", "OBJ_DEC", "FIBREDEC", "FIBER_DEC",
        "DECOBJ", "DELTA", "DELTA_J2000",
    ];

    private static readonly string[] FibreColumns =
        ["TYPE", "OBJTYPE", "FIBERTYPE", "FIBRETYPE", "TARGUSE", "TARGET_TYPE", "FIBTYPE", "FIB_TYPE", "FIBRE_TYPE", "FIBER_TYPE"];

    private static readonly string[] StatusColumns = ["STATUS", "FIBSTATUS", "FIB_STATUS", "FIBRE_STATUS", "FIBER_STATUS"];

    /// <summary>The table's place.</summary>
    public required string Place { get; init; }

    /// <summary>Names of the targets.</summary>
    public TableColumn? Names { get; init; }

    /// <summary>Right ascensions.</summary>
    public TableColumn? Ra { get; init; }

    /// <summary>Declinations.</summary>
    public TableColumn? Dec { get; init; }

    /// <summary>What the fibres look at.</summary>
    public TableColumn? Fibres { get; init; }

    /// <summary>Whether the fibres work.</summary>
    public TableColumn? Status { get; init; }

    /// <summary>Unit of positions that are plain numbers.</summary>
    public AngleUnit Unit { get; init; }

    /// <summary>The targets of spectra in a unit: told by its own table, else by the first with as many rows; null where none tells them.</summary>
    /// <param name="hdu">Where the spectra are.</param>
    /// <param name="file">The file.</param>
    /// <param name="rows">Number of spectra.</param>
    public static TargetTable? For(Hdu hdu, FitsFile file, long rows)
    {
        if (hdu is TableHdu own && own.RowCount == rows && Of(own) is { TellsTargets: true } targets) return targets;
        return rows > 1 ? For(file, rows) : null;
    }

    /// <summary>The companion table of a stack: the first with as many rows that tells targets.</summary>
    public static TargetTable? For(FitsFile file, long rows) => file.Hdus.OfType<TableHdu>()
        .Where(table => table.RowCount == rows)
        .Select(Of)
        .FirstOrDefault(static targets => targets.TellsTargets);

    /// <summary>Whether the rows of a table are different objects by their names or positions.</summary>
    public static bool HasSeveralTargets(TableHdu table)
    {
        var targets = Of(table);
        return new[] { targets.Names, targets.Ra }.OfType<TableColumn>()
            .Any(column => Enumerable.Range(0, (int)Math.Min(table.RowCount, 1000)).Select(row => Text(column, row)).Distinct().Skip(1).Any());
    }

    private static TargetTable Of(TableHdu table)
    {
        var (ra, dec) = (Column(table, RaColumns), Column(table, DecColumns));
        return new()
        {
            Place = $"HDU {table.Index} {table.Name}".TrimEnd(),
            Names = Column(table, NameColumns),
            Ra = ra,
            Dec = dec,
            Fibres = Column(table, FibreColumns),
            Status = Column(table, StatusColumns),
            Unit = ra is null || dec is null ? AngleUnit.Degree : UnitOf(ra, dec, table.RowCount),
        };
    }

    private bool TellsTargets => Names is not null || (Ra is not null && Dec is not null) || Fibres is not null;

    /// <summary>The target's name; empty where there is none.</summary>
    public string Name(int row) => Names is null ? "" : Text(Names, row);

    /// <summary>The target's position in degrees.</summary>
    public (double Ra, double Dec)? Position(int row)
    {
        if (Ra is null || Dec is null) return null;
        var ra = IsNumber(Ra) ? SkyAngle.RightAscension(Ra.ReadDoubles(row)[0], Unit) : SkyAngle.RightAscension(Text(Ra, row), Unit);
        var dec = IsNumber(Dec) ? SkyAngle.Declination(Dec.ReadDoubles(row)[0], Unit) : SkyAngle.Declination(Text(Dec, row), Unit);
        return ra is { } alpha && dec is { } delta ? (alpha, delta) : null;
    }

    /// <summary>What the fibre looks at, by its type, its status or its name.</summary>
    public FibreState State(int row)
    {
        if (Fibres is { } fibres && FromWord(Text(fibres, row)) is not FibreState.Object and var byType) return byType;
        if (Status is { } status && FromWord(Text(status, row)) is not FibreState.Object and var byStatus) return byStatus;
        return FromName(Name(row));
    }

    private static FibreState FromWord(string word) => word.ToUpperInvariant() switch
    {
        "S" => FibreState.Sky,
        "U" or "F" or "UNASSIGNED" or "GUIDE" or "FIDUCIAL" => FibreState.Parked,
        "N" or "BAD" or "DISABLED" or "BRK" => FibreState.Broken,
        _ => FromName(word),
    };

    private static FibreState FromName(string name)
    {
        if (ParkedPattern().IsMatch(name)) return FibreState.Parked;
        if (BrokenPattern().IsMatch(name)) return FibreState.Broken;
        return SkyPattern().IsMatch(name) ? FibreState.Sky : FibreState.Object;
    }

    private static TableColumn? Column(TableHdu table, string[] names) =>
        names.Select(table.Find).FirstOrDefault(static column => column is not null);

    // Radians without a unit are told by the whole column: no fibre field lies within 2π degrees of zero in both coordinates.
    private static AngleUnit UnitOf(TableColumn ra, TableColumn dec, long rows)
    {
        if (ra.Unit is { Length: > 0 } unit) return SkyAngle.UnitOf(unit);
        if (SkyAngle.UnitOf(ra.Comment ?? "") is not AngleUnit.Degree and var commented) return commented;
        if (!ra.IsNumeric || rows < 2) return AngleUnit.Degree;
        return Largest(ra, rows) is > 0 and <= 2 * Math.PI && Largest(dec, rows) <= Math.PI / 2 ? AngleUnit.Radian : AngleUnit.Degree;
    }

    private static double Largest(TableColumn column, long rows)
    {
        var largest = 0.0;
        for (var row = 0; row < Math.Min(rows, 2000); row++)
            if (double.TryParse(Text(column, row), CultureInfo.InvariantCulture, out var value))
                largest = Math.Max(largest, Math.Abs(value));
        return largest;
    }

    private static bool IsNumber(TableColumn column) => column is { IsNumeric: true, IsVariableLength: false, Repeat: 1 };

    private static string Text(TableColumn column, int row)
    {
        if (column.IsText) return column.ReadString(row).Trim();
        if (column.LengthAt(row) != 1) return "";
        // Identifiers of 19 digits do not survive as doubles.
        return column.IsInteger
            ? column.ReadIntegers(row)[0].ToString(CultureInfo.InvariantCulture)
            : column.IsNumeric ? column.ReadDoubles(row)[0].ToString("R", CultureInfo.InvariantCulture) : "";
    }

    [GeneratedRegex(@"(?<![A-Z])(?:PARKED|UNALLOC\w*|UNUSED|NOT USED)(?![A-Z])", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex ParkedPattern();

    [GeneratedRegex(@"(?<![A-Z])(?:BROKEN|DEAD)(?![A-Z])", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex BrokenPattern();

    [GeneratedRegex(@"(?<![A-Z])SKY(?![A-Z])", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex SkyPattern();
}
