using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;

namespace Redshift.Pipeline.Match.Search;

/// <summary>
/// ln evidence of templates over the few shifts that velocities within the Galaxy make, summed directly, eight templates at once, on double
/// cells: which few stars are worth an exact fit shows as well on them.
/// </summary>
internal sealed class StarScan
{
    /// <summary>Shifts that are summed together: each template is read once for all of them.</summary>
    private const int Together = 4;

    /// <summary>The range of double cells is rounded outwards to so many, so that observations alike share the templates.</summary>
    private const int Rounding = 512;

    // Some 1.5 MB for optical spectra of one resolution.
    private static readonly RecentlyUsed<(IReadOnlyList<Template> Templates, int Level, int From, int To), StarScan> Prepared =
        new(40 << 20, static key => new(key.Templates, key.Level, key.From, key.To), static scan => scan._octets.Sum(static octet => (long)octet.Length * Vector256<byte>.Count));

    private readonly int _start;
    private readonly Vector256<float>[][] _octets;

    private StarScan(IReadOnlyList<Template> templates, int level, int from, int to)
    {
        Count = templates.Count;
        _start = from;
        _octets = [.. templates.Chunk(Vector256<float>.Count).Select(octet => Octet.Pairs([.. octet.Select(t => CellTemplate.Relative(t, level))])[from..to])];
    }

    /// <summary>Number of templates.</summary>
    public int Count { get; }

    /// <summary>The templates at the resolution of data; kept for all observations alike.</summary>
    /// <param name="templates">The templates; the same list for all calls.</param>
    /// <param name="cells">The data.</param>
    public static StarScan Of(IReadOnlyList<Template> templates, Cells cells)
    {
        var pairs = cells.Pairs;
        var from = Math.Clamp(pairs.First / Rounding * Rounding, 0, CellTemplate.Length / 2);
        var to = Math.Clamp((pairs.First + pairs.Gradient.Length + Rounding - 1) / Rounding * Rounding, from, CellTemplate.Length / 2);
        return Prepared[(templates, LineSpreadLevels.Nearest(cells.SigmaLn), from, to)];
    }

    /// <summary>ln evidence of each template, one row each, at shifts from a first one on.</summary>
    /// <param name="cells">The data.</param>
    /// <param name="firstShift">Shift in double cells of the first column; none may move cells by more than the margin of the data.</param>
    /// <param name="count">Number of shifts.</param>
    public float[][] LnEvidence(DoubleCells cells, int firstShift, int count)
    {
        var rows = new float[Count][];
        for (var t = 0; t < Count; t++) rows[t] = new float[count];
        for (var octet = 0; octet < _octets.Length; octet++)
            for (var s = 0; s < count; s += Together) Take(cells, octet, firstShift, s, rows);
        return rows;
    }

    private void Take(DoubleCells cells, int octet, int firstShift, int s, float[][] rows)
    {
        Span<Vector256<float>> found = stackalloc Vector256<float>[Together];
        Sum(cells, _octets[octet], _start, firstShift + s, found);
        for (var k = 0; k < Together && s + k < rows[0].Length; k++)
            for (var lane = 0; lane < Vector256<float>.Count && octet * Vector256<float>.Count + lane < Count; lane++)
                rows[octet * Vector256<float>.Count + lane][s + k] = found[k][lane];
    }

    private static void Sum(DoubleCells cells, Vector256<float>[] templates, int start, int shift, Span<Vector256<float>> found)
    {
        // At the ends of the range some of the shifts meet the empty margin of the data.
        int from = Math.Max(0, cells.First + DoubleCells.Margin - shift - Together - start), to = Math.Min(templates.Length, cells.First + cells.Gradient.Length - DoubleCells.Margin - shift - start);
        var offset = start + shift - cells.First;
        Vector256<float> n0 = default, n1 = default, n2 = default, n3 = default, d0 = default, d1 = default, d2 = default, d3 = default;
        for (var t = from; t < to; t++)
        {
            var value = templates[t];
            var square = value * value;
            var gradient = cells.Gradient.AsSpan(t + offset, Together);
            var curvature = cells.Curvature.AsSpan(t + offset, Together);
            n0 += value * gradient[0];
            n1 += value * gradient[1];
            n2 += value * gradient[2];
            n3 += value * gradient[3];
            d0 += square * curvature[0];
            d1 += square * curvature[1];
            d2 += square * curvature[2];
            d3 += square * curvature[3];
        }

        var precision = Vector256.Create(1 / (Strength.Spread * Strength.Spread));
        (found[0], found[1]) = (Strength.LnEvidence(n0, d0, precision), Strength.LnEvidence(n1, d1, precision));
        (found[2], found[3]) = (Strength.LnEvidence(n2, d2, precision), Strength.LnEvidence(n3, d3, precision));
    }
}
