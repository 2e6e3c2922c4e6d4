using System.Globalization;

namespace Redshift.Fits;

/// <summary>A header-data unit: a header and what it describes.</summary>
public abstract class Hdu
{
    private protected Hdu(HduLayout layout, ByteSource file, Header? shown = null)
    {
        Layout = layout;
        File = file;
        Header = shown ?? layout.Header;
    }

    /// <summary>0-based place in the file; the primary unit is 0.</summary>
    public int Index => Layout.Where.Hdu.GetValueOrDefault();

    /// <summary>EXTNAME, or empty.</summary>
    public string Name => Header.GetString("EXTNAME") ?? "";

    /// <summary>EXTVER, 1 when it is not given.</summary>
    public int Version => (int)Math.Clamp(Header.GetInteger("EXTVER") ?? 1, int.MinValue, int.MaxValue);

    /// <summary>The cards; those of a compressed image are the ones it had before compression.</summary>
    public Header Header { get; }

    internal HduLayout Layout { get; }

    internal ByteSource File { get; }

    /// <summary>Compares the data, as they are stored, with DATASUM (section 4.4.2.7).</summary>
    public ChecksumState CheckData()
    {
        if (Layout.Header.GetString("DATASUM") is not { Length: > 0 } text) return ChecksumState.Absent;
        var isSum = uint.TryParse(text.Trim(), NumberStyles.None, CultureInfo.InvariantCulture, out var sum);
        return StateOf(isSum && SumOf(Layout.DataStart, Layout.End) == sum);
    }

    /// <summary>Compares header and data, as they are stored, with CHECKSUM.</summary>
    public ChecksumState CheckAll()
    {
        if (Layout.Header.GetString("CHECKSUM") is not { Length: > 0 }) return ChecksumState.Absent;
        return StateOf(SumOf(Layout.Where.Offset.GetValueOrDefault(), Layout.End) is Checksum.Sound or 0);
    }

    private static ChecksumState StateOf(bool isCorrect) => isCorrect ? ChecksumState.Correct : ChecksumState.Wrong;

    private uint SumOf(long start, long end)
    {
        var sum = 0u;
        for (; start < end && start < File.Length; start += Blocks.Length)
        {
            using var block = File.View(start, (int)Math.Min(Blocks.Length, File.Length - start));
            sum = Checksum.Add(sum, block.Bytes);
        }

        return sum;
    }
}
