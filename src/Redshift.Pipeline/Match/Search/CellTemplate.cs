using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>A template as the search needs it: relative to its own smooth part, on the cell grid.</summary>
internal static class CellTemplate
{
    /// <summary>σ of the Gaussian that stands for the smooth fit's response; applied twice over, (1−(1−S)²), as the spline follows parabolas.</summary>
    private const double SmoothSigma = 0.55 * SmoothFit.KnotSpacing;

    /// <summary>No spectrum rises above its own smooth part by more, but a quotient of two small numbers does.</summary>
    private const float Tallest = 3;

    /// <summary>Cells of every template.</summary>
    public static int Length => (int)((TemplateGrid.Count - 1) * TemplateGrid.Step / Cells.Step);

    /// <summary>Flux over smooth flux, minus one; element 0 is cell 0 of the absolute grid.</summary>
    /// <param name="template">The template.</param>
    /// <param name="level">One of <see cref="LineSpreadLevels"/>.</param>
    /// <param name="forestShift">ln(1+z) for the depth of the forest, 0 for none.</param>
    /// <param name="endsAtLimit">Whether nothing passes below the Lyman limit; otherwise the template says nothing there.</param>
    public static float[] Relative(Template template, int level, double forestShift = 0, bool endsAtLimit = true)
    {
        using var broadened = new LentArray<float>(TemplateGrid.Count);
        template.Broaden(level, broadened.Span);
        var relative = Sample(broadened.Span);
        if (forestShift > 0) Absorb(relative, forestShift);
        var smooth = Smooth(relative);
        var silent = endsAtLimit || forestShift == 0 ? 0 : (int)((Forest.LnLymanLimit - Cells.LnOrigin) / Cells.Step);
        relative.AsSpan(0, silent).Clear();
        for (var j = silent; j < relative.Length; j++) relative[j] = Math.Clamp(relative[j] / Math.Max(smooth[j], 1e-6f) - 1, -1, Tallest);
        return relative;
    }

    private static float[] Sample(ReadOnlySpan<float> fine)
    {
        var cells = new float[Length];
        for (var j = 0; j < Length; j++)
        {
            var x = (j + 0.5) * Cells.Step / TemplateGrid.Step;
            var i = Math.Min((int)x, fine.Length - 2);
            var t = (float)(x - i);
            cells[j] = fine[i] + t * (fine[i + 1] - fine[i]);
        }

        return cells;
    }

    private static void Absorb(float[] cells, double shift)
    {
        for (var j = 0; j < cells.Length; j++)
            cells[j] *= (float)Forest.Transmission(Cells.LnOrigin + (j + 0.5) * Cells.Step + shift, shift);
    }

    private static float[] Smooth(float[] values)
    {
        var once = GaussianFilter.Convolve(values, SmoothSigma / Cells.Step);
        var twice = GaussianFilter.Convolve(once, SmoothSigma / Cells.Step);
        // At a deep step 2S − S² undershoots zero.
        for (var i = 0; i < once.Length; i++) once[i] = Math.Max(2 * once[i] - twice[i], 0.5f * once[i]);
        return once;
    }
}
