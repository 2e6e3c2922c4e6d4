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
        WriteReading(writer, result.Observation);
        writer.WriteEndObject();
    });

    /// <summary>The JSON text of how the file was read.</summary>
    public static string BuildLayout(Observation observation) => CellsJson.Build(writer =>
    {
        writer.WriteStartObject();
        WriteReading(writer, observation);
        writer.WriteEndObject();
    });

    private static void WriteReading(Utf8JsonWriter writer, Observation observation)
    {
        writer.WritePropertyName("reading");
        CellsJson.WriteRows(writer, ReadingColumns, observation.Notes);
    }
}
