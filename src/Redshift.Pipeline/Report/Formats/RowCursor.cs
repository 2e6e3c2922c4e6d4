namespace Redshift.Pipeline.Report.Formats;

/// <summary>Rows by number for a writer that asks in order, from the first, as often as it likes; one row is held at a time.</summary>
internal sealed class RowCursor<TRow>(IEnumerable<TRow> rows) : IDisposable
{
    private IEnumerator<TRow>? _rows;
    private long _at = -1;

    /// <summary>The row of this number: the same as before, a later one, or the first.</summary>
    /// <exception cref="IOException">There are fewer rows than at an earlier time.</exception>
    public TRow At(long row)
    {
        if (_rows is null || row < _at)
            Restart();
        for (; _at < row; _at++)
        {
            if (!_rows!.MoveNext())
                throw new IOException("the table lost rows while it was written");
        }

        return _rows!.Current;
    }

    /// <inheritdoc/>
    public void Dispose() => _rows?.Dispose();

    private void Restart()
    {
        _rows?.Dispose();
        _rows = rows.GetEnumerator();
        _at = -1;
    }
}
