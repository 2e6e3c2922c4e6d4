namespace Redshift.Fits;

/// <summary>The file ends before what its headers announce.</summary>
public sealed class FitsTruncatedException : FitsException
{
    internal FitsTruncatedException(FitsLocation location, string expected, string found)
        : base(location, expected, found, "the file is cut short: ")
    {
    }
}
