using System.Runtime.CompilerServices;
using System.Threading.Channels;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Batch;

/// <summary>
/// Takes many files through the pipeline: one reader, several workers with a pipeline each, and the outcomes in the order of the files,
/// whatever the number of workers. Queues are bounded, so memory does not grow with the number of files.
/// </summary>
/// <param name="settings">The parameters of the stages.</param>
/// <param name="jobs">Number of workers, at least 1.</param>
/// <param name="finish">What a worker does with each result beside handing it on (pictures), or null.</param>
public sealed class BatchRun(PipelineSettings settings, int jobs, Action<ObservationResult>? finish = null)
{
    // Spectra that may wait for each worker: enough to ride over a slow file, few enough for a laptop.
    private const int WaitingPerJob = 8;

    /// <summary>Runs the files.</summary>
    /// <param name="files">The files in the order of the report.</param>
    /// <param name="token">Ends the run early.</param>
    /// <returns>At least one outcome a file, by file and row.</returns>
    /// <exception cref="OperationCanceledException">The token ended the run.</exception>
    public async IAsyncEnumerable<BatchOutcome> RunAsync(
        IReadOnlyList<InputFile> files, [EnumeratorCancellation] CancellationToken token = default)
    {
        using var stop = CancellationTokenSource.CreateLinkedTokenSource(token);
        var work = Channel.CreateBounded<Pending>(jobs * WaitingPerJob);
        var ordered = Channel.CreateBounded<Task<BatchOutcome>>(2 * jobs * WaitingPerJob);
        var threads = Enumerable.Range(0, jobs).Select(_ => Task.Run(() => AnalyzeAllAsync(work.Reader, stop.Token), CancellationToken.None))
            .Append(Task.Run(() => ReadAllAsync(files, work.Writer, ordered.Writer, stop.Token), CancellationToken.None)).ToArray();
        try
        {
            await foreach (var outcome in ordered.Reader.ReadAllAsync(stop.Token).ConfigureAwait(false))
                yield return await outcome.WaitAsync(stop.Token).ConfigureAwait(false);
        }
        finally
        {
            await stop.CancelAsync().ConfigureAwait(false);
            await Task.WhenAll(threads).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        }
    }

    private async Task ReadAllAsync(
        IReadOnlyList<InputFile> files, ChannelWriter<Pending> work, ChannelWriter<Task<BatchOutcome>> ordered, CancellationToken token)
    {
        try
        {
            for (var index = 0; index < files.Count; index++)
            {
                foreach (var (observation, reject) in Read(files[index]))
                {
                    var pending = new Pending(index, observation);
                    await ordered.WriteAsync(pending.Outcome.Task, token).ConfigureAwait(false);
                    if (observation is null)
                        pending.Outcome.SetResult(new(index, null, reject));
                    else
                        await work.WriteAsync(pending, token).ConfigureAwait(false);
                }
            }

            ordered.Complete();
        }
        catch (Exception problem)
        {
            ordered.Complete(problem);
        }
        finally
        {
            work.Complete();
        }
    }

    private IEnumerable<LoadOutcome> Read(InputFile file) =>
        file.Reject is { } reject ? [new(null, reject)] : Guarded(file.Source, SpectrumLoader.Load(file.Path, file.Source, settings.Load));

    // A fault of our own in one file must not cost the night: it becomes a reject that says so.
    private static IEnumerable<LoadOutcome> Guarded(string source, IEnumerable<LoadOutcome> outcomes)
    {
        using var reading = outcomes.GetEnumerator();
        while (true)
        {
            Reject? fault = null;
            try
            {
                if (!reading.MoveNext())
                    yield break;
            }
            catch (Exception problem) when (problem is not OperationCanceledException)
            {
                fault = Fault(source, null, "reading", problem);
            }

            if (fault is not null)
            {
                yield return new(null, fault);
                yield break;
            }

            yield return reading.Current;
        }
    }

    private async Task AnalyzeAllAsync(ChannelReader<Pending> work, CancellationToken token)
    {
        // Made at the first spectrum: a run that finds none need not wait for the models.
        ObservationPipeline? pipeline = null;
        await foreach (var pending in work.ReadAllAsync(token).ConfigureAwait(false))
        {
            pipeline ??= new(settings);
            var outcome = Analyze(pipeline, pending);
            try
            {
                if (outcome.Result is { } result)
                    finish?.Invoke(result);
                pending.Outcome.SetResult(outcome);
            }
            catch (Exception problem)
            {
                // What finishing throws (a full disk) ends the run: the caller meets it in its turn.
                pending.Outcome.SetException(problem);
            }
        }
    }

    private static BatchOutcome Analyze(ObservationPipeline pipeline, Pending pending)
    {
        var observation = pending.Observation!;
        try
        {
            return new(pending.File, pipeline.Analyze(observation), null);
        }
        catch (Exception problem) when (problem is not OperationCanceledException)
        {
            return new(pending.File, null, Fault(observation.Source, observation.Row, "engine", problem));
        }
    }

    private static Reject Fault(string source, int? row, string place, Exception problem) =>
        new(source, row, place, $"a fault of this program ({problem.GetType().Name}: {problem.Message})", "no fault; please report it with this file");

    private sealed record Pending(int File, Observation? Observation)
    {
        public TaskCompletionSource<BatchOutcome> Outcome { get; } = new(TaskCreationOptions.RunContinuationsAsynchronously);
    }
}
