using Redshift.Physics.Statistics;
using Redshift.Simulation;

namespace Redshift.Evaluation;

/// <summary>Prints what a run is worth.</summary>
internal sealed class Report(TextWriter output)
{
    private static readonly double[] SnrEdges = [0, 1, 2, 4, 8, 16, 32];

    public void Print(IReadOnlyList<Judgement> all, int worst)
    {
        output.WriteLine(FormattableString.Invariant(
            $"{all.Count} observations; time a spectrum: median {Measures.Median(all.Select(j => j.Answer.Milliseconds)):0.00} ms, mean {all.Average(j => j.Answer.Milliseconds):0.00} ms\n"));
        Judgement[] scored = [.. all.Where(j => j.HasTruth)];
        Judgement[] empty = [.. all.Where(j => !j.HasTruth)];
        if (scored.Length > 0)
            PrintTables(scored);
        PrintFalseAlarms(empty);
        PrintReliability(all);
        PrintConfusion(all);
        PrintWorst(all, worst);
        PrintMissing(all);
    }

    private void PrintTables(Judgement[] scored)
    {
        output.WriteLine(Summary.Heading);
        output.WriteLine(new Summary("all", scored));
        PrintGroups(scored, j => j.Truth.Kind.ToString());
        PrintGroups(scored, j => j.Truth.Group);
        PrintGroups(scored, j => j.Truth.ObjectClass);
        PrintGroups(scored, j => SnrBin(j.Truth.Snr));
    }

    private static string SnrBin(double snr) =>
        double.IsNaN(snr) ? "S/N unknown" : FormattableString.Invariant($"S/N >= {SnrEdges.Last(edge => snr >= edge),2}");

    private void PrintGroups(Judgement[] scored, Func<Judgement, string> key)
    {
        output.WriteLine();
        foreach (var group in scored.GroupBy(key).OrderBy(group => group.Key, StringComparer.Ordinal))
            output.WriteLine(new Summary(group.Key, [.. group]));
    }

    private void PrintFalseAlarms(Judgement[] empty)
    {
        if (empty.Length == 0)
            return;
        output.WriteLine("\nno redshift to be found           n   nothing  c>=.9  c>=.99");
        foreach (var group in empty.GroupBy(j => $"{j.Truth.ObjectClass} {j.Truth.Group}").OrderBy(group => group.Key, StringComparer.Ordinal))
        {
            output.WriteLine(FormattableString.Invariant(
                $"{group.Key,-30}{group.Count(),5}{Share(group, j => j.Answer.Z is null),10:0.000}{Share(group, j => Alarm(j, 0.9)),7:0.000}{Share(group, j => Alarm(j, 0.99)),8:0.000}"));
        }
    }

    private static bool Alarm(Judgement judgement, double confidence) => judgement.Answer.Confidence >= confidence && !judgement.Right;

    private static double Share(IEnumerable<Judgement> group, Func<Judgement, bool> which) => group.Average(j => which(j) ? 1.0 : 0);

    private void PrintReliability(IReadOnlyList<Judgement> all)
    {
        Forecast[] forecasts = [.. all.Where(j => j.Answer.Z is not null).Select(j => j.Forecast)];
        if (forecasts.Length == 0)
            return;
        output.WriteLine(FormattableString.Invariant(
            $"\nreliability of {forecasts.Length} answers: log score {Measures.LogLoss(forecasts):0.0000}, Brier {Measures.Brier(forecasts):0.0000}, skill {Measures.BrierSkill(forecasts):0.000}, calibration error {Measures.CalibrationError(forecasts):0.0000}"));
        output.WriteLine("  from      n  stated   found   95 % band if true");
        foreach (var bin in Reliability.Table(forecasts))
        {
            output.WriteLine(FormattableString.Invariant(
                $"{bin.From,6:0.00}{bin.Count,7}{bin.Stated,8:0.0000}{bin.Found,8:0.0000}   {bin.Low:0.0000} .. {bin.High:0.0000}{(bin.Off ? "  OFF" : "")}"));
        }
    }

    private void PrintConfusion(IReadOnlyList<Judgement> all)
    {
        string[] answers = ["star", "galaxy", "quasar", "nebula", "unknown"];
        output.WriteLine($"\nkinds (rows: truth)   {string.Concat(answers.Select(answer => $"{answer,9}"))}");
        foreach (var kind in Enum.GetValues<TruthKind>())
        {
            Judgement[] row = [.. all.Where(j => j.Truth.Kind == kind)];
            if (row.Length > 0)
                output.WriteLine($"{kind,-22}{string.Concat(answers.Select(answer => $"{row.Count(j => j.Answer.Kind == answer),9}"))}");
        }
    }

    private void PrintMissing(IReadOnlyList<Judgement> all)
    {
        string[] missing = [.. all.Where(j => j.Answer.Kind == FolderRun.Missing).Select(j => $"{j.Source} row {j.Row}")];
        if (missing.Length > 0)
            output.WriteLine($"\n{missing.Length} spectra without an answer: {string.Join(", ", missing)}");
    }

    private void PrintWorst(IReadOnlyList<Judgement> all, int count)
    {
        output.WriteLine("\nmost confident wrong answers");
        foreach (var j in all.Where(j => !j.Right && j.Answer.Z is not null).OrderByDescending(j => j.Answer.Confidence).Take(count))
        {
            output.WriteLine(FormattableString.Invariant(
                $"  {j.Answer.Confidence:0.0000} {j.Source} row {j.Row} {j.Truth.ObjectClass} {j.Truth.Group} S/N {j.Truth.Snr:0.0}: {j.Answer.Kind} z {j.Answer.Z:0.00000}, truth {j.Truth.Kind} {j.Truth.Z:0.00000} dv {j.DvKmS:0} km/s"));
        }
    }
}
