namespace Redshift.Fits;

/// <summary>The 2880-byte blocks all FITS files are made of (section 3.1).</summary>
internal static class Blocks
{
    public const int Length = 2880;

    public static long RoundUp(long bytes) => checked((bytes + Length - 1) / Length * Length);
}
