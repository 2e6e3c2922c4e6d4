using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>
/// Fourier transforms of up to eight templates and of their squares, cut to a stretch of double cells. Both are of real sequences: the
/// frequencies up to the middle say all. Kept for observations alike.
/// </summary>
internal sealed class TemplateTransforms
{
    // A quarter of a megabyte each, some ten for each resolution.
    private static readonly RecentlyUsed<(TemplateRange Range, int Octet, int Level), Vector256<float>[]> Templates =
        new(32 << 20, static key => Pairs(key.Range, key.Octet, key.Level), static pairs => (long)pairs.Length * Vector256<byte>.Count);

    // Half a megabyte each.
    private static readonly RecentlyUsed<(TemplateRange Range, int Octet, int Level, int Start, int Length), TemplateTransforms> Kept =
        new(32 << 20, static key => new(key.Range, key.Octet, key.Level, key.Start, key.Length), static kept => 4L * kept.Re.Length * Vector256<byte>.Count);

    private TemplateTransforms(TemplateRange range, int octet, int level, int start, int length)
    {
        using LentArray<Vector256<float>> lentCells = new(length), lentSquares = new(length);
        Span<Vector256<float>> cells = lentCells.Span, squares = lentSquares.Span;
        Cut(Templates[(range, octet, level)], start, cells);
        for (var c = 0; c < length; c++) squares[c] = cells[c] * cells[c];
        FourierTransform.OfLength(length).Forward(cells, squares);
        var half = length / 2 + 1;
        (Re, Im, SquareRe, SquareIm) = (new Vector256<float>[half], new Vector256<float>[half], new Vector256<float>[half], new Vector256<float>[half]);
        for (var f = 0; f < half; f++)
        {
            // The transform of t + i t² holds that of t in what is even about the middle, that of t² in what is odd.
            var mirror = (length - f) & (length - 1);
            (Re[f], Im[f]) = ((cells[f] + cells[mirror]) * 0.5f, (squares[f] - squares[mirror]) * 0.5f);
            (SquareRe[f], SquareIm[f]) = ((squares[f] + squares[mirror]) * 0.5f, (cells[mirror] - cells[f]) * 0.5f);
        }
    }

    public Vector256<float>[] Re { get; }

    public Vector256<float>[] Im { get; }

    public Vector256<float>[] SquareRe { get; }

    public Vector256<float>[] SquareIm { get; }

    /// <summary>The transforms of the templates of a range from number 8·octet on.</summary>
    /// <param name="range">The range.</param>
    /// <param name="octet">Which eight of its templates.</param>
    /// <param name="level">One of <see cref="LineSpreadLevels"/>.</param>
    /// <param name="start">First double cell.</param>
    /// <param name="length">Number of double cells, a power of two.</param>
    public static TemplateTransforms Of(TemplateRange range, int octet, int level, int start, int length) => Kept[(range, octet, level, start, length)];

    /// <summary>The templates on all double cells.</summary>
    private static Vector256<float>[] Pairs(TemplateRange range, int octet, int level)
    {
        var lanes = range.Templates.Skip(octet * Vector256<float>.Count).Take(Vector256<float>.Count);
        return Octet.Pairs([.. lanes.Select(t => CellTemplate.Relative(t.Template, level, range.ForestLnShift, endsAtLimit: t.Index >= 0))]);
    }

    private static void Cut(Vector256<float>[] templates, int start, Span<Vector256<float>> into)
    {
        into.Clear();
        int from = Math.Max(0, start), to = Math.Min(templates.Length, start + into.Length);
        if (from < to) templates.AsSpan(from..to).CopyTo(into[(from - start)..]);
    }
}
