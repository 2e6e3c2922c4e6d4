namespace Redshift.Fits;

/// <summary>How one array element is stored (keyword BITPIX, section 4.4.1.1); all are big-endian.</summary>
public enum Bitpix
{
    /// <summary>Unsigned 8-bit integer.</summary>
    Byte = 8,

    /// <summary>Signed 16-bit integer.</summary>
    Int16 = 16,

    /// <summary>Signed 32-bit integer.</summary>
    Int32 = 32,

    /// <summary>Signed 64-bit integer.</summary>
    Int64 = 64,

    /// <summary>IEEE 754 32-bit floating point.</summary>
    Single = -32,

    /// <summary>IEEE 754 64-bit floating point.</summary>
    Double = -64,
}
