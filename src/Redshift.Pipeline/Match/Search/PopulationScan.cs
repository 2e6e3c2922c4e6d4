using Redshift.Pipeline.Match.Models;

namespace Redshift.Pipeline.Match.Search;

/// <summary>
/// Stellar populations at all redshifts, searched in steps of two cells with the depth of the forest that each range of redshifts has;
/// and the step at Lyman alpha that the forest makes in a featureless continuum.
/// </summary>
internal sealed class PopulationScan
{
    /// <summary>Prior σ of the forest's strength: its depth differs between sightlines, and within a range of redshifts that shares one depth.</summary>
    private const double ForestSpread = 0.15;

    private static readonly Lazy<IReadOnlyList<TemplateRange>> Ranges = new(() => TemplateRange.Split(
        [.. ModelLibrary.Instance.Galaxies.Select((m, i) => new SearchedTemplate(m.Template!, i, Strength.Spread, m.GreatestLnShift))],
        new(ModelLibrary.Flat, -1, ForestSpread, double.PositiveInfinity)));

    private readonly int _first;
    private readonly float[] _best;
    private readonly short[] _which;
    private readonly float[] _steps;

    /// <summary>Searches.</summary>
    /// <param name="cells">The data.</param>
    /// <param name="firstShift">Lowest shift in cells.</param>
    /// <param name="shifts">Number of shifts.</param>
    public PopulationScan(Cells cells, int firstShift, int shifts)
    {
        // One double cell more on both sides, for the interpolation.
        _first = (firstShift >> 1) - 1;
        var count = ((firstShift + shifts) >> 1) + 3 - _first;
        (_best, _which, _steps) = (new float[count], new short[count], new float[count]);
        Array.Fill(_best, float.NegativeInfinity);
        var scan = new TemplateScan(cells);
        foreach (var range in Ranges.Value)
        {
            int from = (int)Math.Max(0, Math.Ceiling(range.From / (2 * Cells.Step)) - _first), to = (int)Math.Min(count, Math.Ceiling(range.To / (2 * Cells.Step)) - _first);
            if (to > from) scan.Take(range, _first + from, _best.AsSpan(from..to), _which.AsSpan(from..to), _steps.AsSpan(from..to));
        }
    }

    /// <summary>ln evidence of the best population at every single shift.</summary>
    /// <param name="firstShift">First shift in cells.</param>
    /// <param name="shifts">Number of shifts.</param>
    public float[] Fine(int firstShift, int shifts)
    {
        var fine = new float[shifts];
        for (var s = 0; s < shifts; s++)
        {
            var at = ((firstShift + s) >> 1) - _first;
            fine[s] = ((firstShift + s) & 1) == 0 ? _best[at] : Between(_best[at - 1], _best[at], _best[at + 1], _best[at + 2]);
        }

        return fine;
    }

    /// <summary>Number of the best population at a shift.</summary>
    public int Template(int shift)
    {
        var at = (shift >> 1) - _first;
        return (shift & 1) == 0 || _best[at] >= _best[at + 1] ? _which[at] : _which[at + 1];
    }

    /// <summary>ln evidence of a forest alone, at the even shift below or at a shift.</summary>
    public float ForestStep(int shift) => _steps[(shift >> 1) - _first];

    /// <summary>The middle between b and c of a cubic through four values; it rises above both no further than these rise above their neighbours.</summary>
    private static float Between(float a, float b, float c, float d)
    {
        if (!float.IsFinite(a + b + c + d)) return Math.Min(b, c);
        var cubic = 0.5625f * (b + c) - 0.0625f * (a + d);
        return Math.Min(cubic, Math.Max(b, c) + 0.5f * Math.Min(Math.Abs(b - a), Math.Abs(c - d)));
    }
}
