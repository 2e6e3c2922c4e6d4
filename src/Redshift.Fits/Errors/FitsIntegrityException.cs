namespace Redshift.Fits;

/// <summary>The data contradict themselves or their header: a broken compressed stream, an array outside its heap.</summary>
public sealed class FitsIntegrityException : FitsException
{
    internal FitsIntegrityException(FitsLocation location, string expected, string found, Exception? inner = null)
        : base(location, expected, found, "", inner)
    {
    }
}
