using System.Text.Json;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Explain;

namespace Redshift.Pipeline.Compare;

/// <summary>A comparison for people and for programs.</summary>
/// <param name="comparison">What came out.</param>
/// <param name="oldPath">The old table.</param>
/// <param name="newPath">The new table.</param>
/// <param name="pairing">How the rows were paired.</param>
public sealed class ComparisonReport(Comparison comparison, string oldPath, string newPath, Pairing pairing)
{
    // The words of the list of differences, with what they mean for a person.
    private static readonly (string Word, string Meaning)[] Changes =
    [
        ("added", "only in the new table"), ("missing", "only in the old table"), ("moved", "redshift moved within the tolerance"),
        ("outlier", "redshift outside the tolerance"), ("z-gained", "redshift gained"), ("z-lost", "redshift lost"),
        ("kind", "kind changed"), ("verdict", "verdict changed"),
    ];

    private static readonly Column<Group>[] GroupColumns =
    [
        new("group", "", "", "Which pairs", CellType.Text, g => Cell.Of(g.Name)),
        new("pairs", "", "", "Pairs with both redshifts", CellType.Whole, g => Cell.Of(g.Offsets.Pairs)),
        new("outliers", "", "", "Pairs outside their tolerance", CellType.Whole, g => Cell.Of(g.Offsets.Outliers)),
        new("percent", "", "", "Outliers among a hundred", CellType.Real, g => Cell.Fixed(g.Offsets.OutlierPercent, 2)),
        new("median_km_s", "km/s", "", "Median offset, new against old", CellType.Real, g => Cell.Fixed(g.Offsets.MedianKmS, 3)),
        new("nmad_km_s", "km/s", "", "Normalised median absolute deviation", CellType.Real, g => Cell.Fixed(g.Offsets.NmadKmS, 3)),
    ];

    /// <summary>The word of a pairing.</summary>
    public static IReadOnlyDictionary<string, Pairing> Pairings { get; } = new Dictionary<string, Pairing>
    {
        ["source"] = Pairing.Source,
        ["target"] = Pairing.Target,
        ["position"] = Pairing.Position,
    };

    /// <summary>Writes the text.</summary>
    public void WriteText(TextWriter output)
    {
        output.WriteLine(FormattableString.Invariant($"old: {HarmlessText.Printable(oldPath)}, {comparison.OldRows} rows"));
        output.WriteLine(FormattableString.Invariant($"new: {HarmlessText.Printable(newPath)}, {comparison.NewRows} rows"));
        output.WriteLine(FormattableString.Invariant($"{comparison.Pairs} rows paired by {Word(pairing)}"));
        if (comparison.OldDoubled > 0)
            output.WriteLine(FormattableString.Invariant($"{comparison.OldDoubled} old rows left aside, because an earlier one has the same {Word(pairing)}"));
        TextTable.Write(output, "Redshifts, new against old", GroupColumns, Groups());
        TextTable.Write(output, "Changes", Changes.Where(change => comparison.Count(change.Word) > 0).Select(ChangeRow));
        TextTable.Write(output, "Kinds, old to new", comparison.KindChanges.Select(TransitionRow));
        TextTable.Write(output, "Verdicts, old to new", comparison.VerdictChanges.Select(TransitionRow));
        TextTable.Write(output, "Outliers, the farthest out", DifferenceColumns.All, comparison.WorstOutliers);
    }

    /// <summary>Builds the JSON.</summary>
    public string BuildJson() => CellsJson.Build(writer =>
    {
        writer.WriteStartObject();
        writer.WriteString("old", oldPath);
        writer.WriteString("new", newPath);
        writer.WriteString("paired_by", Word(pairing));
        writer.WriteNumber("old_rows", comparison.OldRows);
        writer.WriteNumber("old_doubled", comparison.OldDoubled);
        writer.WriteNumber("new_rows", comparison.NewRows);
        writer.WriteNumber("pairs", comparison.Pairs);
        writer.WriteStartObject("changes");
        foreach (var (word, _) in Changes)
            writer.WriteNumber(word, comparison.Count(word));
        writer.WriteEndObject();
        writer.WritePropertyName("redshifts");
        CellsJson.WriteRows(writer, GroupColumns, Groups());
        WriteTransitions(writer, "kinds", comparison.KindChanges);
        WriteTransitions(writer, "verdicts", comparison.VerdictChanges);
        writer.WritePropertyName("worst_outliers");
        CellsJson.WriteRows(writer, DifferenceColumns.All, comparison.WorstOutliers);
        writer.WriteEndObject();
    });

    private IEnumerable<Group> Groups() => comparison.Kinds.Concat(comparison.Verdicts)
        .Select(pair => new Group(pair.Key, pair.Value)).Prepend(new("all", comparison.All));

    private Cell[] ChangeRow((string Word, string Meaning) change) =>
        [Cell.Of(comparison.Count(change.Word)), Cell.Of(change.Word), Cell.Of(change.Meaning)];

    private static Cell[] TransitionRow(KeyValuePair<(string Old, string New), int> change) =>
        [Cell.Of(change.Value), Cell.Of($"{change.Key.Old} to {change.Key.New}")];

    private static void WriteTransitions(Utf8JsonWriter writer, string name, IReadOnlyDictionary<(string Old, string New), int> changes)
    {
        writer.WriteStartArray(name);
        foreach (var ((old, now), count) in changes)
        {
            writer.WriteStartObject();
            writer.WriteString("old", old);
            writer.WriteString("new", now);
            writer.WriteNumber("count", count);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
    }

    private static string Word(Pairing pairing) => Pairings.First(pair => pair.Value == pairing).Key;

    private sealed record Group(string Name, OffsetStatistics Offsets);
}
