namespace Redshift.Fits;

/// <summary>Properties of the column types.</summary>
internal static class ColumnTypes
{
    public static bool IsNumeric(this ColumnType type) =>
        type is ColumnType.Byte or ColumnType.Int16 or ColumnType.Int32 or ColumnType.Int64 or ColumnType.Single or ColumnType.Double;

    public static bool IsComplex(this ColumnType type) => type is ColumnType.ComplexSingle or ColumnType.ComplexDouble;

    /// <summary>Bytes that so many elements take.</summary>
    public static long BytesOf(this ColumnType type, long count) => type switch
    {
        ColumnType.Bit => (count + 7) / 8,
        ColumnType.Logical or ColumnType.Byte or ColumnType.Text => count,
        ColumnType.Int16 => 2 * count,
        ColumnType.Int32 or ColumnType.Single => 4 * count,
        ColumnType.ComplexDouble => 16 * count,
        _ => 8 * count,
    };

    /// <summary>The stored number, or each of the two of a complex one.</summary>
    public static Bitpix ToBitpix(this ColumnType type) => type switch
    {
        ColumnType.Int16 => Bitpix.Int16,
        ColumnType.Int32 => Bitpix.Int32,
        ColumnType.Int64 => Bitpix.Int64,
        ColumnType.Single or ColumnType.ComplexSingle => Bitpix.Single,
        ColumnType.Double or ColumnType.ComplexDouble => Bitpix.Double,
        _ => Bitpix.Byte,
    };
}
