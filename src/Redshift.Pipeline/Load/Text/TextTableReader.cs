using System.IO.Compression;
using System.Text;

namespace Redshift.Pipeline.Load.Text;

/// <summary>Reads columns of numbers from a text file, plain or compressed with gzip.</summary>
internal static class TextTableReader
{
    // A million pixels with some columns; compressed text could otherwise expand without end.
    private const long MostBytes = 1 << 26;

    /// <summary>Reads a file.</summary>
    /// <exception cref="LoadException">A line is not numbers, and the message says which.</exception>
    public static TextTable Read(string path)
    {
        using var file = File.OpenRead(path);
        using var stream = IsGzip(file) ? new GZipStream(file, CompressionMode.Decompress) : (Stream)file;
        using var bounded = new BoundedStream(stream, MostBytes);
        using var reader = new StreamReader(bounded, Encoding.UTF8);
        var lines = new LineCollector();
        while (reader.ReadLine() is { } line) lines.Add(line);
        return lines.ToTable();
    }

    private static bool IsGzip(FileStream file)
    {
        Span<byte> magic = stackalloc byte[2];
        var read = file.ReadAtLeast(magic, 2, throwOnEndOfStream: false);
        file.Position = 0;
        return read == 2 && magic[0] == 0x1f && magic[1] == 0x8b;
    }
}
