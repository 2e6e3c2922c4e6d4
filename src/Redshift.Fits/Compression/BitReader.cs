namespace Redshift.Fits;

/// <summary>Takes bits from a compressed tile, the highest of a byte first.</summary>
internal ref struct BitReader(ReadOnlySpan<byte> bytes, FitsLocation where)
{
    private readonly ReadOnlySpan<byte> _bytes = bytes;
    private int _next;
    private ulong _held;
    private int _count;

    public int Bit() => (int)Bits(1);

    /// <summary>Up to 32 bits as an unsigned number.</summary>
    public uint Bits(int count)
    {
        while (_count < count) Fetch();
        _count -= count;
        return (uint)((_held >> _count) & ((1UL << count) - 1));
    }

    /// <summary>Counts zeros up to the next one, which is taken too.</summary>
    public int Zeros()
    {
        var zeros = 0;
        while (true)
        {
            if (_count == 0) Fetch();
            var rest = _held & ((1UL << _count) - 1);
            if (rest != 0)
            {
                var leading = _count - 1 - System.Numerics.BitOperations.Log2(rest);
                _count -= leading + 1;
                return zeros + leading;
            }

            zeros += _count;
            _count = 0;
        }
    }

    /// <summary>Drops what is left of a byte begun.</summary>
    public void AlignToByte() => _count -= _count % 8;

    public byte Byte() => (byte)Bits(8);

    public int Int32() => (int)Bits(32);

    public long Int64() => ((long)Int32() << 32) | (uint)Int32();

    private void Fetch()
    {
        if (_next >= _bytes.Length) throw new FitsIntegrityException(where, "more bits of a compressed tile", "the end of its data");
        _held = (_held << 8) | _bytes[_next++];
        _count += 8;
    }
}
