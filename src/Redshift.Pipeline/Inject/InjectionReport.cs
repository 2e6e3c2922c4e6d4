using Redshift.Physics.Statistics;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Explain;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Inject;

/// <summary>What was recovered, for people and for programs.</summary>
/// <param name="recovery">What was recovered.</param>
/// <param name="givers">Number of spectra that objects were put into.</param>
/// <param name="seed">The seed.</param>
/// <param name="maps">The maps from evidence to confidence as held against the recovery, where that was asked for.</param>
public sealed class InjectionReport(Recovery recovery, int givers, ulong seed, IReadOnlyList<RecalibratedMap> maps)
{
    private static readonly Column<RecoveryGroup>[] GroupColumns =
    [
        new("group", "", "", "Which injections", CellType.Text, g => Cell.Of(g.Name)),
        new("n", "", "", "Number", CellType.Whole, g => Cell.Of(g.Members.Count)),
        new("good", "", "", "Share of right redshifts", CellType.Real, g => Cell.Fixed(g.GoodShare, 3)),
        new("confident", "", "", "Number of likely and firm answers", CellType.Whole, g => Cell.Of(g.Confident)),
        new("completeness", "", "", "Share of all that got a right redshift which is likely or firm", CellType.Real, g => Cell.Fixed(g.Completeness, 3)),
        new("purity", "", "", "Share of right ones among the likely and firm", CellType.Real, g => Cell.Fixed(g.Purity, 3)),
        new("nmad_km_s", "km/s", "", "Normalised median absolute deviation of right redshifts", CellType.Real, g => Cell.Fixed(g.NmadKmS, 1)),
        new("pull_width", "", "", "Width of error over stated error of right redshifts", CellType.Real, g => Cell.Fixed(g.PullWidth, 2)),
    ];

    private static readonly Column<ReliabilityBin>[] ReliabilityColumns =
    [
        new("from", "", "", "Lower edge of the confidence", CellType.Real, b => Cell.Fixed(b.From, 2)),
        new("n", "", "", "Number of answers", CellType.Whole, b => Cell.Of(b.Count)),
        new("stated", "", "", "Mean confidence", CellType.Real, b => Cell.Fixed(b.Stated, 3)),
        new("found", "", "", "Share of right ones", CellType.Real, b => Cell.Fixed(b.Found, 3)),
        new("band_low", "", "", "Where the share lies in 95 % of cases if confidences are true, lower end", CellType.Real, b => Cell.Fixed(b.Low, 3)),
        new("band_high", "", "", "The same, upper end", CellType.Real, b => Cell.Fixed(b.High, 3)),
        new("outside", "", "", "Whether the share lies outside the band", CellType.Text, b => Cell.Of(b.Off ? "outside" : "")),
    ];

    private static readonly Column<RecalibratedMap>[] MapColumns =
    [
        new("answers", "", "", "Kind of the answers", CellType.Text, m => Cell.Of(m.Kind == ObjectKind.Star ? "star or other" : Words.Of(m.Kind))),
        new("n", "", "", "Number", CellType.Whole, m => Cell.Of(m.Count)),
        new("right", "", "", "Number of right ones", CellType.Whole, m => Cell.Of(m.Right)),
        new("score_before", "", "", "Logarithmic score of the confidences, nats an answer", CellType.Real, m => Cell.Fixed(m.Before, 3)),
        new("score_after", "", "", "The same with maps fitted to the other answers", CellType.Real, m => Cell.Fixed(m.After, 3)),
        new("greatest", "", "", "Greatest confidence from now on", CellType.Real, m => Cell.Fixed(m.Map.Greatest, 4)),
        new("map", "", "", "What became of the map", CellType.Text, m => Cell.Of(m.State switch { MapState.TooFew => "kept: too few", MapState.Kept => "kept: as good", _ => "refitted" })),
    ];

    private IEnumerable<(string Title, string Name, IEnumerable<RecoveryGroup> Groups)> Tables =>
    [
        ("By signal to noise a pixel", "by_snr", recovery.BySnr.Append(recovery.All)),
        ("By redshift, galaxies and quasars", "by_redshift", recovery.ByRedshift),
        ("By kind", "by_kind", recovery.ByKind),
    ];

    /// <summary>What the figures cannot say.</summary>
    public static IReadOnlyList<string> Limits { get; } =
    [
        "Objects are computed from the same physics as the models they are held against, though drawn between them: real ones are",
        "recovered somewhat less often. Not tested: wavelength calibration, sky subtraction and extraction, blended objects, noise of",
        "the object's own light, kinds of objects and mixtures other than these, and whether the stated resolution is true.",
    ];

    /// <summary>What was put into what.</summary>
    public string Origin => FormattableString.Invariant(
        $"{recovery.All.Members.Count} computed objects put into {givers} {(givers == 1 ? "spectrum" : "spectra")}, seed {seed}");

    /// <summary>Writes the text.</summary>
    public void WriteText(TextWriter output)
    {
        output.WriteLine(Origin);
        foreach (var (title, _, groups) in Tables) TextTable.Write(output, title, GroupColumns, groups);
        TextTable.Write(output, "Confidence, stated and found (band: 95 % if confidences are true)", ReliabilityColumns, recovery.Reliability);
        TextTable.Write(output, "Maps from evidence to confidence (log score: cross-validated, less is better)", MapColumns, maps);
        if (maps.Any(map => map.Map.Greatest < Calibration.Firm))
            output.WriteLine("Where the greatest confidence is below 0.99 no answer can be firm; more objects (--count) may support a greater one.");
        output.WriteLine();
        foreach (var line in Limits) output.WriteLine(line);
    }

    /// <summary>Builds the JSON.</summary>
    public string BuildJson() => CellsJson.Build(writer =>
    {
        writer.WriteStartObject();
        writer.WriteNumber("seed", seed);
        writer.WriteNumber("spectra", givers);
        foreach (var (_, name, groups) in Tables)
        {
            writer.WritePropertyName(name);
            CellsJson.WriteRows(writer, GroupColumns, groups);
        }

        writer.WritePropertyName("reliability");
        CellsJson.WriteRows(writer, ReliabilityColumns, recovery.Reliability);
        writer.WritePropertyName("calibration");
        CellsJson.WriteRows(writer, MapColumns, maps);
        writer.WriteString("limits", string.Join(' ', Limits));
        writer.WritePropertyName("injections");
        CellsJson.WriteRows(writer, InjectionColumns.All, recovery.All.Members);
        writer.WriteEndObject();
    });
}
