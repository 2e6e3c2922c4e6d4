namespace Redshift.Fits;

/// <summary>A header card that the standard requires is missing or carries an impossible value.</summary>
public sealed class FitsHeaderException : FitsException
{
    internal FitsHeaderException(FitsLocation location, string expected, string found)
        : base(location, expected, found, "")
    {
    }
}
