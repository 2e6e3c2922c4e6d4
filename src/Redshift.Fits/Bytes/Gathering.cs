using System.Buffers;

namespace Redshift.Fits;

/// <summary>
/// Gathers a stream of unknown length: in memory while it is short, in a temporary file, which vanishes when closed, once it is not.
/// </summary>
internal sealed class Gathering(FitsReadOptions options) : IDisposable
{
    private byte[] _buffer = ArrayPool<byte>.Shared.Rent(Math.Clamp(options.MemoryLimit, 1, 1 << 16));
    private int _used;
    private FileStream? _spill;

    private long Length => (_spill?.Length ?? 0) + _used;

    /// <summary>Reads to the end of the stream; false when it is longer than the limit, and then stops.</summary>
    public bool Take(Stream stream, long limit)
    {
        while (true)
        {
            MakeRoom();
            var got = stream.Read(_buffer.AsSpan(_used));
            if (got == 0) return true;
            _used += got;
            if (Length > limit) return false;
        }
    }

    /// <summary>What was gathered; it now belongs to the source.</summary>
    public ByteSource ToSource(string name, FitsException? damage = null)
    {
        if (_spill is null) return new MemorySource(name, Interlocked.Exchange(ref _buffer, []), _used) { Damage = damage };
        Spill();
        _spill.Flush();
        var source = new HandleSource(name, _spill.SafeFileHandle, _spill) { Damage = damage };
        _spill = null;
        return source;
    }

    public void Dispose()
    {
        _spill?.Dispose();
        if (_buffer.Length > 0) ArrayPool<byte>.Shared.Return(_buffer);
    }

    private void MakeRoom()
    {
        if (_used < _buffer.Length) return;
        if (_used >= Math.Min(options.MemoryLimit, Array.MaxLength / 2)) Spill();
        else Grow();
    }

    private void Grow()
    {
        var larger = ArrayPool<byte>.Shared.Rent(2 * _used);
        _buffer.AsSpan(0, _used).CopyTo(larger);
        ArrayPool<byte>.Shared.Return(_buffer);
        _buffer = larger;
    }

    private void Spill()
    {
        _spill ??= new FileStream(Path.GetTempFileName(), FileMode.Open, FileAccess.ReadWrite, FileShare.None, 0, FileOptions.DeleteOnClose);
        _spill.Write(_buffer.AsSpan(0, _used));
        _used = 0;
    }
}
