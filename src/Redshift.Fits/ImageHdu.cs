using System.Globalization;

namespace Redshift.Fits;

/// <summary>
/// An array of any number of axes: the primary array, an IMAGE extension, or a tile-compressed image, which looks no different.
/// Elements are counted in file order: the first axis runs fastest.
/// </summary>
public sealed class ImageHdu : Hdu
{
    // Pieces in which long reads are done: they stay in the second-level cache.
    private const int Piece = 1 << 16;

    private readonly Scaling _scaling;
    private readonly ByteSource _pixels;
    private readonly long _start;

    internal ImageHdu(HduLayout layout, ByteSource file)
        : this(layout, file, layout.Header, file, layout.Bitpix, layout.Axes) => _start = layout.DataStart;

    internal ImageHdu(HduLayout layout, ByteSource file, Header shown, ByteSource pixels, Bitpix bitpix, long[] axes)
        : base(layout, file, shown)
    {
        _pixels = pixels;
        Bitpix = bitpix;
        Shape = axes;
        Count = HduLayout.Elements(axes);
        _scaling = new Scaling(Header.GetDouble("BSCALE") ?? 1, Header.GetDouble("BZERO") ?? 0, Header.GetInteger("BLANK"));
    }

    /// <summary>Axis lengths, NAXIS1 first; empty for a unit without data.</summary>
    public IReadOnlyList<long> Shape { get; }

    /// <summary>How elements are stored, before scaling.</summary>
    public Bitpix Bitpix { get; }

    /// <summary>Number of elements.</summary>
    public long Count { get; }

    /// <summary>Whether every physical value is an integer that <see cref="ReadIntegers(long, Span{long})"/> gives exactly.</summary>
    public bool IsInteger => Bitpix > 0 && _scaling.IsExact;

    /// <summary>Physical values, BSCALE and BZERO applied; BLANK becomes NaN.</summary>
    /// <param name="first">0-based element to begin with.</param>
    /// <param name="count">Number of elements.</param>
    /// <exception cref="ArgumentOutOfRangeException">The range lies outside the array.</exception>
    /// <exception cref="FitsException">The data cannot be read.</exception>
    public double[] ReadDoubles(long first, int count)
    {
        RequireRange(first, count);
        var values = GC.AllocateUninitializedArray<double>(count);
        ReadDoubles(first, values);
        return values;
    }

    /// <summary>Fills the span with physical values; see <see cref="ReadDoubles(long, int)"/>.</summary>
    public void ReadDoubles(long first, Span<double> into) =>
        Read(first, into, (bytes, part) => _scaling.ToDoubles(Bitpix, bytes, part));

    /// <summary>Fills the span with physical values in single precision; 32-bit floats without scaling keep their bits.</summary>
    public void ReadSingles(long first, Span<float> into) =>
        Read(first, into, (bytes, part) => _scaling.ToSingles(Bitpix, bytes, part));

    /// <summary>Fills the span with exact integers. BLANK is given as it stands, shifted by BZERO like the rest.</summary>
    /// <exception cref="FitsUnsupportedException">The values are no integers, or one of them does not fit.</exception>
    public void ReadIntegers(long first, Span<long> into)
    {
        Exactly.Require(IsInteger, Layout.Where);
        Read(first, into, (bytes, part) => Exactly.ToIntegers(_scaling, Bitpix, bytes, part, Layout.Where));
    }

    /// <summary>Fills the span with exact unsigned integers, for data shifted by 2^63.</summary>
    /// <exception cref="FitsUnsupportedException">The values are no integers, or one of them is negative.</exception>
    public void ReadUnsigned(long first, Span<ulong> into)
    {
        Exactly.Require(IsInteger, Layout.Where);
        Read(first, into, (bytes, part) => Exactly.ToUnsigned(_scaling, Bitpix, bytes, part, Layout.Where));
    }

    private delegate void Conversion<T>(ReadOnlySpan<byte> stored, Span<T> into);

    private void Read<T>(long first, Span<T> into, Conversion<T> convert)
    {
        RequireRange(first, into.Length);
        var size = BigEndian.SizeOf(Bitpix);
        for (; !into.IsEmpty; into = into[Math.Min(Piece, into.Length)..], first += Piece)
        {
            var part = into[..Math.Min(Piece, into.Length)];
            using var stored = _pixels.View(_start + first * size, part.Length * size);
            convert(stored.Bytes, part);
        }
    }

    private void RequireRange(long first, int count)
    {
        if (first >= 0 && count >= 0 && first <= Count - count) return;
        throw new ArgumentOutOfRangeException(
            nameof(first), string.Create(CultureInfo.InvariantCulture, $"{count} elements from {first} are outside the {Count} of the array"));
    }
}
