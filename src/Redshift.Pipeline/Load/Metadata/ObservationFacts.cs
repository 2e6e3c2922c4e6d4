using Redshift.Pipeline.Load.Rules;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>Facts about an observation that are the same whatever its spectra hold.</summary>
/// <param name="Target">Name as the file gives it.</param>
/// <param name="Position">Right ascension and declination in degrees.</param>
/// <param name="Middle">Middle of the exposure, UTC.</param>
/// <param name="ExposureS">Exposure time in seconds.</param>
/// <param name="Instrument">Instrument as the file gives it.</param>
/// <param name="Kept">Cards that the pipeline file keeps.</param>
internal sealed record ObservationFacts(
    string Target,
    (double Ra, double Dec)? Position,
    DateTime? Middle,
    double? ExposureS,
    string Instrument,
    IReadOnlyList<KeyValuePair<string, string>> Kept)
{
    /// <summary>Reads them from the headers.</summary>
    public static ObservationFacts Read(HeaderScope header, LoadSettings settings, LoadRule? rule) => new(
        header.Text([.. Ruled(rule?.Target), "OBJECT", "OBJNAME", "TARGNAME", "TARGET", "DESIG", "TARGETID", "OBJ_NAME", "SRCNAME"]) ?? "",
        RuledPosition(header, rule) ?? SkyPosition.Find(header),
        ExposureTime.Middle(header),
        ExposureTime.Seconds(header),
        header.Text("INSTRUME", "BSS_INST", "SPECTROG", "INSTRUMENT") ?? "",
        [.. settings.Keep.Select(keyword => KeyValuePair.Create(keyword, header.Text(keyword) ?? ""))]);

    private static IEnumerable<string> Ruled(string? reference) =>
        reference is not null && TargetRules.Keyword(reference) is { } keyword ? [keyword] : [];

    private static (double Ra, double Dec)? RuledPosition(HeaderScope header, LoadRule? rule) =>
        header.Find([.. Ruled(rule?.Ra)]) is { } ra && header.Find([.. Ruled(rule?.Dec)]) is { } dec
            ? SkyPosition.Read(ra, dec, rule!.AngleUnit)
            : null;
}
