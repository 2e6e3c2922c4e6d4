namespace Redshift.Fits;

/// <summary>The bytes are not a FITS file at all: they do not begin with <c>SIMPLE  =</c>.</summary>
public sealed class NotFitsException : FitsException
{
    internal NotFitsException(FitsLocation location, string found)
        : base(location, $"not a FITS file: expected it to begin with 'SIMPLE  =', found {found}")
    {
    }
}
