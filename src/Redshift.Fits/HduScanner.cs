using System.Globalization;
using System.Text;

namespace Redshift.Fits;

/// <summary>Walks through a file from header to header.</summary>
internal sealed class HduScanner
{
    private readonly ByteSource _source;
    private readonly FitsReadOptions _options;
    private readonly List<Hdu> _hdus = [];

    private HduScanner(ByteSource source, FitsReadOptions options)
    {
        _source = source;
        _options = options;
    }

    /// <summary>The sound units, and what is wrong behind them.</summary>
    public static (IReadOnlyList<Hdu> Hdus, FitsException? Damage) Scan(ByteSource source, FitsReadOptions options)
    {
        var scanner = new HduScanner(source, options);
        scanner.RequireFits();
        var found = scanner.ScanAll();
        var damage = source.Damage ?? found;
        if (damage is not null && !scanner._hdus.Exists(hdu => hdu.Layout.DataLength > 0)) throw damage;
        return (scanner._hdus, damage);
    }

    private FitsException? ScanAll()
    {
        try
        {
            for (long at = 0; at < _source.Length && IsHeader(at);) at = Add(at);
            return null;
        }
        catch (FitsException damage)
        {
            return damage;
        }
    }

    private long Add(long at)
    {
        var layout = HduLayout.Read(_source, new FitsLocation(_source.Name, _hdus.Count, Offset: at));
        RequireData(layout);
        _hdus.Add(HduFactory.Create(layout, _source, _options));
        RequirePadding(layout);
        return layout.End;
    }

    private void RequireData(HduLayout layout)
    {
        var there = Math.Max(0, _source.Length - layout.DataStart);
        if (there < layout.DataLength)
            throw new FitsTruncatedException(layout.Where with { Offset = layout.DataStart }, Bytes(layout.DataLength) + " of data", Bytes(there));
    }

    // A last block that is not filled up does no harm, but is worth a word.
    private void RequirePadding(HduLayout layout)
    {
        if (_source.Length < layout.End)
            throw new FitsTruncatedException(layout.Where, $"{Bytes(layout.End)} with the padding of the last block", Bytes(_source.Length));
    }

    private static string Bytes(long count) => string.Create(CultureInfo.InvariantCulture, $"{count} bytes");

    // Behind the last unit blank filling is let pass; anything else may be all that is left of a lost unit.
    private bool IsHeader(long at)
    {
        using var start = _source.View(at, (int)Math.Min(Blocks.Length, _source.Length - at));
        if (at == 0 || start.Bytes.StartsWith("XTENSION"u8)) return true;
        if (!start.Bytes.ContainsAnyExcept((byte)0, (byte)' ')) return false;
        throw new FitsHeaderException(
            new FitsLocation(_source.Name, _hdus.Count, Offset: at), "XTENSION or the end of the file", Quote(start.Bytes));
    }

    private void RequireFits()
    {
        if (_source.Length == 0) throw new NotFitsException(new FitsLocation(_source.Name), "an empty file");
        using var start = _source.View(0, (int)Math.Min(RecordFields.RecordLength, _source.Length));
        if (!FitsFile.LooksLikeFits(start.Bytes)) throw new NotFitsException(new FitsLocation(_source.Name), Quote(start.Bytes));
    }

    private static string Quote(ReadOnlySpan<byte> bytes) => $"'{Encoding.Latin1.GetString(bytes[..Math.Min(16, bytes.Length)])}'";
}
