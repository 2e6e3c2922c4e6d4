using System.Collections.Frozen;
using System.IO.Hashing;
using System.Text;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Batch;

/// <summary>What a run has to do: the files that are new, changed, or not finished, against what the ledger knows.</summary>
public sealed class WorkPlan
{
    private readonly string _fingerprint;
    private readonly List<FileWork> _files = [];

    private WorkPlan(string fingerprint) => _fingerprint = fingerprint;

    /// <summary>The files to be read, in the order of the inputs.</summary>
    public IReadOnlyList<FileWork> Files => _files;

    /// <summary>Size of these files together.</summary>
    public long Bytes { get; private set; }

    /// <summary>Whether everything is measured again, whatever the ledger knows.</summary>
    private bool Again { get; init; }

    /// <summary>Whether the content of every file is compared, and not only its size and time.</summary>
    private bool Verify { get; init; }

    /// <summary>Whether a spectrum has all that this run wants beside the ledger (its picture).</summary>
    private Func<string, int, bool>? IsFinished { get; init; }

    /// <summary>Makes the plan and lists the files in the ledger.</summary>
    /// <param name="ledger">The ledger.</param>
    /// <param name="files">The inputs.</param>
    /// <param name="settings">The parameters of the stages.</param>
    /// <param name="again">Whether everything is measured again, whatever the ledger knows.</param>
    /// <param name="verify">Whether the content of every file is compared, and not only its size and time.</param>
    /// <param name="isFinished">Whether a measured spectrum, by source and row, has all that this run wants beside the ledger; null for yes.</param>
    /// <param name="shard">Which part of the files, or null for all.</param>
    /// <exception cref="LedgerException">The ledger cannot be written.</exception>
    public static WorkPlan Make(
        LedgerFile ledger,
        IEnumerable<InputFile> files,
        PipelineSettings settings,
        bool again = false,
        bool verify = false,
        Func<string, int, bool>? isFinished = null,
        Shard? shard = null)
    {
        var part = shard ?? Shard.Whole;
        var plan = new WorkPlan(Fingerprint.Of(settings)) { Again = again, Verify = verify, IsFinished = isFinished };
        using var listing = new LedgerListing(ledger);
        var inputs = new XxHash128();
        foreach (var file in files)
        {
            inputs.Append(Encoding.UTF8.GetBytes(file.Source + "\n"));
            plan.Add(file, part, listing);
        }

        ledger.Setup = new(plan._fingerprint, settings.Load.Keep, part, Convert.ToHexStringLower(inputs.GetCurrentHash()));
        listing.Complete();
        return plan;
    }

    private void Add(InputFile file, Shard part, LedgerListing listing)
    {
        var stamp = file.Problem is null ? FileStamp.Of(file.Path) : FileStamp.None;
        if (!part.Reads(file.Source, stamp.Size))
            return;
        var known = listing.Add(file.Source, file.Path);
        var earlier = known is not null && !Again && known.Fingerprint == _fingerprint ? Earlier(known, listing) : null;
        if (earlier is { Complete: true } && !Verify && known!.Stamp == stamp && known.Path == file.Path)
            return;
        _files.Add(new(file, earlier));
        Bytes += Math.Max(0, stamp.Size);
    }

    private EarlierWork Earlier(KnownFile known, LedgerListing listing)
    {
        if (known.Complete && IsFinished is null)
            return new(known.Hash, true, FrozenSet<int>.Empty);
        var outcomes = listing.Outcomes(known).ToList();
        var done = outcomes.Where(outcome => !outcome.Answered || IsFinished?.Invoke(known.Source, outcome.Row) != false).Select(static outcome => outcome.Row).ToHashSet();
        return new(known.Hash, known.Complete && done.Count == outcomes.Count, done);
    }
}
