using System.Text;

namespace Redshift.Fits;

/// <summary>Cells of an ASCII table: numbers written in characters. A blank number is zero, as in Fortran; TNULLn is none.</summary>
internal sealed class AsciiCells(TableRows rows, AsciiFormat format, int offset, Scaling scaling, string? nullText, FitsLocation where)
    : ColumnCells
{
    private readonly byte[]? _null = nullText is null ? null : Encoding.ASCII.GetBytes(nullText.TrimEnd(' '));

    public override int LengthAt(long row) => 1;

    public override void ReadDoubles(long row, Span<double> into) => ReadColumn(row, into);

    public override void ReadColumn(long firstRow, Span<double> into)
    {
        for (var i = 0; i < into.Length; i++)
        {
            using var cell = ViewCell(firstRow + i);
            into[i] = IsNull(cell.Bytes) ? double.NaN : scaling.Zero + scaling.Scale * Number(cell.Bytes, firstRow + i);
        }
    }

    public override void ReadIntegers(long row, Span<long> into)
    {
        if (!into.IsEmpty) into[0] = long.CreateChecked(Shifted(row, long.MinValue, long.MaxValue));
    }

    public override void ReadUnsigned(long row, Span<ulong> into)
    {
        if (!into.IsEmpty) into[0] = ulong.CreateChecked(Shifted(row, ulong.MinValue, ulong.MaxValue));
    }

    public override Window ViewCell(long row) => rows.Source.View(rows.OffsetOf(row) + offset, format.Width);

    private bool IsNull(ReadOnlySpan<byte> field) => _null is not null && field.TrimEnd((byte)' ').SequenceEqual(_null);

    private Int128 Shifted(long row, Int128 least, Int128 most)
    {
        var value = Integer(row) + (Int128)scaling.Zero;
        return value >= least && value <= most
            ? value
            : throw new FitsUnsupportedException(where with { Offset = rows.OffsetOf(row) + offset }, "the value does not fit 64 bits");
    }

    private long Integer(long row)
    {
        using var cell = ViewCell(row);
        var text = cell.Bytes.Trim((byte)' ');
        if (text.IsEmpty) return 0;
        return FitsNumber.TryInteger(text, out var value) ? value : throw Unreadable(cell.Bytes, row);
    }

    private double Number(ReadOnlySpan<byte> field, long row)
    {
        var text = field.Trim((byte)' ');
        if (text.IsEmpty) return 0;
        if (!FitsNumber.TryDouble(text, out var value)) throw Unreadable(field, row);
        return format.Decimals > 0 && !text.Contains((byte)'.') ? WithImpliedPoint(value) : value;
    }

    // Section 7.2.1: without a written point the last d digits of the mantissa are decimals.
    private double WithImpliedPoint(double value) => value / Math.Pow(10, format.Decimals);

    private FitsIntegrityException Unreadable(ReadOnlySpan<byte> field, long row) =>
        new(where with { Offset = rows.OffsetOf(row) + offset }, "a number", $"'{Encoding.Latin1.GetString(field)}'");
}
