using System.Buffers;
using System.Globalization;
using System.IO.Compression;
using Microsoft.Win32.SafeHandles;

namespace Redshift.Fits;

/// <summary>Turns a path or a stream into a source of FITS bytes, decompressing gzip within the bounds of the options.</summary>
internal static class SourceOpener
{
    public static ByteSource Open(string path, FitsReadOptions options)
    {
        // Sharing everything spares a lock, which network disks are slow to give.
        var handle = File.OpenHandle(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete);
        var file = new HandleSource(path, handle, handle);
        return ExpandIfGzip(file.Length <= options.MemoryLimit ? ReadWhole(file) : file, options);
    }

    public static ByteSource Open(Stream stream, string name, FitsReadOptions options)
    {
        using var gathering = new Gathering(options);
        if (!gathering.Take(stream, options.MaxExpandedBytes)) throw TooLong(name, options.MaxExpandedBytes);
        return ExpandIfGzip(gathering.ToSource(name), options);
    }

    private static MemorySource ReadWhole(HandleSource file)
    {
        using (file)
        {
            var length = (int)file.Length;
            var bytes = ArrayPool<byte>.Shared.Rent(length);
            file.Read(0, bytes.AsSpan(0, length));
            return new MemorySource(file.Name, bytes, length);
        }
    }

    private static ByteSource ExpandIfGzip(ByteSource source, FitsReadOptions options)
    {
        if (!IsGzip(source)) return source;
        using (source) return Expand(source, options);
    }

    private static bool IsGzip(ByteSource source)
    {
        if (source.Length < 2) return false;
        using var start = source.View(0, 2);
        return start.Bytes[0] == 0x1f && start.Bytes[1] == 0x8b;
    }

    // What was expanded before a stream breaks off is kept: its first header-data units may be whole.
    private static ByteSource Expand(ByteSource compressed, FitsReadOptions options)
    {
        using var stream = new GZipStream(new SourceStream(compressed), CompressionMode.Decompress);
        using var gathering = new Gathering(options);
        var limit = options.ExpansionLimit(compressed.Length);
        try
        {
            if (!gathering.Take(stream, limit)) throw TooLong(compressed.Name, limit);
            return gathering.ToSource(compressed.Name);
        }
        catch (InvalidDataException broken)
        {
            var damage = new FitsIntegrityException(new FitsLocation(compressed.Name), "a sound gzip stream", broken.Message, broken);
            return gathering.ToSource(compressed.Name, damage);
        }
    }

    private static FitsUnsupportedException TooLong(string name, long limit) => new(
        new FitsLocation(name),
        string.Create(CultureInfo.InvariantCulture, $"the content is longer than the {limit} bytes allowed"));
}
