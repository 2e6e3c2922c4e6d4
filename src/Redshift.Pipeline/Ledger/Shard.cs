using System.Globalization;
using System.IO.Hashing;
using System.Text;

namespace Redshift.Pipeline.Ledger;

/// <summary>
/// One of several equal parts of the inputs, for several machines. Which part a spectrum belongs to depends on nothing but its source and
/// row, so every machine finds its own part by itself.
/// </summary>
/// <param name="Index">Which part, from 1.</param>
/// <param name="Count">Number of parts.</param>
public readonly record struct Shard(int Index, int Count)
{
    /// <summary>Spectra of a large file that stay together.</summary>
    public const int BlockRows = 1000;

    /// <summary>Files of this size and more are dealt out in blocks of spectra; smaller ones go to one part as they are, and no other reads them.</summary>
    public const long LargeFile = 16 << 20;

    /// <summary>The only part.</summary>
    public static Shard Whole { get; } = new(1, 1);

    /// <summary>Reads a text such as <c>3/7</c>.</summary>
    public static bool TryParse(string text, out Shard shard)
    {
        var parts = text.Split('/');
        shard = Whole;
        if (parts.Length != 2 || !TryNumber(parts[0], out var index) || !TryNumber(parts[1], out var count) || index > count)
            return false;
        shard = new(index, count);
        return true;
    }

    /// <summary>Whether something of a file belongs to this part.</summary>
    public bool Reads(string source, long size) => size >= LargeFile || OwnsBlock(source, 0);

    /// <summary>Whether a spectrum of a file belongs to this part.</summary>
    public bool Owns(string source, long size, int row) => OwnsBlock(source, size >= LargeFile ? row / BlockRows : 0);

    /// <inheritdoc/>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Index}/{Count}");

    private bool OwnsBlock(string source, int block) =>
        XxHash3.HashToUInt64(Encoding.UTF8.GetBytes(string.Create(CultureInfo.InvariantCulture, $"{source}\n{block}"))) % (ulong)Count == (ulong)(Index - 1);

    private static bool TryNumber(string text, out int value) =>
        int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out value) && value > 0;
}
