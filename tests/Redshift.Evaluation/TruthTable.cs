using System.Globalization;
using Redshift.Simulation;

namespace Redshift.Evaluation;

/// <summary>Truth by file name and row, from a CSV file with the columns <c>file</c> or <c>source</c>, <c>row</c>, <c>z</c> or <c>truth_kind</c> and <c>truth</c>, <c>kind</c>, <c>object_class</c>, <c>role</c>, as far as present.</summary>
internal sealed class TruthTable
{
    private readonly Dictionary<(string Name, int Row), Truth> _truths = [];

    /// <summary>Reads a table.</summary>
    public static TruthTable Read(string path)
    {
        var table = new TruthTable();
        foreach (var row in CsvTable.Read(path).Where(row => row["role"] is not ("format" or "malformed" or "doubtful" or "reject")))
            table._truths[(Path.GetFileName(row["file"] ?? row["source"] ?? ""), Integer(row["row"]))] = Parse(row);
        return table;
    }

    /// <summary>The truths that were asked for, with their keys.</summary>
    public IReadOnlyDictionary<(string Name, int Row), Truth> All => _truths;

    private static Truth Parse(CsvRow row)
    {
        var (z, least) = Redshift(row);
        var objectClass = row["object_class"] ?? row["kind"] ?? "";
        var folder = Path.GetDirectoryName(row["file"] ?? row["source"] ?? "") ?? "";
        var kind = row["role"] == "blank" ? (z is null ? TruthKind.Blank : TruthKind.Oddity) : Kind(row["kind"] ?? objectClass);
        return new(kind, z, objectClass, row["setup"] ?? folder, Number(row["median_snr"]) ?? double.NaN, least);
    }

    // A spectral type alone says no more than that the star is ours; 0 or the given number is then true to some 200 km/s.
    private static (double? Z, double LeastKmS) Redshift(CsvRow row)
    {
        const double C = 299792.458;
        var number = Number(row["truth"] ?? row["z"]);
        return row["truth_kind"] switch
        {
            "rv_kms" => (number / C, 0),
            "sptype" => (number ?? 0, 200),
            "none" => (null, 0),
            _ => (number, 0),
        };
    }

    private static TruthKind Kind(string objectClass)
    {
        var text = objectClass.ToUpperInvariant();
        return text.Contains("QSO", StringComparison.Ordinal) || text.Contains("QUASAR", StringComparison.Ordinal) ? TruthKind.Quasar
            : text.StartsWith("STAR", StringComparison.Ordinal) || text.Contains("SOLAR", StringComparison.Ordinal) ? TruthKind.Star
            : text.Contains("NEBULA", StringComparison.Ordinal) ? TruthKind.Nebula
            : text is "" or "BLANK" or "NOTHING" or "SKY" ? TruthKind.Blank
            : text is "UNKNOWN" ? TruthKind.Oddity
            : TruthKind.Galaxy;
    }

    private static double? Number(string? text) =>
        double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var value) ? value : null;

    private static int Integer(string? text) => (int)(Number(text) ?? 0);
}
