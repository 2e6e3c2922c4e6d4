using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Plots;
using Redshift.Pipeline.Settings;

namespace Redshift.Cli;

/// <summary>Work on one output folder: holds the folder and its ledger, measures files, and keeps the tables in step with the ledger.</summary>
internal sealed class Session : IDisposable
{
    private readonly OutputFolder _folder;
    private readonly PipelineSettings _settings;
    private readonly Shard? _shard;
    private readonly PlotFolder? _plots;
    private readonly BatchRun _batch;
    private Progress? _progress;

    /// <summary>Opens the folder.</summary>
    /// <param name="folder">The output folder.</param>
    /// <param name="settings">The parameters of the stages.</param>
    /// <param name="jobs">Number of workers.</param>
    /// <param name="plots">Whether every spectrum is drawn.</param>
    /// <param name="shard">Which part of the inputs, or null for all.</param>
    /// <exception cref="FolderInUseException">Another run writes there.</exception>
    /// <exception cref="IOException">The folder or its ledger cannot be used.</exception>
    public Session(string folder, PipelineSettings settings, int jobs, bool plots, Shard? shard = null)
    {
        _folder = new(folder);
        try
        {
            Ledger = LedgerFile.Open(folder);
        }
        catch
        {
            _folder.Dispose();
            throw;
        }

        _settings = settings;
        _shard = shard;
        _plots = plots ? new(folder, message => _progress?.Say(message)) : null;
        _batch = new(settings, jobs, _plots is null ? null : _plots.Draw, shard);
    }

    /// <summary>The ledger of the folder.</summary>
    public LedgerFile Ledger { get; }

    /// <summary>Measures what is new or changed in the files and writes the tables.</summary>
    /// <param name="files">The files that make up the catalogue.</param>
    /// <param name="again">Whether everything is measured again.</param>
    /// <param name="verify">Whether the content of all files is compared with the ledger.</param>
    /// <param name="token">Ends the work early.</param>
    /// <returns>Number of spectra that were measured.</returns>
    /// <exception cref="OperationCanceledException">The token ended the work; what was done is in the ledger.</exception>
    public async Task<int> MeasureAsync(IEnumerable<InputFile> files, bool again, bool verify, CancellationToken token)
    {
        var plan = WorkPlan.Make(Ledger, files, _settings, again, verify, _plots is null ? null : _plots.Has, _shard);
        using var progress = _progress = new(plan.Bytes);
        try
        {
            await new RecordedRun(_batch, Ledger, progress.Update).RunAsync(plan.Files, token).ConfigureAwait(false);
            WriteTables(token);
            Ledger.Setup = Ledger.Setup! with { Finished = true };
            return progress.Measured;
        }
        catch (OperationCanceledException)
        {
            progress.Say($"{progress.Measured} spectra are measured and recorded; the same command goes on from there");
            throw;
        }
    }

    /// <summary>Writes the tables from the ledger.</summary>
    /// <exception cref="OperationCanceledException">The token ended the writing.</exception>
    public void WriteTables(CancellationToken token) => CatalogueFiles.Write(Ledger, _folder.Path, token);

    /// <inheritdoc/>
    public void Dispose()
    {
        Ledger.Dispose();
        _folder.Dispose();
    }
}
