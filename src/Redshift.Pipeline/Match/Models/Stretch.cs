namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// A part of the template grid. A spectrum with pixels of even width in wavelength has some ten line widths in units of velocity, and
/// needs each only over a tenth of its range.
/// </summary>
/// <param name="Start">First point.</param>
/// <param name="Length">Number of points.</param>
internal readonly record struct Stretch(int Start, int Length)
{
    // 16 kB, nine times as long as the widest filter reaches.
    private const int Shortest = 4096;

    /// <summary>The whole grid.</summary>
    public static Stretch Whole { get; } = new(0, TemplateGrid.Count);

    /// <summary>The point behind the last one.</summary>
    public int End => Start + Length;

    /// <summary>
    /// A stretch that holds the points of the grid between two. There are few lengths and places, so that fits alike share what is made
    /// for them: a stretch begins at a multiple of half its length.
    /// </summary>
    /// <param name="from">First point; it may lie outside the grid.</param>
    /// <param name="to">The point behind the last one; it may lie outside the grid.</param>
    public static Stretch Around(int from, int to)
    {
        var (first, end) = (Math.Clamp(from, 0, TemplateGrid.Count - 2), Math.Clamp(to, 2, TemplateGrid.Count));
        for (var length = Shortest; length < TemplateGrid.Count; length *= 2)
        {
            var start = first - first % (length / 2);
            if (end <= start + length) return new(start, Math.Min(length, TemplateGrid.Count - start));
        }

        return Whole;
    }
}
