using System.Buffers;

namespace Redshift.Fits;

/// <summary>A whole file in a rented buffer, which it owns and gives back when disposed.</summary>
internal sealed class MemorySource(string name, byte[] rented, int length) : ByteSource(name)
{
    private byte[]? _bytes = rented;

    public override long Length => length;

    public override void Read(long offset, Span<byte> into)
    {
        if (!TryGetSpan(offset, into.Length, out var span)) throw EndsBefore(offset, into.Length);
        span.CopyTo(into);
    }

    public override bool TryGetSpan(long offset, int count, out ReadOnlySpan<byte> span)
    {
        ObjectDisposedException.ThrowIf(_bytes is null, typeof(FitsFile));
        var inside = offset >= 0 && offset <= length - count;
        span = inside ? _bytes.AsSpan((int)offset, count) : default;
        return inside;
    }

    public override void Dispose()
    {
        if (Interlocked.Exchange(ref _bytes, null) is { } bytes) ArrayPool<byte>.Shared.Return(bytes);
    }
}
