using Redshift.Physics.Units;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report;

/// <summary>The columns of the catalogue, one row an observation. Their order is final.</summary>
public static class CatalogueColumns
{
    private const string Redshift = "src.redshift";
    private const string RadialVelocity = "spect.dopplerVeloc.opt";
    private const string Error = "stat.error;";
    private const string Probability = "stat.probability";

    private static readonly Column<ObservationResult>[] Observed =
    [
        new("source", "", "meta.id;meta.file", "File below the common parent of all inputs", CellType.Text, r => Cell.Of(r.Observation.Source)),
        new("row", "", "meta.record", "Spectrum of the file, from 0", CellType.Whole, r => Cell.Of(r.Observation.Row)),
        new("target", "", "meta.id;src", "Name of the object as the file gives it", CellType.Text, r => Cell.Of(r.Observation.Target)),
        new("ra_deg", "deg", "pos.eq.ra;meta.main", "Right ascension", CellType.Real, r => Cell.Fixed(r.Observation.RaDeg, 6)),
        new("dec_deg", "deg", "pos.eq.dec;meta.main", "Declination", CellType.Real, r => Cell.Fixed(r.Observation.DecDeg, 6)),
        new("mid_time_utc", "", "time.epoch;obs.exposure", "Middle of the exposure, UTC", CellType.Text, r => Cell.Of(r.Observation.MidTimeUtc)),
        new("mid_time_bjd_tdb", "d", "time.epoch", "Middle of the exposure at the barycentre of the solar system, Julian date in TDB", CellType.Real, _ => Cell.Empty),
        new("exposure_s", "s", "time.duration;obs.exposure", "Exposure time", CellType.Real, r => Cell.Fixed(r.Observation.ExposureS, 3)),
        new("instrument", "", "meta.id;instr", "Name of the instrument as the file gives it", CellType.Text, r => Cell.Of(r.Observation.Instrument)),
    ];

    private static readonly Column<ObservationResult>[] Answer =
    [
        new("z", "", Redshift, "Redshift in the frame of the column frame", CellType.Real, r => Cell.Fixed(r.Z, 7)),
        new("z_err", "", Error + Redshift, "1 sigma of z", CellType.Real, r => Cell.Fixed(r.ZErr, 7)),
        new("frame", "", "pos.frame", "Frame of rest of z: barycentric, heliocentric, topocentric, lsrk, rest or unknown", CellType.Text, r => Cell.Of(Words.Of(r.Observation.Frame))),
        new("z_file", "", Redshift, "Redshift as the wavelengths of the file stand", CellType.Real, r => Cell.Fixed(r.ZFile, 7)),
        new("velocity_km_s", "km/s", RadialVelocity, "c times z", CellType.Real, r => Cell.Fixed(Velocity.SpeedOfLightKmS * r.Z, 3)),
        new("velocity_err_km_s", "km/s", Error + RadialVelocity, "c times z_err", CellType.Real, r => Cell.Fixed(Velocity.SpeedOfLightKmS * r.ZErr, 3)),
        new("velocity_correction_km_s", "km/s", "spect.dopplerVeloc;arith.diff", "Motion of the observer taken out: (1+z) = (1+z_file)(1+correction/c)", CellType.Real, r => Cell.Fixed(r.VelocityCorrectionKmS, 3)),
        new("medium", "", "meta.note;em.wl", "Medium of the file's wavelengths; '-assumed' where the file does not say", CellType.Text, r => Cell.Of(Medium(r))),
        new("confidence", "", Probability, "Calibrated probability that z is right", CellType.Real, r => Cell.Fixed(r.Confidence, 4)),
        new("verdict", "", "meta.code.class", "firm (0.99 or more), likely (0.9 or more), unsettled, or nothing", CellType.Text, r => Cell.Of(Words.Of(r.Verdict))),
        new("ln_odds", "", "stat.likelihood", "Natural logarithm of the raw odds of the answer against all else, before calibration", CellType.Real, r => Cell.Fixed(r.LnOdds, 3)),
        new("kind", "", "src.class", "star, galaxy, quasar, nebula or unknown", CellType.Text, r => Cell.Of(Words.Of(r.Kind))),
        new("kind_confidence", "", Probability + ";src.class", "Probability of the kind", CellType.Real, r => Cell.Fixed(r.KindConfidence, 4)),
        new("spectral_type", "", "src.spType", "Spectral type of the best computed star", CellType.Text, r => Cell.Of(r.SpectralType)),
        new("spectral_type_err", "", Error + "src.spType", "1 sigma of the spectral type in subclasses, of which ten make a class; empty for other kinds", CellType.Real, r => Cell.Fixed(r.SpectralTypeErr, 1)),
    ];

