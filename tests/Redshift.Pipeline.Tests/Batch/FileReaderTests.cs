using System.Buffers.Binary;
using System.Threading.Channels;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Observations;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Batch;

/// <summary>The reading of one file, spectrum by spectrum, without measuring them.</summary>
public sealed class FileReaderTests : IDisposable
{
    private const int Rows = 5;

    private readonly TemporaryFolder _folder = new();
    private readonly Channel<PendingSpectrum> _work = Channel.CreateBounded<PendingSpectrum>(1);
    private readonly Channel<LedgerEntry> _entries = Channel.CreateUnbounded<LedgerEntry>();
    private readonly List<LedgerEntry> _seen = [];
    private readonly InputFile _file;
    private readonly FileReader _reader;

    public FileReaderTests()
    {
        File.WriteAllBytes(_folder.File("stack.fits"), Stack());
        _file = new(_folder.Path, "stack.fits");
        _reader = new(new(), "fingerprint", Shard.Whole, _work.Writer, _entries.Writer);
    }

    public void Dispose() => _folder.Dispose();

    [Fact]
    public async Task A_stack_is_read_spectrum_by_spectrum_as_the_workers_take_them()
    {
        var reading = ReadAsync(new(_file, null), CancellationToken.None);

        Assert.Equal([0, 1, 2, 3, 4], await TakeAsync(Rows));
        await reading;
        Assert.Equal(Rows, Entries().OfType<SpectrumDone>().Count());
        Assert.Null(Assert.IsType<FileEnded>(Entries().Last()).Spoilt);
    }

    [Fact]
    public async Task A_stack_that_was_begun_is_read_only_where_something_is_missing()
    {
        var known = new EarlierWork(ContentHash.Of(_file.Path), false, new HashSet<int> { 0, 3 });
        var reading = ReadAsync(new(_file, known), CancellationToken.None);

        Assert.Equal([1, 2, 4], await TakeAsync(Rows - 2));
        await reading;
        Assert.True(Assert.IsType<FileBegun>(Entries().First()).Keeps);
    }

    [Fact]
    public async Task Progress_adds_up_to_the_size_of_the_file()
    {
        var reading = ReadAsync(new(_file, null), CancellationToken.None);
        await TakeAsync(Rows);
        await reading;

        Assert.Equal(new FileInfo(_file.Path).Length, Entries().Sum(entry => entry.Bytes), 1e-6);
    }

    [Fact]
    public async Task A_file_that_changes_while_it_is_read_is_no_good()
    {
        var reading = ReadAsync(new(_file, null), CancellationToken.None);
        await TakeAsync(1);
        File.SetLastWriteTimeUtc(_file.Path, new DateTime(2030, 1, 1, 0, 0, 0, DateTimeKind.Utc));
        await TakeAsync(Rows - 1);
        await reading;

        Assert.Equal(
            "stack.fits: file: found another size or time after reading than before; expected a file that nobody writes; run again when it is complete",
            Assert.IsType<FileEnded>(Entries().Last()).Spoilt!.ToString());
    }

    [Fact]
    public async Task A_file_that_vanishes_while_it_is_read_is_no_good()
    {
        var reading = ReadAsync(new(_file, null), CancellationToken.None);
        await TakeAsync(1);
        File.Delete(_file.Path);
        await TakeAsync(Rows - 1);
        await reading;

        Assert.Equal(
            "stack.fits: file: found that it vanished while it was read; expected a file that stays; run again when it is back",
            Assert.IsType<FileEnded>(Entries().Last()).Spoilt!.ToString());
    }

    [Fact]
    public async Task A_file_that_vanished_before_is_a_reject_without_a_stamp()
    {
        File.Delete(_file.Path);
        await ReadAsync(new(_file, null), CancellationToken.None);

        Assert.Equal(FileStamp.None, Assert.IsType<FileBegun>(Entries().First()).Stamp);
        Assert.Equal("file", Assert.Single(Entries().OfType<SpectrumDone>()).Reject!.Place);
    }

    [Fact]
    public async Task Of_a_large_file_without_a_spectrum_of_its_part_only_the_headers_are_read()
    {
        File.WriteAllBytes(_file.Path, Stack());
        using (var file = File.OpenWrite(_file.Path)) file.SetLength(Shard.LargeFile);
        var others = Enumerable.Range(1, 7).Select(index => new Shard(index, 7)).Where(part => !part.Owns("stack.fits", Shard.LargeFile, 0));
        foreach (var part in others)
            await new FileReader(new(), "fingerprint", part, _work.Writer, _entries.Writer).ReadAsync(new(_file, null), CancellationToken.None);

        Assert.Equal(6, Entries().OfType<FileBegun>().Count());
        Assert.All(Entries().OfType<FileBegun>(), begun => Assert.Equal((FileStamp.None, "", false), (begun.Stamp, begun.Hash, begun.Keeps)));
        Assert.All(Entries().OfType<FileEnded>(), ended => Assert.Equal((Shard.LargeFile, null), (ended.Bytes, ended.Spoilt)));
        Assert.Empty(Entries().OfType<SpectrumDone>());
    }

    [Fact]
    public async Task An_interrupt_leaves_the_file_open()
    {
        using var interrupt = new CancellationTokenSource();
        var reading = ReadAsync(new(_file, null), interrupt.Token);
        await TakeAsync(2);
        await interrupt.CancelAsync();

        await Assert.ThrowsAnyAsync<OperationCanceledException>(() => reading);
        Assert.DoesNotContain(Entries(), entry => entry is FileEnded);
    }

    private async Task ReadAsync(FileWork work, CancellationToken token)
    {
        try
        {
            await _reader.ReadAsync(work, token);
        }
        finally
        {
            _work.Writer.Complete();
        }
    }

    // Does the work of a worker: takes spectra and reports each.
    private async Task<List<int>> TakeAsync(int count)
    {
        var rows = new List<int>();
        while (rows.Count < count && await _work.Reader.WaitToReadAsync())
        {
            var (file, observation) = await _work.Reader.ReadAsync();
            rows.Add(observation.Row);
            await file.ReportAsync(StoredOutcome.Of(new Reject(file.Source, observation.Row, "", "", "")), 0, null);
            await file.LeaveAsync();
        }

        return rows;
    }

    private List<LedgerEntry> Entries()
    {
        while (_entries.Reader.TryRead(out var entry))
            _seen.Add(entry);
        return _seen;
    }

    // Images with one row a spectrum, and the noise that says so.
    private static byte[] Stack()
    {
        var pixels = new byte[4 * 400 * Rows];
        for (var i = 0; i < 400 * Rows; i++)
            BinaryPrimitives.WriteSingleBigEndian(pixels.AsSpan(4 * i), 10 + i % 7);
        string[] image = ["BITPIX  =                  -32", "NAXIS   =                    2", "NAXIS1  =                  400", $"NAXIS2  =                    {Rows}"];
        return new FitsText()
            .Header(["SIMPLE  =                    T", .. image, "CRVAL1  =               6000.0", "CDELT1  =                  2.0", "CRPIX1  =                  1.0", "CTYPE1  = 'WAVE    '", "CUNIT1  = 'Angstrom'"])
            .Data(pixels)
            .Header(["XTENSION= 'IMAGE   '", .. image, "PCOUNT  =                    0", "GCOUNT  =                    1", "EXTNAME = 'IVAR    '"])
            .Data(pixels)
            .ToBytes();
    }
}
