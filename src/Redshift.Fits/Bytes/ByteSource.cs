namespace Redshift.Fits;

/// <summary>Random access to bytes: a file, a buffer, or the pixels of a compressed image laid out as if they were not compressed.</summary>
internal abstract class ByteSource(string name) : IDisposable
{
    public string Name { get; } = name;

    public abstract long Length { get; }

    /// <summary>What went wrong while the bytes were gathered, such as a gzip stream that breaks off.</summary>
    public FitsException? Damage { get; init; }

    /// <summary>Fills the span from the given offset; a source that ends before throws <see cref="FitsTruncatedException"/>.</summary>
    public abstract void Read(long offset, Span<byte> into);

    /// <summary>The bytes without copying, where the source has them in memory.</summary>
    public virtual bool TryGetSpan(long offset, int length, out ReadOnlySpan<byte> span)
    {
        span = default;
        return false;
    }

    /// <summary>A view of some bytes, without copying when possible; dispose it soon.</summary>
    public Window View(long offset, int length) =>
        TryGetSpan(offset, length, out var span) ? new Window(span) : new Window(this, offset, length);

    public abstract void Dispose();

    protected FitsTruncatedException EndsBefore(long offset, long length) =>
        new(new FitsLocation(Name, Offset: offset), $"{length} bytes here", $"{Math.Max(0, Length - offset)}");
}
