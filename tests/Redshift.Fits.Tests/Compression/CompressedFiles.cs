namespace Redshift.Fits.Tests;

/// <summary>The files made by Data/make.py.</summary>
internal static class CompressedFiles
{
    public static readonly string[] Names =
    [
        "rice-int16", "rice-byte", "rice-int32", "rice-float-dither1", "rice-double-dither2", "gzip-int32", "gzip2-int16",
        "gzip2-float-lossless", "gzip-float-nan", "plio-int16", "hcompress-int16", "hcompress-smooth",
    ];

    public static Stream Open(string name) =>
        typeof(CompressedFiles).Assembly.GetManifestResourceStream(name + ".fits.gz") ?? throw new FileNotFoundException(name);
}
