namespace Redshift.Fits;

/// <summary>Bounds kept while reading. The defaults suit spectra and images of any survey.</summary>
public sealed class FitsReadOptions
{
    internal static readonly FitsReadOptions Default = new();

    /// <summary>Files (or decompressed content) up to this many bytes are held in memory; longer ones are read piece by piece. Default 16 MiB.</summary>
    public int MemoryLimit { get; init; } = 16 << 20;

    /// <summary>Most bytes that a gzip file or a tile-compressed image may expand to. Default 4 GiB.</summary>
    public long MaxExpandedBytes { get; init; } = 4L << 30;

    /// <summary>
    /// Most bytes that one compressed byte may stand for once the expansion passes 64 MiB. Default 1000: gzip reaches 1032 at
    /// best, on nothing but zeros, and blank images in tiles some hundreds.
    /// </summary>
    public int MaxExpansionRatio { get; init; } = 1000;

    // Small files may compress as well as they like.
    private const long AlwaysAllowed = 64L << 20;

    internal long ExpansionLimit(long compressedBytes) =>
        Math.Min(MaxExpandedBytes, Math.Max(AlwaysAllowed, SaturatedProduct(compressedBytes, MaxExpansionRatio)));

    private static long SaturatedProduct(long a, long b) => (long)Int128.Min((Int128)a * b, long.MaxValue);
}
