namespace Redshift.Fits;

/// <summary>The file may be sound, but asks for something that is not read here, or not in the way it was asked for.</summary>
public sealed class FitsUnsupportedException : FitsException
{
    internal FitsUnsupportedException(FitsLocation location, string message)
        : base(location, message)
    {
    }
}
