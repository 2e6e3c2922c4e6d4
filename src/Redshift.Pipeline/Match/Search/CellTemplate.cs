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

    private static readonly ConcurrentDictionary<(Template, int), CellTemplate> Cache = new();

    private readonly ConcurrentDictionary<int, Transforms> _transforms = new();

    private CellTemplate(Template template, int level)
    {
        Template = template;
        Relative = Sample(template.Broadened(level));
        var smooth = Smooth(Relative);
        for (var j = 0; j < Relative.Length; j++) Relative[j] = Relative[j] / Math.Max(smooth[j], 1e-6f) - 1;
    }

    public Template Template { get; }

    /// <summary>Flux over smooth flux, minus one; element 0 is cell 0 of the absolute grid.</summary>
    public float[] Relative { get; }

    public static CellTemplate For(Template template, double sigmaLn) =>
        Cache.GetOrAdd((template, LineSpreadLevels.Nearest(sigmaLn)), key => new CellTemplate(key.Item1, key.Item2));

    /// <summary>Transforms of the template and its square, of a length.</summary>
    public Transforms Transform(int length) => _transforms.GetOrAdd(length, n => new Transforms(Relative, n));

    private static float[] Sample(float[] fine)
    {
        var count = (int)((TemplateGrid.Count - 1) * TemplateGrid.Step / Cells.Step);
        var cells = new float[count];
        for (var j = 0; j < count; j++)
        {
            var x = (j + 0.5) * Cells.Step / TemplateGrid.Step;
            var i = Math.Min((int)x, fine.Length - 2);
            var t = (float)(x - i);
            cells[j] = fine[i] + t * (fine[i + 1] - fine[i]);
        }

        return cells;
    }

    private static float[] Smooth(float[] values)
    {
        var once = GaussianFilter.Convolve(values, SmoothSigma / Cells.Step);
        var twice = GaussianFilter.Convolve(once, SmoothSigma / Cells.Step);
        for (var i = 0; i < once.Length; i++) once[i] = 2 * once[i] - twice[i];
        return once;
    }

    /// <summary>Spectra of t and t² with t cut to the length.</summary>
    internal sealed class Transforms
    {
        public Transforms(float[] relative, int length)
        {
            (Re, Im, SquareRe, SquareIm) = (new float[length], new float[length], new float[length], new float[length]);
            var transform = new FourierTransform(length);
            for (var j = 0; j < Math.Min(length, relative.Length); j++)
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
