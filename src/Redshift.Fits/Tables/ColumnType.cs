namespace Redshift.Fits;

/// <summary>What the elements of a table column are (sections 7.2.1 and 7.3.1). ASCII tables know text, integers and doubles.</summary>
public enum ColumnType
{
    /// <summary>True, false or undefined (L).</summary>
    Logical,

    /// <summary>Bits, the highest of a byte first (X).</summary>
    Bit,

    /// <summary>Unsigned 8-bit integer (B).</summary>
    Byte,

    /// <summary>Signed 16-bit integer (I).</summary>
    Int16,

    /// <summary>Signed 32-bit integer (J).</summary>
    Int32,

    /// <summary>Signed 64-bit integer (K), or the integers of an ASCII table.</summary>
    Int64,

    /// <summary>Characters (A).</summary>
    Text,

    /// <summary>32-bit floating point (E).</summary>
    Single,

    /// <summary>64-bit floating point (D), or the real numbers of an ASCII table.</summary>
    Double,

    /// <summary>Pair of 32-bit floats (C).</summary>
    ComplexSingle,

    /// <summary>Pair of 64-bit floats (M).</summary>
    ComplexDouble,
}
