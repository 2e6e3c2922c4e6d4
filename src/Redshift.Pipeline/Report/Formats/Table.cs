namespace Redshift.Pipeline.Report.Formats;

/// <summary>A table to be written in some format.</summary>
/// <param name="Name">Name of the table, such as <c>catalogue</c>.</param>
/// <param name="Description">One sentence.</param>
/// <param name="Columns">Its columns.</param>
/// <param name="Rows">Its rows. Formats that state lengths before the data go through them several times; they are never held all at once.</param>
/// <typeparam name="TRow">What a row is made from.</typeparam>
public sealed record Table<TRow>(string Name, string Description, IReadOnlyList<Column<TRow>> Columns, IEnumerable<TRow> Rows)
{
    /// <summary>The rows that pass a test.</summary>
    public Table<TRow> Where(Func<TRow, bool> test) => this with { Rows = Rows.Where(test) };

    /// <summary>The same rows as long as the token allows; then going through them ends with <see cref="OperationCanceledException"/>.</summary>
    public Table<TRow> Until(CancellationToken token) => this with
    {
        Rows = Rows.Select(row =>
        {
            token.ThrowIfCancellationRequested();
            return row;
        }),
    };
}
