using System.Buffers;

namespace Redshift.Pipeline.Numerics;

/// <summary>Room for intermediate values, given back when it is disposed: arrays of this size would stay until the next full collection.</summary>
/// <param name="length">Number of values; what they are at first is unknown.</param>
internal readonly ref struct LentArray<T>(int length)
{
    private readonly T[] _array = ArrayPool<T>.Shared.Rent(length);

    /// <summary>The values.</summary>
    public Span<T> Span => _array.AsSpan(0, length);

    /// <summary>Gives the room back.</summary>
    public void Dispose() => ArrayPool<T>.Shared.Return(_array);
}
