using System.Globalization;
using Redshift.Fits;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>A table with one row a spectrum that names the targets: a fibre table, or the table of the spectra itself.</summary>
internal sealed class TargetTable
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

    private readonly TableHdu _table;
    private readonly TableColumn? _name;
    private readonly TableColumn? _ra;
    private readonly TableColumn? _dec;
    private readonly TableColumn? _type;
    private readonly TableColumn? _status;
    private readonly string _angleUnit;

    /// <summary>Finds the columns of a table.</summary>
    public TargetTable(TableHdu table)
    {
        _table = table;
        _name = Column(NameColumns);
        _ra = Column(RaColumns);
        _dec = Column(DecColumns);
        _type = Column("TYPE", "OBJTYPE", "FIBERTYPE", "FIBRETYPE", "TARGUSE", "TARGET_TYPE", "FIBTYPE");
        _status = Column("STATUS", "FIBSTATUS", "FIBRE_STATUS");
        _angleUnit = AngleUnit();
    }

    /// <summary>Whether the table says who the targets are.</summary>
    public bool TellsTargets => _name is not null || (_ra is not null && _dec is not null) || _type is not null;

    /// <summary>The table's place.</summary>
    public string Place => $"HDU {_table.Index} {_table.Name}".TrimEnd();

    /// <summary>Number of rows.</summary>
    public long Count => _table.RowCount;

    /// <summary>The companion table of a stack: the first with as many rows that tells targets.</summary>
    public static TargetTable? For(FitsFile file, long rows) => file.Hdus.OfType<TableHdu>()
        .Where(table => table.RowCount == rows)
        .Select(static table => new TargetTable(table))
        .FirstOrDefault(static table => table.TellsTargets);

    /// <summary>The target's name; empty where there is none.</summary>
    public string Name(int row) => _name is null ? "" : Text(_name, row);

    /// <summary>The target's position in degrees.</summary>
    public (double Ra, double Dec)? Position(int row)
    {
        if (_ra is null || _dec is null) return null;
        var ra = SkyAngle.RightAscension(Text(_ra, row), _angleUnit);
        var dec = SkyAngle.Declination(Text(_dec, row), _angleUnit);
        return ra is { } alpha && dec is { } delta ? (alpha, delta) : null;
    }

    /// <summary>What the fibre looks at, by its type or by its name.</summary>
    public FibreState State(int row)
    {
        if (_type is { } type && FromWord(Text(type, row)) is not FibreState.Object and var byType) return byType;
        if (_status is { } status && FromWord(Text(status, row)) is not FibreState.Object and var byStatus) return byStatus;
        return FromName(Name(row));
    }

    private static FibreState FromWord(string word) => word.ToUpperInvariant() switch
    {
        "S" or "SKY" => FibreState.Sky,
        "U" or "UNUSED" or "UNALLOCATED" or "UNASSIGNED" or "PARKED" or "F" or "GUIDE" => FibreState.Parked,
        "N" or "BAD" or "BROKEN" or "DEAD" or "DISABLED" or "BRK" => FibreState.Broken,
        _ => FibreState.Object,
    };

    private static FibreState FromName(string name)
    {
        var upper = name.ToUpperInvariant();
        if (upper.ContainsAny("PARKED", "UNALLOC"))
            return FibreState.Parked;
        if (upper.ContainsAny("BROKEN") || upper.BeginsWithAny("DEAD"))
            return FibreState.Broken;
        return upper == "SKY" || upper.BeginsWithAny("SKY_", "SKY ")
            ? FibreState.Sky
            : FibreState.Object;
    }

    private TableColumn? Column(params ReadOnlySpan<string> names)
    {
        foreach (var name in names)
            if (_table.Find(name) is { } column) return column;
        return null;
    }

    // Radians without a unit are told by the whole column: no fibre field lies within 2π degrees of zero in both coordinates.
    private string AngleUnit()
    {
        if (_ra is null || _dec is null || !_ra.IsNumeric) return _ra?.Unit ?? "";
        if (_ra.Unit is { Length: > 0 } unit) return unit;
        var (ra, dec) = (Largest(_ra), Largest(_dec));
        return _table.RowCount > 1 && ra <= 2 * Math.PI && dec <= Math.PI / 2 && ra > 0 ? "rad" : "";
    }

    private double Largest(TableColumn column)
    {
        var largest = 0.0;
        for (var row = 0; row < Math.Min(_table.RowCount, 2000); row++)
            if (double.TryParse(Text(column, row), CultureInfo.InvariantCulture, out var value))
                largest = Math.Max(largest, Math.Abs(value));
        return largest;
    }

    private static string Text(TableColumn column, int row)
    {
        if (column.IsText) return column.ReadString(row).Trim();
        if (column.LengthAt(row) != 1) return "";
        // Identifiers of 19 digits do not survive as doubles.
        return column.IsInteger
            ? column.ReadIntegers(row)[0].ToString(CultureInfo.InvariantCulture)
            : column.IsNumeric ? column.ReadDoubles(row)[0].ToString("R", CultureInfo.InvariantCulture) : "";
    }
}
