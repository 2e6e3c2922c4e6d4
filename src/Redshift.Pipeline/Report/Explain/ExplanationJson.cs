using System.Text.Json;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report.Explain;

/// <summary>One answer for programs: the row of the catalogue, the lines, the candidates, and how the file was read.</summary>
public static class ExplanationJson
{
    private static readonly Column<ReadingNote>[] ReadingColumns =
    [
        new("role", "", "", "What was needed", CellType.Text, note => Cell.Of(note.Role)),
        new("choice", "", "", "What fills it", CellType.Text, note => Cell.Of(note.Choice)),
        new("why", "", "", "The reason", CellType.Text, note => Cell.Of(note.Why)),
    ];

    /// <summary>The JSON text.</summary>
    /// <param name="result">The answer.</param>
    /// <param name="keep">Header cards that the catalogue keeps.</param>
    public static string Build(ObservationResult result, IReadOnlyList<string> keep) => CellsJson.Build(writer =>
    {
        writer.WriteStartObject();
        writer.WritePropertyName("answer");
        CellsJson.WriteRow(writer, CatalogueColumns.With(keep), result);
        writer.WritePropertyName("lines");
        CellsJson.WriteRows(writer, LineColumns.All, result.Lines.Select(line => new LineRow(result.Observation, line)));
        writer.WritePropertyName("candidates");
        CellsJson.WriteRows(writer, CandidateColumns.All, result.Candidates);
        WriteNotes(writer, "reading", result.Observation.Notes);
        writer.WriteEndObject();
    });

    /// <summary>The JSON text of how the file was read.</summary>
    /// <param name="observation">What was read; null where the file was rejected.</param>
    /// <param name="file">What the file holds.</param>
    public static string BuildLayout(Observation? observation, FileDescription file) => CellsJson.Build(writer =>
    {
        writer.WriteStartObject();
        WriteNotes(writer, "contents", file.Contents);
        WriteNotes(writer, "reading", observation?.Notes ?? []);
        writer.WriteString("rule", file.Rule ?? "");
        writer.WriteEndObject();
    });

    private static void WriteNotes(Utf8JsonWriter writer, string name, IReadOnlyList<ReadingNote> notes)
    {
        writer.WritePropertyName(name);
        CellsJson.WriteRows(writer, ReadingColumns, notes);
    }
}
