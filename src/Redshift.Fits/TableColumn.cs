using System.Globalization;
using System.Numerics;
using System.Text;

namespace Redshift.Fits;

/// <summary>
/// One column of a table. A cell holds <see cref="LengthAt"/> elements. Reading a column as something it does not hold
/// throws <see cref="FitsUnsupportedException"/>, since it is the file that decides what a column holds.
/// </summary>
public sealed class TableColumn
{
    private readonly ColumnShape _shape;
    private readonly ColumnCells _cells;
    private readonly Scaling _scaling;

    internal TableColumn(TableHdu table, int index, ColumnShape shape, ColumnCells cells, Scaling scaling)
    {
        Table = table;
        _shape = shape;
        _cells = cells;
        _scaling = scaling;
        Index = index;
        Name = Text("TTYPE") ?? "";
        var axes = Fits.Dimensions.TryParse(Text("TDIM"));
        Dimensions = axes is not null && (IsVariableLength || Fits.Dimensions.Fit(axes, Repeat)) ? axes : [Repeat];
    }

    /// <summary>The table it is a column of.</summary>
    public TableHdu Table { get; }

    /// <summary>0-based place in the table.</summary>
    public int Index { get; }

    /// <summary>TTYPEn, or empty.</summary>
    public string Name { get; }

    /// <summary>TUNITn, as written.</summary>
    public string? Unit => Text("TUNIT");

    /// <summary>TUCDn.</summary>
    public string? Ucd => Text("TUCD");

    /// <summary>TUTYPn.</summary>
    public string? Utype => Text("TUTYP");

    /// <summary>TCOMMn, else the comment behind the name; null when there is neither.</summary>
    public string? Comment => Text("TCOMM") ?? (Card("TTYPE")?.Comment is { Length: > 0 } comment ? comment : null);

    /// <summary>Element type.</summary>
    public ColumnType Type => _shape.Type;

    /// <summary>Elements of a cell that lies in its row; 1 for arrays in the heap.</summary>
    public int Repeat => _shape.Repeat;

    /// <summary>Whether the cells are arrays of their own lengths, in the heap.</summary>
    public bool IsVariableLength => _shape.IsVariable;

    /// <summary>Axes of a cell, the fastest first: TDIMn, or the repeat count alone.</summary>
    public IReadOnlyList<long> Dimensions { get; }

    /// <summary>Whether the cells hold numbers, neither complex ones nor bits.</summary>
    public bool IsNumeric => Type.IsNumeric();

    /// <summary>Whether the cells hold characters.</summary>
    public bool IsText => Type == ColumnType.Text;

    /// <summary>Whether all numbers are integers that <see cref="ReadIntegers"/> gives exactly.</summary>
    public bool IsInteger => IsNumeric && Type is not (ColumnType.Single or ColumnType.Double) && _scaling.IsExact;

    /// <summary>Number of elements in a cell.</summary>
    /// <exception cref="FitsIntegrityException">The cell points outside the heap.</exception>
    public int LengthAt(long row)
    {
        RequireRows(row, 1);
        return _cells.LengthAt(row);
    }

    /// <summary>The numbers of a cell, TSCALn and TZEROn applied; TNULLn becomes NaN.</summary>
    public double[] ReadDoubles(long row)
    {
        var values = GC.AllocateUninitializedArray<double>(NumericLength(row));
        _cells.ReadDoubles(row, values);
        return values;
    }

    /// <summary>Fills the span with the first numbers of a cell.</summary>
    /// <exception cref="ArgumentException">The cell has fewer.</exception>
    public void ReadDoubles(long row, Span<double> into)
    {
        if (into.Length > NumericLength(row)) throw new ArgumentException("the cell has fewer elements", nameof(into));
        _cells.ReadDoubles(row, into);
    }

    /// <summary>The numbers of a column with one number a row.</summary>
    public double[] ReadColumn()
    {
        RequireScalar();
        if (Table.RowCount > Array.MaxLength) throw Unsupported("has more rows than an array can hold");
        var values = GC.AllocateUninitializedArray<double>((int)Table.RowCount);
        ReadColumn(0, values);
        return values;
    }

    /// <summary>Fills the span with the numbers of consecutive rows of a column with one number a row.</summary>
    public void ReadColumn(long firstRow, Span<double> into)
    {
        RequireScalar();
        RequireRows(firstRow, into.Length);
        _cells.ReadColumn(firstRow, into);
    }

