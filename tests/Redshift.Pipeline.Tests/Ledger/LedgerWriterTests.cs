using System.Threading.Channels;
using Redshift.Pipeline.Ledger;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Ledger;

/// <summary>What a run loses that is killed: at any moment all is safe that was written longer ago than the interval of the commits.</summary>
public sealed class LedgerWriterTests : IDisposable
{
    private static readonly TimeSpan Step = TimeSpan.FromMilliseconds(10);

    private readonly TemporaryFolder _folder = new();
    private readonly HandSetClock _clock = new();
    private readonly LedgerFile _ledger;
    private readonly Channel<LedgerEntry> _entries = Channel.CreateUnbounded<LedgerEntry>();

    public LedgerWriterTests()
    {
        _ledger = LedgerFile.Open(_folder.Path);
        using var listing = new LedgerListing(_ledger);
        listing.Add("a.fits", "/a.fits");
        listing.Complete();
    }

    public void Dispose()
    {
        _ledger.Dispose();
        _folder.Dispose();
    }

    [Fact]
    public void A_stream_without_a_pause_is_committed_in_every_interval()
    {
        const int Entries = 200;
        var steps = (int)(LedgerWriter.CommitInterval / Step);
        var written = 0;
        var unsafeAtMost = 0;
        for (var row = 0; row < Entries; row++) Send(row);
        _entries.Writer.Complete();
        Write(_ =>
        {
            written++;
            unsafeAtMost = Math.Max(unsafeAtMost, written - Committed());
            _clock.Pass(Step);
        });

        Assert.Equal(Entries, Committed());
        Assert.Equal(steps, unsafeAtMost);
    }

    [Fact]
    public async Task What_is_written_before_a_pause_is_committed_when_the_interval_is_over()
    {
        var written = new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
        Send(0);
        var writing = Task.Run(() => Write(_ => written.SetResult()));
        await written.Task;
        Assert.Equal(0, Committed());

        // Nothing but time passes from here on.
        while (Committed() == 0)
        {
            Assert.False(writing.IsFaulted);
            _clock.Pass(Step);
            await Task.Yield();
        }

        Assert.InRange(_clock.GetElapsedTime(0), LedgerWriter.CommitInterval, TimeSpan.MaxValue);
        _entries.Writer.Complete();
        await writing;
    }

    [Fact]
    public void No_more_than_half_a_second_of_work_can_be_lost() => Assert.InRange(LedgerWriter.CommitInterval, TimeSpan.Zero, TimeSpan.FromSeconds(0.5));

    private void Send(int row) => Assert.True(_entries.Writer.TryWrite(new SpectrumDone("a.fits", new(row, "firm", "", ""), 1, 0)));

    private void Write(Action<LedgerEntry> written)
    {
        using var writer = new LedgerWriter(_ledger, _clock);
        writer.WriteAllAsync(_entries.Reader, written).GetAwaiter().GetResult();
    }

    // Another connection sees only what a killed run would leave behind.
    private int Committed()
    {
        using var seen = LedgerFile.OpenExisting(_folder.Path);
        return seen.CountByState().Values.Sum();
    }
}
