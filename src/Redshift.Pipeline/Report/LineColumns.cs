using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report;

/// <summary>One line of one observation.</summary>
/// <param name="Observation">Whose line it is.</param>
/// <param name="Line">The measurement.</param>
public readonly record struct LineRow(Observation Observation, LineMeasurement Line);

/// <summary>The columns of the line table, one row a line of an observation. Their order is final.</summary>
public static class LineColumns
{
    /// <summary>The columns.</summary>
    public static IReadOnlyList<Column<LineRow>> All { get; } =
    [
        new("source", "", "meta.id;meta.file", "File as in the catalogue", CellType.Text, r => Cell.Of(r.Observation.Source)),
        new("row", "", "meta.record", "Spectrum of the file as in the catalogue", CellType.Whole, r => Cell.Of(r.Observation.Row)),
        new("line", "", "meta.id;spect.line", "Name of the line in standard spectroscopic form", CellType.Text, r => Cell.Of(r.Line.Line)),
        new("family", "", "meta.code.class;spect.line", "Family of the line", CellType.Text, r => Cell.Of(r.Line.Family)),
        new("rest_vacuum_a", "Angstrom", "em.wl;spect.line", "Rest wavelength in vacuum", CellType.Real, r => Cell.Fixed(r.Line.RestVacuumA, 4)),
        new("rest_air_a", "Angstrom", "em.wl;spect.line", "Rest wavelength in air, from 2000 Angstrom on", CellType.Real, r => Cell.Fixed(r.Line.RestAirA, 4)),
        new("observed_vacuum_a", "Angstrom", "em.wl;spect.line", "Measured wavelength in vacuum, in the frame of the file", CellType.Real, r => Cell.Fixed(r.Line.ObservedVacuumA, 4)),
        new("observed_err_a", "Angstrom", "stat.error;em.wl", "1 sigma of the measured wavelength", CellType.Real, r => Cell.Fixed(r.Line.ObservedErrA, 4)),
        new("offset_km_s", "km/s", "spect.dopplerVeloc;arith.diff", "Velocity of the line against the answer", CellType.Real, r => Cell.Fixed(r.Line.OffsetKmS, 3)),
        new("offset_err_km_s", "km/s", "stat.error;spect.dopplerVeloc", "1 sigma of the offset", CellType.Real, r => Cell.Fixed(r.Line.OffsetErrKmS, 3)),
        new("flux", "", "phot.flux;spect.line", "Flux over the continuum in the unit of flux_unit, negative in absorption", CellType.Real, r => Cell.Significant(r.Line.Flux)),
        new("flux_err", "", "stat.error;phot.flux", "1 sigma of the flux; for a missing line its limit", CellType.Real, r => Cell.Significant(r.Line.FluxErr)),
        new("flux_unit", "", "meta.unit", "Unit of the flux", CellType.Text, r => Cell.Of(r.Line.FluxUnit)),
        new("equivalent_width_rest_a", "Angstrom", "spect.line.eqWidth", "Equivalent width at rest, positive in absorption", CellType.Real, r => Cell.Fixed(r.Line.EquivalentWidthRestA, 4)),
        new("equivalent_width_err_a", "Angstrom", "stat.error;spect.line.eqWidth", "1 sigma of the equivalent width", CellType.Real, r => Cell.Fixed(r.Line.EquivalentWidthErrA, 4)),
        new("fwhm_observed_km_s", "km/s", "spect.line.width", "Full width at half maximum as observed", CellType.Real, r => Cell.Fixed(r.Line.FwhmObservedKmS, 3)),
        new("fwhm_intrinsic_km_s", "km/s", "spect.line.width;meta.modelled", "The width without the instrument's; empty where the line is not resolved", CellType.Real, r => Cell.Fixed(r.Line.FwhmIntrinsicKmS, 3)),
        new("ln_likelihood_gain", "", "stat.likelihood", "What the line adds to the ln likelihood of the answer over a smooth spectrum", CellType.Real, r => Cell.Fixed(r.Line.LnLikelihoodGain, 3)),
        new("state", "", "meta.code.status", "matched, expected-missing, blended, masked or unexplained", CellType.Text, r => Cell.Of(Words.Of(r.Line.State))),
        new("note", "", "meta.note", "Remark", CellType.Text, r => Cell.Of(r.Line.Note)),
    ];
}
