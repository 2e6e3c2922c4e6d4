namespace Redshift.Fits;

/// <summary>How the cells of a column are found and read; rows and lengths were checked by the caller.</summary>
internal abstract class ColumnCells
{
    public abstract int LengthAt(long row);

    public abstract void ReadDoubles(long row, Span<double> into);

    /// <summary>The first element of each of many rows.</summary>
    public abstract void ReadColumn(long firstRow, Span<double> into);

    public abstract void ReadIntegers(long row, Span<long> into);

    public abstract void ReadUnsigned(long row, Span<ulong> into);

    /// <summary>The stored bytes of a cell.</summary>
    public abstract Window ViewCell(long row);
}
