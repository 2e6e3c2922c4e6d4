using Redshift.Fits;
using Redshift.Pipeline.Load.Assembly;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Rules;
using Redshift.Pipeline.Load.Text;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load;

/// <summary>The reading of one file: all that goes wrong in it ends here, as a reject.</summary>
internal sealed class FileReading(string source, LoadSettings settings) : IDisposable
{
    private readonly List<(LayoutReader Reader, int First)> _readers = [];
    private FitsFile? _file;

    /// <summary>Number of observations.</summary>
    public int Rows { get; private set; }

    /// <summary>Opens the file and decides on its layout.</summary>
    /// <returns>Why it cannot be read; null where it can.</returns>
    public Reject? Open(string path) => Guarded<Reject?>(null, () =>
    {
        if (Directory.Exists(path)) throw new LoadException("path", "a folder", "a file");
        foreach (var (layout, rule) in Layouts(path)) Add(layout, rule);
        return null;
    }, static reject => reject);

    /// <summary>Reads one observation.</summary>
    public LoadOutcome Read(int row) => Guarded(row, () =>
    {
        var (reader, first) = ReaderOf(row);
        return new(reader.Read(row - first, row), null);
    }, static reject => new LoadOutcome(null, reject));

    /// <summary>What the file holds, whether it could be read or not.</summary>
    public IReadOnlyList<ReadingNote> Contents() => _file is { } file ? FileContents.Of(file) : [];

    /// <summary>The load rule that reads an observation as it was read.</summary>
    public string Rule(int row) => ReaderOf(row).Reader.Rule([.. _readers.Select(static reader => reader.Reader.FluxHdu)]);

    /// <inheritdoc/>
    public void Dispose() => _file?.Dispose();

    private IReadOnlyList<(Layout Layout, LoadRule? Rule)> Layouts(string path)
    {
        if (!IsFits(path)) return [TextRules.Find(TextTableReader.Read(path), settings)];
        _file = FitsFile.Open(path);
        return FitsRules.Find(_file, settings);
    }

    // A gzip file is FITS if what comes out of it is; short of that the first bytes tell.
    private static bool IsFits(string path)
    {
        Span<byte> first = stackalloc byte[10];
        using var file = File.OpenRead(path);
        if (file.Length == 0) throw new LoadException("file", "nothing: it is empty", "a spectrum");
        var read = file.ReadAtLeast(first, first.Length, throwOnEndOfStream: false);
        if (read < 2 || first[0] != 0x1f || first[1] != 0x8b) return FitsFile.LooksLikeFits(first[..read]);
        file.Position = 0;
        using var expanded = new System.IO.Compression.GZipStream(file, System.IO.Compression.CompressionMode.Decompress);
        read = expanded.ReadAtLeast(first, first.Length, throwOnEndOfStream: false);
        return FitsFile.LooksLikeFits(first[..read]);
    }

    private void Add(Layout layout, LoadRule? rule)
    {
        _readers.Add((new(layout, source, settings, rule), Rows));
        Rows += layout.Rows;
    }

    private (LayoutReader Reader, int First) ReaderOf(int row) => _readers.FindLast(reader => reader.First <= row);

    private T Guarded<T>(int? row, Func<T> read, Func<Reject, T> refuse)
    {
        try
        {
            return read();
        }
        catch (LoadException refusal)
        {
            return refuse(new(source, row, refusal.Place, refusal.Found, refusal.Expected));
        }
        catch (FitsException damage)
        {
            return refuse(new(source, row, PlaceOf(damage.Location), Found(damage), damage.Expected ?? "a sound FITS file"));
        }
        catch (Exception trouble) when (trouble is IOException or UnauthorizedAccessException or InvalidDataException or NotSupportedException)
        {
            return refuse(new(source, row, "file", trouble.Message, "a readable file"));
        }
        // Sizes come from the file, and a size that no memory holds is the file's fault.
        catch (Exception excess) when (excess is OverflowException or OutOfMemoryException or ArgumentException)
        {
            return refuse(new(source, row, "file", $"sizes that cannot be: {excess.Message}", "a spectrum"));
        }
    }

    private static string Found(FitsException damage) =>
        damage is FitsTruncatedException ? $"{damage.Found}: the file is cut short" : damage.Found ?? Trouble(damage);

    /// <summary>The message without its location, which names the file by a path of this machine.</summary>
    private static string Trouble(FitsException damage) => damage.Message[Math.Min(damage.Message.Length, $"{damage.Location}: ".Length)..];

    private static string PlaceOf(FitsLocation location) => location.Hdu is { } hdu ? $"HDU {hdu}" : "file";
}
