using System.Collections.Concurrent;
using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>
/// Fourier transforms of up to eight templates and of their squares, cut to a stretch of double cells. Both are of real sequences: the
/// frequencies up to the middle say all. Kept for observations alike, up to a number of them, as archives may hold any mixture.
/// </summary>
internal sealed class TemplateTransforms
{
    /// <summary>Sets that are kept, half a megabyte each.</summary>
    private const int MostKept = 96;

    private static readonly ConcurrentDictionary<(TemplateRange Range, int Octet, int Level), Vector256<float>[]> Templates = new();
    private static readonly Lock Gate = new();
    private static readonly Dictionary<(TemplateRange Range, int Octet, int Level, int Start, int Length), TemplateTransforms> Kept = [];

    private TemplateTransforms(TemplateRange range, int octet, int level, int start, int length)
    {
        var cells = Cut(Templates.GetOrAdd((range, octet, level), key => Pairs(key.Range, key.Octet, key.Level)), start, length);
        var squares = Array.ConvertAll(cells, c => c * c);
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
    public static TemplateTransforms Of(TemplateRange range, int octet, int level, int start, int length)
    {
        var key = (range, octet, level, start, length);
        lock (Gate)
        {
            if (Kept.TryGetValue(key, out var kept)) return kept;
        }

        var made = new TemplateTransforms(range, octet, level, start, length);
        lock (Gate)
        {
            if (Kept.Count >= MostKept) Kept.Clear();
            Kept[key] = made;
        }

        return made;
    }

    /// <summary>The templates on all double cells.</summary>
    private static Vector256<float>[] Pairs(TemplateRange range, int octet, int level)
    {
        var lanes = range.Templates.Skip(octet * Vector256<float>.Count).Take(Vector256<float>.Count);
        var single = Octet.Interleave([.. lanes.Select(t => CellTemplate.Relative(t.Template, level, range.ForestLnShift))]);
        var pairs = new Vector256<float>[single.Length / 2];
        for (var j = 0; j < pairs.Length; j++) pairs[j] = (single[2 * j] + single[2 * j + 1]) * 0.5f;
        return pairs;
    }

    private static Vector256<float>[] Cut(Vector256<float>[] templates, int start, int length)
    {
        var cut = new Vector256<float>[length];
        int from = Math.Max(0, start), to = Math.Min(templates.Length, start + length);
        if (from < to) templates.AsSpan(from..to).CopyTo(cut.AsSpan(from - start));
        return cut;
    }
}
