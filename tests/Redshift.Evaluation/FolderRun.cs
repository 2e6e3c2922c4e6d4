using System.Diagnostics;
using System.Globalization;
using Redshift.Pipeline;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Evaluation;

/// <summary>Runs the pipeline over the files of a folder for which a truth is known, or takes an existing catalogue of them.</summary>
internal static class FolderRun
{
    /// <summary>The kind of a spectrum that has got lost.</summary>
    public const string Missing = "missing";

    /// <summary>Runs the pipeline.</summary>
    public static IReadOnlyList<Judgement> Judge(string folder, TruthTable truths, int jobs, Action<ObservationResult, Judgement>? each = null)
    {
        using var pipelines = new ThreadLocal<ObservationPipeline>(() => new(new PipelineSettings()));
        var names = truths.All.Keys.Select(key => key.Name).ToHashSet();
        var outcomes = Directory.EnumerateFiles(folder, "*", SearchOption.AllDirectories).Where(path => names.Contains(Path.GetFileName(path)))
            .Order(StringComparer.Ordinal).AsParallel().AsOrdered().WithDegreeOfParallelism(jobs)
            .SelectMany(path => Analyze(folder, path, pipelines.Value!).ToArray());
        var answers = new Dictionary<(string, int), (string, Answer)>();
        foreach (var (result, milliseconds) in outcomes)
        {
            var key = (Path.GetFileName(result.Observation.Source), result.Observation.Row);
            answers[key] = (result.Observation.Source, Answer.From(result, milliseconds));
            if (truths.All.TryGetValue(key, out var truth))
                each?.Invoke(result, new(result.Observation.Source, result.Observation.Row, truth, answers[key].Item2));
        }
        return Compare(truths, answers);
    }

    /// <summary>Judges an existing catalogue.</summary>
    public static IReadOnlyList<Judgement> Judge(string catalogue, TruthTable truths)
    {
        var answers = CsvTable.Read(catalogue).ToDictionary(
            row => (Path.GetFileName(row["source"] ?? ""), int.Parse(row["row"] ?? "0", CultureInfo.InvariantCulture)),
            row => (row["source"] ?? "", new Answer(Number(row["z"]), Number(row["z_err"]), row["z"] is null ? 0 : Number(row["confidence"]) ?? 0, row["kind"] ?? "", Number(row["resolution"]), double.NaN)));
        return Compare(truths, answers);
    }

    // A spectrum without a row in the catalogue has been lost: as bad as a confident error.
    private static Judgement[] Compare(TruthTable truths, Dictionary<(string, int), (string Source, Answer Answer)> answers)
    {
        var missing = new Answer(null, null, 1, Missing, null, double.NaN);
        return
        [
            .. from truth in truths.All
               let found = answers.TryGetValue(truth.Key, out var hit) ? hit : (Source: truth.Key.Name, Answer: missing)
               select new Judgement(found.Source, truth.Key.Row, truth.Value, found.Answer),
        ];
    }

    private static IEnumerable<(ObservationResult Result, double Milliseconds)> Analyze(string folder, string path, ObservationPipeline pipeline)
    {
        var source = Path.GetRelativePath(folder, path).Replace('\\', '/');
        foreach (var outcome in SpectrumLoader.Load(path, source, new LoadSettings()))
        {
            if (outcome.Observation is not { } observation)
                continue;
            var started = Stopwatch.GetTimestamp();
            var result = pipeline.Analyze(observation);
            yield return (result, Stopwatch.GetElapsedTime(started).TotalMilliseconds);
        }
    }

    private static double? Number(string? text) =>
        double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var value) ? value : null;
}
