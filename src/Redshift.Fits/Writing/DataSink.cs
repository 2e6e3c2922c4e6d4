namespace Redshift.Fits;

/// <summary>Collects bytes into whole blocks, adds up their checksum, and passes them on to a stream if there is one.</summary>
internal sealed class DataSink(Stream? target)
{
    private readonly byte[] _buffer = new byte[20 * Blocks.Length];
    private int _used;

    /// <summary>Checksum of the complete blocks.</summary>
    public uint Sum { get; private set; }

    public void Write(ReadOnlySpan<byte> bytes)
    {
        while (!bytes.IsEmpty)
        {
            var part = bytes[..Math.Min(bytes.Length, _buffer.Length - _used)];
            part.CopyTo(_buffer.AsSpan(_used));
            _used += part.Length;
            bytes = bytes[part.Length..];
            if (_used == _buffer.Length) Flush();
        }
    }

    /// <summary>Fills the last block up with zeros and passes everything on.</summary>
    public void Complete()
    {
        var end = (int)Blocks.RoundUp(_used);
        _buffer.AsSpan(_used..end).Clear();
        _used = end;
        Flush();
    }

    private void Flush()
    {
        var bytes = _buffer.AsSpan(0, _used);
        Sum = Checksum.Add(Sum, bytes);
        target?.Write(bytes);
        _used = 0;
    }
}
