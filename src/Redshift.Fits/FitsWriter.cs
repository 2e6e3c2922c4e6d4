namespace Redshift.Fits;

/// <summary>
/// Writes header-data units one after the other to a stream, which stays the caller's and need not be seekable.
/// Cards that describe the storage (NAXIS, TFORM and their like) are left out of what the caller gives.
/// </summary>
/// <param name="stream">Where to write.</param>
/// <param name="checksums">Whether every unit gets DATASUM and CHECKSUM.</param>
public sealed class FitsWriter(Stream stream, bool checksums = false)
{
    private const int Piece = 1 << 14;

    private bool _hasPrimary;

    /// <summary>Writes a unit without data: the primary one when it is the first.</summary>
    public void WriteHeader(string name, IEnumerable<Card>? cards = null) => WriteImage<byte>(name, Bitpix.Byte, [], [], cards);

    /// <summary>Writes a 64-bit float array; the first unit becomes the primary one.</summary>
    /// <param name="name">EXTNAME, or empty for none.</param>
    /// <param name="values">Elements, the first axis fastest.</param>
    /// <param name="shape">Axis lengths, NAXIS1 first.</param>
    /// <param name="cards">More cards, or null.</param>
    /// <exception cref="ArgumentException">The shape does not fit the number of values.</exception>
    public void WriteImage(string name, ReadOnlySpan<double> values, ReadOnlySpan<long> shape, IEnumerable<Card>? cards = null) =>
        WriteImage(name, Bitpix.Double, values, shape, cards);

    /// <summary>Writes a 32-bit float array.</summary>
    /// <inheritdoc cref="WriteImage(string, ReadOnlySpan{double}, ReadOnlySpan{long}, IEnumerable{Card})"/>
    public void WriteImage(string name, ReadOnlySpan<float> values, ReadOnlySpan<long> shape, IEnumerable<Card>? cards = null) =>
        WriteImage(name, Bitpix.Single, values, shape, cards);

    /// <summary>Writes a 64-bit integer array.</summary>
    /// <inheritdoc cref="WriteImage(string, ReadOnlySpan{double}, ReadOnlySpan{long}, IEnumerable{Card})"/>
    public void WriteImage(string name, ReadOnlySpan<long> values, ReadOnlySpan<long> shape, IEnumerable<Card>? cards = null) =>
        WriteImage(name, Bitpix.Int64, values, shape, cards);

    /// <summary>Writes a 32-bit integer array.</summary>
    /// <inheritdoc cref="WriteImage(string, ReadOnlySpan{double}, ReadOnlySpan{long}, IEnumerable{Card})"/>
    public void WriteImage(string name, ReadOnlySpan<int> values, ReadOnlySpan<long> shape, IEnumerable<Card>? cards = null) =>
        WriteImage(name, Bitpix.Int32, values, shape, cards);

    /// <summary>Writes a 16-bit integer array.</summary>
    /// <inheritdoc cref="WriteImage(string, ReadOnlySpan{double}, ReadOnlySpan{long}, IEnumerable{Card})"/>
    public void WriteImage(string name, ReadOnlySpan<short> values, ReadOnlySpan<long> shape, IEnumerable<Card>? cards = null) =>
        WriteImage(name, Bitpix.Int16, values, shape, cards);

    /// <summary>Writes an unsigned 8-bit integer array.</summary>
    /// <inheritdoc cref="WriteImage(string, ReadOnlySpan{double}, ReadOnlySpan{long}, IEnumerable{Card})"/>
    public void WriteImage(string name, ReadOnlySpan<byte> values, ReadOnlySpan<long> shape, IEnumerable<Card>? cards = null) =>
        WriteImage(name, Bitpix.Byte, values, shape, cards);

    /// <summary>Writes a binary table, behind an empty primary unit when it is the first.</summary>
    /// <param name="name">EXTNAME, or empty for none.</param>
    /// <param name="rows">Number of rows.</param>
    /// <param name="columns">Columns, at most 999.</param>
    /// <param name="cards">More cards, or null.</param>
    public void WriteTable(string name, long rows, IReadOnlyList<ColumnDefinition> columns, IEnumerable<Card>? cards = null)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(columns.Count, 999);
        if (!_hasPrimary) WriteHeader("");
        var header = TableHeader.Build(name, rows, columns);
        AddCards(header, name, cards);
        WriteUnit(header, sink => TableHeader.WriteRows(sink, rows, columns));
    }

    private void WriteImage<T>(
        string name, Bitpix bitpix, ReadOnlySpan<T> values, ReadOnlySpan<long> shape, IEnumerable<Card>? cards)
        where T : unmanaged
    {
        if (HduLayout.Elements(shape) != values.Length) throw new ArgumentException("the shape does not fit the number of values", nameof(shape));
        var header = ImageHeader.Build(name, bitpix, shape, isPrimary: !_hasPrimary);
        AddCards(header, name, cards);
        var dataSum = 0u;
        if (checksums) dataSum = Send(values, new DataSink(null));
        stream.Write(checksums ? header.ToBytes(dataSum) : header.ToBytes());
        Send(values, new DataSink(stream));
        _hasPrimary = true;
    }

    private static uint Send<T>(ReadOnlySpan<T> values, DataSink sink)
        where T : unmanaged
    {
        var bytes = new byte[Piece * HostOrder.SizeOf<T>()];
        for (; !values.IsEmpty; values = values[Math.Min(Piece, values.Length)..])
        {
            var part = values[..Math.Min(Piece, values.Length)];
            HostOrder.Encode(part, bytes);
            sink.Write(bytes.AsSpan(0, part.Length * HostOrder.SizeOf<T>()));
        }

        sink.Complete();
        return sink.Sum;
    }

    private void WriteUnit(HeaderBuilder header, Action<DataSink> data)
    {
        stream.Write(checksums ? header.ToBytes(Send(data, null)) : header.ToBytes());
        Send(data, stream);
    }

    private static uint Send(Action<DataSink> data, Stream? target)
    {
        var sink = new DataSink(target);
        data(sink);
        sink.Complete();
        return sink.Sum;
    }

    private static void AddCards(HeaderBuilder header, string name, IEnumerable<Card>? cards)
    {
        foreach (var card in cards ?? [])
            if (!Structure.Describes(card) && !(name.Length > 0 && card.Keyword == "EXTNAME")) header.Add(card);
    }
}
