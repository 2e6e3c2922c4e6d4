using Redshift.Pipeline.Report;

namespace Redshift.Pipeline.Compare;

/// <summary>The columns of the list of differences, one row a row of either table.</summary>
public static class DifferenceColumns
{
    /// <summary>The columns.</summary>
    public static IReadOnlyList<Column<Difference>> All { get; } =
    [
        new("changes", "", "meta.note", "What changed, words joined by semicolons", CellType.Text, d => Cell.Of(string.Join(';', d.Changes))),
        new("source", "", "meta.id;meta.file", "File of the spectrum", CellType.Text, d => Cell.Of((d.New ?? d.Old)!.Source)),
        new("row", "", "meta.record", "Spectrum of the file", CellType.Whole, d => Cell.Of((d.New ?? d.Old)!.Row)),
        new("target", "", "meta.id;src", "Name of the object", CellType.Text, d => Cell.Of((d.New ?? d.Old)!.Target)),
        new("old_z", "", "src.redshift", "Redshift of the old table", CellType.Real, d => Cell.Fixed(d.Old?.Z, 7)),
        new("z", "", "src.redshift", "Redshift of the new table", CellType.Real, d => Cell.Fixed(d.New?.Z, 7)),
        new("offset_km_s", "km/s", "spect.dopplerVeloc;arith.diff", "c (z - old_z) / (1 + old_z)", CellType.Real, d => Cell.Fixed(d.OffsetKmS, 3)),
        new("tolerance_km_s", "km/s", "spect.dopplerVeloc;stat.max", "Offset beyond which the redshifts are not the same", CellType.Real, d => Cell.Fixed(d.ToleranceKmS, 3)),
        new("old_kind", "", "src.class", "Kind in the old table", CellType.Text, d => Cell.Of(d.Old?.Kind ?? "")),
        new("kind", "", "src.class", "Kind in the new table", CellType.Text, d => Cell.Of(d.New?.Kind ?? "")),
        new("old_verdict", "", "meta.code.class", "Verdict of the old table", CellType.Text, d => Cell.Of(d.Old?.Verdict ?? "")),
        new("verdict", "", "meta.code.class", "Verdict of the new table", CellType.Text, d => Cell.Of(d.New?.Verdict ?? "")),
    ];
}
