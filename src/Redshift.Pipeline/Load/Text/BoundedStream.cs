namespace Redshift.Pipeline.Load.Text;

/// <summary>Passes text on as long as its lines and its whole stay within bounds, so that no file can fill the memory.</summary>
/// <param name="inner">The text; it stays the caller's.</param>
/// <param name="mostBytes">Most bytes of the whole.</param>
internal sealed class BoundedStream(Stream inner, long mostBytes) : Stream
{
    /// <summary>Most bytes between two ends of lines.</summary>
    public const int LongestLine = 1 << 20;

    private long _total;
    private long _sinceLineEnd;

    /// <inheritdoc/>
    public override bool CanRead => true;

    /// <inheritdoc/>
    public override bool CanSeek => false;

    /// <inheritdoc/>
    public override bool CanWrite => false;

    /// <inheritdoc/>
    public override long Length => throw new NotSupportedException();

    /// <inheritdoc/>
    public override long Position
    {
        get => throw new NotSupportedException();
        set => throw new NotSupportedException();
    }

    /// <inheritdoc/>
    public override int Read(Span<byte> buffer)
    {
        var read = inner.Read(buffer);
        _total += read;
        var lineEnd = buffer[..read].LastIndexOfAny((byte)'\n', (byte)'\r');
        _sinceLineEnd = lineEnd < 0 ? _sinceLineEnd + read : read - lineEnd - 1;
        if (_sinceLineEnd > LongestLine) throw new LoadException("text", $"a line of more than {LongestLine} bytes", "columns of numbers, or a FITS file");
        return _total <= mostBytes ? read : throw new LoadException("text", $"more than {mostBytes} bytes", "the text of one spectrum");
    }

    /// <inheritdoc/>
    public override int Read(byte[] buffer, int offset, int count) => Read(buffer.AsSpan(offset, count));

    /// <inheritdoc/>
    public override void Flush()
    {
    }

    /// <inheritdoc/>
    public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void SetLength(long value) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void Write(byte[] buffer, int offset, int count) => throw new NotSupportedException();
}
