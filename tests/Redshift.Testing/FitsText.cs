using System.Text;

namespace Redshift.Testing;

/// <summary>Builds FITS bytes card by card from strings, so that tests can make files that no writer would.</summary>
public sealed class FitsText
{
    private readonly List<byte> _bytes = [];

    /// <summary>Adds a header: each line becomes an 80-character record, END and padding are added.</summary>
    public FitsText Header(params string[] lines) => Records([.. lines, "END"]).Pad(' ');

    /// <summary>Adds 80-character records without END and padding.</summary>
    public FitsText Records(params string[] lines)
    {
        foreach (var line in lines) _bytes.AddRange(Encoding.Latin1.GetBytes(line.PadRight(80)[..80]));
        return this;
    }

    /// <summary>Adds data bytes, and padding.</summary>
    public FitsText Data(params byte[] bytes)
    {
        _bytes.AddRange(bytes);
        return Pad('\0');
    }

    /// <summary>Adds bytes without padding.</summary>
    public FitsText Raw(params byte[] bytes)
    {
        _bytes.AddRange(bytes);
        return this;
    }

    /// <summary>All bytes so far.</summary>
    public byte[] ToBytes() => [.. _bytes];

    /// <summary>All bytes so far, as a stream to read.</summary>
    public MemoryStream ToStream() => new(ToBytes());

    private FitsText Pad(char filling)
    {
        while (_bytes.Count % 2880 != 0) _bytes.Add((byte)filling);
        return this;
    }
}
