using System.Collections.Concurrent;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>
/// A template as the search needs it: relative to its own smooth part, on the cell grid, and its transforms.
/// Kept for all observations of the same resolution.
/// </summary>
internal sealed class CellTemplate
{
    /// <summary>σ of the Gaussian that stands for the smooth fit's response; applied twice over, (1−(1−S)²), as the spline follows parabolas.</summary>
    private const double SmoothSigma = 0.55 * SmoothFit.KnotSpacing;

    /// <summary>No spectrum rises above its own smooth part by more, but a quotient of two small numbers does.</summary>
    private const float Tallest = 3;

    private static readonly ConcurrentDictionary<(Template, int, double), CellTemplate> Cache = new();

    private readonly ConcurrentDictionary<(int Used, int Length), Transforms> _transforms = new();

    private CellTemplate(Template template, int level, double forestShift)
    {
        Relative = Sample(template.Broadened(level));
        if (forestShift > 0) Absorb(Relative, forestShift);
        var smooth = Smooth(Relative);
        for (var j = 0; j < Relative.Length; j++) Relative[j] = Math.Clamp(Relative[j] / Math.Max(smooth[j], 1e-6f) - 1, -1, Tallest);
    }

    /// <summary>Cells of every template.</summary>
    public static int Length => (int)((TemplateGrid.Count - 1) * TemplateGrid.Step / Cells.Step);

    /// <summary>Flux over smooth flux, minus one; element 0 is cell 0 of the absolute grid.</summary>
    public float[] Relative { get; }

    /// <summary>The template at the resolution of the data.</summary>
    /// <param name="template">The template.</param>
    /// <param name="sigmaLn">σ of the line spread in ln λ.</param>
    /// <param name="forestShift">ln(1+z) for the depth of the forest, 0 for none.</param>
    public static CellTemplate For(Template template, double sigmaLn, double forestShift = 0) =>
        Cache.GetOrAdd((template, LineSpreadLevels.Nearest(sigmaLn), forestShift), key => new CellTemplate(key.Item1, key.Item2, key.Item3));

    /// <summary>Transforms of the template's first cells and their squares, of a length.</summary>
    public Transforms Transform(int used, int length) => _transforms.GetOrAdd((used, length), key => new Transforms(Relative.AsSpan(0, key.Used), key.Length));

    private static float[] Sample(float[] fine)
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

    /// <summary>Spectra of t and t² with t cut to the length.</summary>
    internal sealed class Transforms
    {
        public Transforms(ReadOnlySpan<float> relative, int length)
        {
            (Re, Im, SquareRe, SquareIm) = (new float[length], new float[length], new float[length], new float[length]);
            var transform = new FourierTransform(length);
            for (var j = 0; j < relative.Length; j++)
            {
                Re[j] = relative[j];
                SquareRe[j] = relative[j] * relative[j];
            }

            transform.Forward(Re, Im);
            transform.Forward(SquareRe, SquareIm);
        }

        public float[] Re { get; }

        public float[] Im { get; }

        public float[] SquareRe { get; }

        public float[] SquareIm { get; }
    }
}
