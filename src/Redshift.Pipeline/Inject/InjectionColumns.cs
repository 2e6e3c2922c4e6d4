using Redshift.Pipeline.Report;

namespace Redshift.Pipeline.Inject;

/// <summary>The columns of the list of injections.</summary>
public static class InjectionColumns
{
    /// <summary>The columns.</summary>
    public static IReadOnlyList<Column<Injection>> All { get; } =
    [
        new("injection", "", "meta.id", "Number of the injection", CellType.Whole, i => Cell.Of(i.Index)),
        new("source", "", "meta.id;meta.file", "File of the spectrum that an object was put into", CellType.Text, i => Cell.Of(i.Source)),
        new("row", "", "meta.record", "Spectrum of the file", CellType.Whole, i => Cell.Of(i.Row)),
        new("snr_pixel", "", "stat.snr", "Median signal to noise a pixel of the object", CellType.Real, i => Cell.Fixed(i.Snr, 2)),
        new("kind", "", "src.class", "Kind that was put in", CellType.Text, i => Cell.Of(Words.Of(i.Kind))),
        new("object", "", "meta.note", "What was put in", CellType.Text, i => Cell.Of(i.Description)),
        new("z", "", "src.redshift", "Redshift that was put in", CellType.Real, i => Cell.Fixed(i.Z, 7)),
        new("found_kind", "", "src.class", "Kind that was found", CellType.Text, i => Cell.Of(i.FoundZ is null ? "" : Words.Of(i.FoundKind))),
        new("found_z", "", "src.redshift", "Redshift that was found", CellType.Real, i => Cell.Fixed(i.FoundZ, 7)),
        new("found_z_err", "", "stat.error;src.redshift", "Its stated error", CellType.Real, i => Cell.Fixed(i.FoundZErr, 7)),
        new("offset_km_s", "km/s", "spect.dopplerVeloc;arith.diff", "c (found_z - z) / (1 + z)", CellType.Real, i => Cell.Fixed(i.OffsetKmS, 3)),
        new("tolerance_km_s", "km/s", "spect.dopplerVeloc;stat.max", "Offset up to which the redshift is right", CellType.Real, i => Cell.Fixed(i.ToleranceKmS, 3)),
        new("confidence", "", "stat.probability", "Stated probability that the redshift is right", CellType.Real, i => Cell.Fixed(i.Confidence, 4)),
        new("verdict", "", "meta.code.class", "Verdict", CellType.Text, i => Cell.Of(Words.Of(i.Verdict))),
        new("good", "", "meta.code", "1 where the redshift is right, else 0", CellType.Whole, i => Cell.Of(i.IsGood ? 1 : 0)),
    ];
}
