using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Report;

/// <summary>The columns of the list of rejects, one row a file or spectrum that could not be used.</summary>
public static class RejectColumns
{
    /// <summary>The columns.</summary>
    public static IReadOnlyList<Column<Reject>> All { get; } =
    [
        new("source", "", "meta.id;meta.file", "File below the common parent of all inputs", CellType.Text, r => Cell.Of(r.Source)),
        new("row", "", "meta.record", "Spectrum of the file, from 0; empty where the whole file is meant", CellType.Whole, r => r.Row is { } row ? Cell.Of(row) : Cell.Empty),
        new("place", "", "meta.note", "Where in the file", CellType.Text, r => Cell.Of(r.Place)),
        new("found", "", "meta.note", "What stands there", CellType.Text, r => Cell.Of(r.Found)),
        new("expected", "", "meta.note", "What was expected", CellType.Text, r => Cell.Of(r.Expected)),
    ];
}
