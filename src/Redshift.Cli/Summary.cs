using System.Text.Json;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;

namespace Redshift.Cli;

/// <summary>The closing words of a run, on standard output.</summary>
internal static class Summary
{
    private static readonly Verdict[] Order = [Verdict.Firm, Verdict.Likely, Verdict.Unsettled, Verdict.Nothing];

    /// <summary>Prints the counts for people or for programs.</summary>
    /// <param name="tally">What the catalogue holds.</param>
    /// <param name="measured">How many of its spectra this run measured; null where it was not to measure any.</param>
    /// <param name="folder">The output folder.</param>
    /// <param name="time">How long the run took.</param>
    /// <param name="json">Whether a program reads it.</param>
    public static void Print(Tally tally, int? measured, string folder, TimeSpan time, bool json)
    {
        if (json)
            PrintJson(tally, measured, folder, time);
        else
            PrintText(tally, measured, folder, time);
    }

    private static void PrintText(Tally tally, int? measured, string folder, TimeSpan time)
    {
        var verdicts = string.Join(", ", Order.Select(verdict => $"{tally.Of(verdict)} {Words.Of(verdict)}"));
        Console.WriteLine($"{Counted(tally.Results, "spectrum", "spectra")}: {verdicts}; {Counted(tally.Rejects, "reject", "rejects")}");
        Console.WriteLine(FormattableString.Invariant(
            $"in {HarmlessText.Printable(folder)} after {time.TotalSeconds:F1} s{Work(tally, measured, time)}"));
    }

    private static string Work(Tally tally, int? measured, TimeSpan time)
    {
        if (measured is not { } count)
            return "";
        var part = count == tally.Results ? "" : $"{count} measured now, ";
        return FormattableString.Invariant($" ({part}{count / Math.Max(time.TotalSeconds, 1e-3):F0} spectra a second)");
    }

    private static string Counted(int count, string one, string many) => $"{count} {(count == 1 ? one : many)}";

    private static void PrintJson(Tally tally, int? measured, string folder, TimeSpan time)
    {
        using var stream = new MemoryStream();
        using (var writer = new Utf8JsonWriter(stream))
        {
            writer.WriteStartObject();
            writer.WriteNumber("spectra", tally.Results);
            foreach (var verdict in Order)
                writer.WriteNumber(Words.Of(verdict), tally.Of(verdict));
            writer.WriteNumber("rejects", tally.Rejects);
            writer.WriteNumber("measured", measured ?? 0);
            writer.WriteString("out", folder);
            writer.WriteNumber("seconds", Math.Round(time.TotalSeconds, 3));
            writer.WriteEndObject();
        }

        Console.WriteLine(System.Text.Encoding.UTF8.GetString(stream.ToArray()));
    }
}
