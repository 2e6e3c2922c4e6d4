namespace Redshift.Fits;

/// <summary>A binary or ASCII table.</summary>
public sealed class TableHdu : Hdu
{
    private readonly Lazy<IReadOnlyList<TableColumn>> _columns;

    internal TableHdu(HduLayout layout, ByteSource file, bool isAscii)
        : base(layout, file)
    {
        IsAscii = isAscii;
        Rows = TableRows.Read(layout, file);
        _columns = new Lazy<IReadOnlyList<TableColumn>>(() => ColumnReader.ReadAll(this), LazyThreadSafetyMode.PublicationOnly);
    }

    /// <summary>Number of rows.</summary>
    public long RowCount => Rows.Count;

    /// <summary>The columns, in order; read from the header when first asked for.</summary>
    /// <exception cref="FitsException">The header does not describe columns that fit the rows.</exception>
    public IReadOnlyList<TableColumn> Columns => _columns.Value;

    /// <summary>Whether numbers are written in characters (XTENSION = TABLE).</summary>
    public bool IsAscii { get; }

    internal TableRows Rows { get; }

    /// <summary>The first column of this name, whatever its case, or null.</summary>
    public TableColumn? Find(string name)
    {
        foreach (var column in Columns)
            if (column.Name.Equals(name, StringComparison.OrdinalIgnoreCase)) return column;
        return null;
    }
}