    /// <summary>The integers of a cell, exactly. TNULLn is given as it stands, shifted by TZEROn like the rest.</summary>
    public long[] ReadIntegers(long row)
    {
        var values = new long[IntegerLength(row)];
        _cells.ReadIntegers(row, values);
        return values;
    }

    /// <summary>The integers of a cell as unsigned ones, for columns shifted by 2^63.</summary>
    public ulong[] ReadUnsigned(long row)
    {
        var values = new ulong[IntegerLength(row)];
        _cells.ReadUnsigned(row, values);
        return values;
    }

    /// <summary>The text of a cell, up to a NUL, without trailing blanks; several strings of a cell are one here.</summary>
    public string ReadString(long row)
    {
        Require(IsText, "text", row);
        using var cell = _cells.ViewCell(row);
        return Trimmed(cell.Bytes);
    }

    /// <summary>The strings of a cell that holds several of equal length (<c>rAw</c>, or TDIMn with the length first).</summary>
    public string[] ReadStrings(long row)
    {
        Require(IsText, "text", row);
        using var cell = _cells.ViewCell(row);
        var length = StringLength(cell.Bytes.Length);
        var strings = new string[cell.Bytes.Length / length];
        for (var i = 0; i < strings.Length; i++) strings[i] = Trimmed(cell.Bytes.Slice(i * length, length));
        return strings;
    }

    /// <summary>The logical values of a cell; null where undefined.</summary>
    public bool?[] ReadLogicals(long row)
    {
        Require(Type == ColumnType.Logical, "logical values", row);
        using var cell = _cells.ViewCell(row);
        var values = new bool?[cell.Bytes.Length];
        for (var i = 0; i < values.Length; i++)
            values[i] = cell.Bytes[i] switch { (byte)'T' => true, (byte)'F' => false, _ => null };
        return values;
    }

    /// <summary>The bits of a cell.</summary>
    public bool[] ReadBits(long row)
    {
        Require(Type == ColumnType.Bit, "bits", row);
        using var cell = _cells.ViewCell(row);
        var bits = new bool[_cells.LengthAt(row)];
        for (var i = 0; i < bits.Length; i++) bits[i] = (cell.Bytes[i / 8] & (0x80 >> (i % 8))) != 0;
        return bits;
    }

    /// <summary>The complex numbers of a cell, scaled.</summary>
    public Complex[] ReadComplex(long row)
    {
        Require(Type.IsComplex(), "complex numbers", row);
        var parts = new double[2 * _cells.LengthAt(row)];
        _cells.ReadDoubles(row, parts);
        var values = new Complex[parts.Length / 2];
        for (var i = 0; i < values.Length; i++) values[i] = new Complex(_scaling.Zero + parts[2 * i], parts[2 * i + 1]);
        return values;
    }

    internal Window ViewCell(long row) => _cells.ViewCell(row);

    private string? Text(string stem) => Table.Header.GetString(Keywords.Indexed(stem, Index + 1));

    private Card? Card(string stem) => Table.Header.Find(Keywords.Indexed(stem, Index + 1));

    private int StringLength(int cell)
    {
        if (_shape.SubstringLength > 0) return Math.Min(_shape.SubstringLength, Math.Max(1, cell));
        return Dimensions.Count > 1 ? (int)Dimensions[0] : Math.Max(1, cell);
    }

    private static string Trimmed(ReadOnlySpan<byte> text)
    {
        var end = text.IndexOf((byte)0);
        return Encoding.Latin1.GetString((end < 0 ? text : text[..end]).TrimEnd((byte)' '));
    }

    private int NumericLength(long row)
    {
        Require(IsNumeric, "numbers", row);
        return _cells.LengthAt(row);
    }

    private int IntegerLength(long row)
    {
        Require(IsInteger, "unscaled integers", row);
        return _cells.LengthAt(row);
    }

    private void Require(bool holds, string what, long row)
    {
        if (!holds) throw Unsupported($"holds {Type}, not {what}");
        RequireRows(row, 1);
    }

    private void RequireScalar()
    {
        if (!IsNumeric || IsVariableLength || Repeat != 1) throw Unsupported("does not hold one number a row");
    }

    private void RequireRows(long first, int count)
    {
        if (first >= 0 && first <= Table.RowCount - count) return;
        throw new ArgumentOutOfRangeException(
            nameof(first), string.Create(CultureInfo.InvariantCulture, $"{count} rows from {first} are outside the {Table.RowCount} of the table"));
    }

    private FitsUnsupportedException Unsupported(string what) =>
        new(Table.Layout.Where, string.Create(CultureInfo.InvariantCulture, $"column {Index + 1} '{Name}' {what}"));
}
