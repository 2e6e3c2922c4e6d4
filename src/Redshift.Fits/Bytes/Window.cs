using System.Buffers;

namespace Redshift.Fits;

/// <summary>Some bytes of a source, lent for a short time: either a view of its memory or a rented copy.</summary>
internal readonly ref struct Window
{
    private readonly byte[]? _rented;

    public Window(ReadOnlySpan<byte> bytes) => Bytes = bytes;

    public Window(ByteSource source, long offset, int length)
    {
        _rented = ArrayPool<byte>.Shared.Rent(length);
        var filled = _rented.AsSpan(0, length);
        source.Read(offset, filled);
        Bytes = filled;
    }

    public ReadOnlySpan<byte> Bytes { get; }

    public void Dispose()
    {
        if (_rented is not null) ArrayPool<byte>.Shared.Return(_rented);
    }
}
