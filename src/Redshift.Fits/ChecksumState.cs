namespace Redshift.Fits;

/// <summary>What a checksum keyword says of its unit.</summary>
public enum ChecksumState
{
    /// <summary>There is no such keyword, or it is empty.</summary>
    Absent,

    /// <summary>The bytes are those that were summed.</summary>
    Correct,

    /// <summary>The bytes changed since.</summary>
    Wrong,
}