    private static readonly Column<ObservationResult>[] Quality =
    [
        new("snr_pixel", "", "stat.snr", "Median signal to noise of a pixel", CellType.Real, r => Cell.Fixed(r.SnrPixel, 2)),
        new("snr_angstrom", "", "stat.snr", "Median signal to noise of one Angstrom", CellType.Real, r => Cell.Fixed(r.SnrAngstrom, 2)),
        new("noise_scale", "", "arith.factor", "Factor by which the errors of the file were multiplied", CellType.Real, r => Cell.Fixed(r.NoiseScale, 4)),
        new("resolution", "", "spect.resolution", "Median resolving power, wavelength over full width at half maximum", CellType.Real, r => Cell.Fixed(r.Resolution, 1)),
        new("resolution_from", "", "meta.note;spect.resolution", "Where the resolution comes from: pipeline, file, keyword or estimate", CellType.Text, r => Cell.Of(Words.Of(r.ResolutionFrom))),
        new("lines_expected", "", "meta.number;spect.line", "Lines of the answer that should be detectable in this spectrum", CellType.Whole, r => Cell.Of(r.LinesExpected)),
        new("lines_matched", "", "meta.number;spect.line", "How many of these were found", CellType.Whole, r => Cell.Of(r.LinesMatched)),
        new("zero_point_km_s", "km/s", "arith.zp;spect.dopplerVeloc", "Error of the wavelength zero point from the ladder fit", CellType.Real, r => Cell.Fixed(r.ZeroPointKmS, 3)),
        new("zero_point_err_km_s", "km/s", Error + "arith.zp;spect.dopplerVeloc", "1 sigma of the zero point", CellType.Real, r => Cell.Fixed(r.ZeroPointErrKmS, 3)),
        new("next_z", "", Redshift, "Redshift of the best rival in the frame of z", CellType.Real, r => Cell.Fixed(NextZ(r), 7)),
        new("next_kind", "", "src.class", "Kind of the best rival", CellType.Text, r => r.Next is { } next ? Cell.Of(Words.Of(next.Kind)) : Cell.Empty),
        new("next_confidence", "", Probability, "Probability of the best rival", CellType.Real, r => Cell.Fixed(r.NextConfidence, 4)),
        new("cautions", "", "meta.note", "What a person should do, words joined by semicolons", CellType.Text, r => Cell.Of(string.Join(';', Cautions(r)))),
    ];

    /// <summary>The columns without kept header cards.</summary>
    public static IReadOnlyList<Column<ObservationResult>> All { get; } = [.. Observed, .. Answer, .. Quality];

    /// <summary>The columns with one more for each header card that the pipeline file keeps.</summary>
    public static IReadOnlyList<Column<ObservationResult>> With(IReadOnlyList<string> keep) => [.. All, .. keep.Select(Kept)];

    /// <summary>The cautions of reading and of the analysis, each once, in that order.</summary>
    public static IEnumerable<string> Cautions(ObservationResult result) =>
        result.Observation.Cautions.Concat(result.Cautions).Distinct(StringComparer.Ordinal);

    /// <summary>The rival's redshift in the frame of the answer; a candidate holds it as the file's wavelengths stand.</summary>
    public static double? NextZ(ObservationResult result) => result.Next is { } next
        ? (1 + next.Z) * (1 + (result.VelocityCorrectionKmS ?? 0) / Velocity.SpeedOfLightKmS) - 1
        : null;

    private static Column<ObservationResult> Kept(string card) => new(
        HarmlessText.ForTable(card), "", "meta.note", $"Header card {HarmlessText.Printable(card)} as it stands in the file",
        CellType.Text, r => Cell.Of(r.Observation.Kept.FirstOrDefault(pair => string.Equals(pair.Key, card, StringComparison.Ordinal)).Value ?? ""));

    private static string Medium(ObservationResult result) =>
        Words.Of(result.Observation.Medium) + (result.Observation.MediumAssumed ? "-assumed" : "");
}
