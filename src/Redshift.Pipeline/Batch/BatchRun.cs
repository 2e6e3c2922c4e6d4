using System.Diagnostics;
using System.Threading.Channels;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Batch;

/// <summary>
/// Takes many files through the pipeline: readers with a file each, workers with a pipeline each, and one report of everything that is
/// done, as it is done. Queues are bounded, so memory grows neither with the number of files nor with the size of a stack.
/// </summary>
/// <param name="settings">The parameters of the stages.</param>
/// <param name="jobs">Number of workers, at least 1.</param>
/// <param name="finish">What a worker does with each result beside handing it on (pictures), or null.</param>
/// <param name="shard">Which part of the spectra of large files, or null for all.</param>
public sealed class BatchRun(PipelineSettings settings, int jobs, Action<ObservationResult>? finish = null, Shard? shard = null)
{
    // Spectra that may wait for each worker: enough to ride over a slow file, few enough for a laptop.
    private const int WaitingPerJob = 8;

    // Reading a spectrum takes a fraction of measuring it.
    private const int JobsPerReader = 4;

    private readonly IReadOnlyList<Column<ObservationResult>> _columns = CatalogueColumns.With(settings.Load.Keep);
    private readonly string _fingerprint = Fingerprint.Of(settings);

    // Made at the first spectrum: a run that finds none need not wait for the models.
    private readonly ObservationPipeline?[] _pipelines = new ObservationPipeline?[jobs];

    /// <summary>Runs the files. When it ends, by itself or by a failure, nothing is on its way any more.</summary>
    /// <param name="files">The files.</param>
    /// <param name="entries">Takes a report of each step; somebody must read them, or the run stands still.</param>
    /// <param name="token">Ends the run early: spectra that are being measured are finished, no others begun.</param>
    /// <exception cref="OperationCanceledException">The token ended the run.</exception>
    public async Task RunAsync(IReadOnlyList<FileWork> files, ChannelWriter<LedgerEntry> entries, CancellationToken token)
    {
        using var stop = CancellationTokenSource.CreateLinkedTokenSource(token);
        var work = Channel.CreateBounded<PendingSpectrum>(jobs * WaitingPerJob);
        var reader = new FileReader(settings.Load, _fingerprint, shard ?? Shard.Whole, work.Writer, entries);
        var next = -1;

        async Task ReadFiles()
        {
            while (Interlocked.Increment(ref next) is var index && index < files.Count)
                await reader.ReadAsync(files[index], stop.Token).ConfigureAwait(false);
        }

        var readers = Enumerable.Range(0, (jobs + JobsPerReader - 1) / JobsPerReader).Select(_ => Start(ReadFiles, stop)).ToArray();
        var workers = Enumerable.Range(0, jobs).Select(job => Start(() => MeasureAllAsync(job, work.Reader, stop.Token), stop)).ToArray();
        await Task.WhenAll(readers).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        work.Writer.Complete();
        await Task.WhenAll([.. readers, .. workers]).ConfigureAwait(false);
    }

    // Whoever fails stops the others.
    private static Task Start(Func<Task> action, CancellationTokenSource stop) => Task.Run(async () =>
    {
        try
        {
            await action().ConfigureAwait(false);
        }
        catch
        {
            await stop.CancelAsync().ConfigureAwait(false);
            throw;
        }
    });

    private async Task MeasureAllAsync(int job, ChannelReader<PendingSpectrum> work, CancellationToken token)
    {
        await foreach (var (file, observation) in work.ReadAllAsync(token).ConfigureAwait(false))
        {
            token.ThrowIfCancellationRequested();
            var watch = Stopwatch.StartNew();
            var (outcome, reject) = Measure(_pipelines[job] ??= new(settings), observation);
            await file.ReportAsync(outcome, watch.Elapsed.TotalMilliseconds, reject).ConfigureAwait(false);
            await file.LeaveAsync().ConfigureAwait(false);
        }
    }

    private (StoredOutcome Outcome, Reject? Reject) Measure(ObservationPipeline pipeline, Observation observation)
    {
        ObservationResult result;
        try
        {
            result = pipeline.Analyze(observation);
        }
        catch (Exception problem)
        {
            var fault = Fault.In(observation.Source, observation.Row, "engine", problem);
            return (StoredOutcome.Of(fault), fault);
        }

        // What finishing throws (a full disk) ends the run.
        finish?.Invoke(result);
        return (StoredOutcome.Of(result, _columns), null);
    }
}
