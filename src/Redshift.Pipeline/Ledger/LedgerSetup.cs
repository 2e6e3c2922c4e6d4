using System.Text.Json;

namespace Redshift.Pipeline.Ledger;

/// <summary>What the run of a ledger was told to do.</summary>
/// <param name="Fingerprint">What its answers depend on beside the files.</param>
/// <param name="Keep">Header cards that are the last columns of the catalogue.</param>
/// <param name="Shard">Which part of the inputs it took.</param>
/// <param name="Inputs">Hash of the names of all inputs, also of those that other parts took.</param>
/// <param name="Finished">Whether it did all of it.</param>
public sealed record LedgerSetup(string Fingerprint, IReadOnlyList<string> Keep, Shard Shard, string Inputs, bool Finished = false)
{
    private const string FinishedWord = "yes";

    /// <summary>What a ledger holds, or null before its first run.</summary>
    internal static LedgerSetup? Read(LedgerDatabase database)
    {
        var notes = database.Query("SELECT name, value FROM setup", static reader => (Name: reader.GetString(0), Value: reader.GetString(1)))
            .ToDictionary(static note => note.Name, static note => note.Value, StringComparer.Ordinal);
        return notes.Count == 0
            ? null
            : new(
                notes[nameof(Fingerprint)], JsonSerializer.Deserialize(notes[nameof(Keep)], LedgerJson.Default.StringArray)!,
                Ledger.Shard.TryParse(notes[nameof(Shard)], out var shard) ? shard : Ledger.Shard.Whole,
                notes[nameof(Inputs)], notes[nameof(Finished)] == FinishedWord);
    }

    /// <summary>Writes it down.</summary>
    internal void Write(LedgerDatabase database)
    {
        Note(database, nameof(Fingerprint), Fingerprint);
        Note(database, nameof(Keep), JsonSerializer.Serialize([.. Keep], LedgerJson.Default.StringArray));
        Note(database, nameof(Shard), Shard.ToString());
        Note(database, nameof(Inputs), Inputs);
        Note(database, nameof(Finished), Finished ? FinishedWord : "no");
    }

    private static void Note(LedgerDatabase database, string name, string value) => database.Guarded(() =>
    {
        using var command = database.Command("INSERT OR REPLACE INTO setup (name, value) VALUES (@name, @value)");
        command.Parameters.AddWithValue("@name", name);
        command.Parameters.AddWithValue("@value", value);
        return command.ExecuteNonQuery();
    });
}
