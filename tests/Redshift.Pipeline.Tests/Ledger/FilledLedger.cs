using System.Threading.Channels;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;
using Xunit;

namespace Redshift.Pipeline.Tests.Ledger;

/// <summary>Ledgers with hand-made outcomes.</summary>
internal static class FilledLedger
{
    /// <summary>Notes answers and rejects as a run does, in this order.</summary>
    public static void Fill(LedgerFile ledger, IReadOnlyList<string> keep, params object[] outcomes)
    {
        var columns = CatalogueColumns.With(keep);
        var entries = outcomes.Select(outcome => outcome is ObservationResult result
            ? new SpectrumDone(result.Observation.Source, StoredOutcome.Of(result, columns), 1, 0)
            : new SpectrumDone(((Reject)outcome).Source, StoredOutcome.Of((Reject)outcome), 1, 0, (Reject)outcome)).ToList();
        using (var listing = new LedgerListing(ledger))
        {
            ledger.Setup = new("fingerprint", keep, Shard.Whole, "inputs");
            foreach (var entry in entries)
                listing.Add(entry.Source, "/" + entry.Source);
            listing.Complete();
        }

        Write(ledger, [.. entries]);
    }

    /// <summary>Makes the finished ledger of one part of a run, or one that differs from it as told.</summary>
    public static string Part(string folder, string shard, Func<LedgerSetup, LedgerSetup>? change, params object[] outcomes)
    {
        Directory.CreateDirectory(folder);
        Assert.True(Shard.TryParse(shard, out var part));
        using var ledger = LedgerFile.Open(folder);
        Fill(ledger, [], outcomes);
        var setup = ledger.Setup! with { Shard = part, Finished = true };
        ledger.Setup = change?.Invoke(setup) ?? setup;
        return folder;
    }

    /// <summary>Writes entries to the end.</summary>
    public static void Write(LedgerFile ledger, params LedgerEntry[] entries)
    {
        var channel = Channel.CreateUnbounded<LedgerEntry>();
        foreach (var entry in entries)
            Assert.True(channel.Writer.TryWrite(entry));
        channel.Writer.Complete();
        using var writer = new LedgerWriter(ledger);
        writer.WriteAllAsync(channel.Reader, static _ => { }).GetAwaiter().GetResult();
    }
}
