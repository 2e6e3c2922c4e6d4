using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Normalize;

namespace Redshift.Pipeline.Match.Search;

/// <summary>
/// All spectra of an observation summed on one even grid in ln λ, 69 km/s a cell: what the search over all redshifts works on.
/// On this grid a redshift is a shift by whole cells.
/// </summary>
internal sealed class Cells
{
    /// <summary>Cell width in ln λ.</summary>
    public const double Step = 69 / Velocity.SpeedOfLightKmS;

    /// <summary>Empty cells kept on both sides, as wide as the widest filter reaches.</summary>
    public const int Margin = 320;

    /// <summary>ln λ of the lower edge of cell 0 of the absolute grid.</summary>
    public static readonly double LnOrigin = Math.Log(880);

    private Cells(int first, int count)
    {
        First = first;
        TemplateGradient = new float[count];
        TemplateCurvature = new float[count];
        LineGradient = new float[count];
        LineCurvature = new float[count];
        Continuum = new float[count];
    }

    /// <summary>Absolute index of element 0.</summary>
    public int First { get; }

    public int Count => TemplateGradient.Length;

    /// <summary>Σ w·c·(f−c): data against a template that multiplies the continuum.</summary>
    public float[] TemplateGradient { get; }

    /// <summary>Σ w·c².</summary>
    public float[] TemplateCurvature { get; }

    /// <summary>Σ w·(f−c): data against a line in flux.</summary>
    public float[] LineGradient { get; }

    /// <summary>Σ w.</summary>
    public float[] LineCurvature { get; }

    /// <summary>Continuum, floored by the noise; continued over gaps.</summary>
    public float[] Continuum { get; }

    /// <summary>Mean σ of the line spread in ln λ, the cell included.</summary>
    public double SigmaLn { get; private set; }

    /// <summary>The same in double cells; made when first asked for.</summary>
    public DoubleCells Pairs => field ??= new(this);

    public static Cells Build(IReadOnlyList<NormalizedSpectrum> spectra, ModelError modelError)
    {
        var first = (int)Math.Floor((spectra.Min(s => s.LnWavelength[0]) - LnOrigin) / Step) - Margin;
        var last = (int)Math.Floor((spectra.Max(s => s.LnWavelength[^1]) - LnOrigin) / Step) + Margin;
        var cells = new Cells(first, last - first + 1);
        var weights = new float[cells.Count];
        double spread = 0, total = 0;
        foreach (var spectrum in spectra)
        {
            for (var i = 0; i < spectrum.Count; i++)
            {
                if (spectrum.Weight[i] <= 0) continue;
                cells.Add(spectrum, i, modelError, weights);
                var information = spectrum.Weight[i] * Math.Max(spectrum.Continuum[i], 0.5f * spectrum.Baseline[i]);
                spread += information * spectrum.SigmaLn[i];
                total += information;
            }
        }

        var mean = total > 0 ? spread / total : Step;
        cells.SigmaLn = Math.Sqrt(mean * mean + Step * Step / 12);
        cells.FinishContinuum(weights);
        return cells;
    }

    /// <summary>Spreads a pixel over the cells that it covers, its information kept.</summary>
    private void Add(NormalizedSpectrum s, int i, ModelError modelError, float[] weights)
    {
        double width = s.PixelWidth[i], low = s.LnWavelength[i] - 0.5 * width, high = low + width;
        double c = s.Continuum[i], r = s.Flux[i] - c;
        var w = 1 / (1 / s.Weight[i] + modelError.Variance(s.LnWavelength[i], Math.Max(Math.Abs(c), s.Baseline[i]), r, Step / width));
        int from = (int)Math.Floor((low - LnOrigin) / Step), to = (int)Math.Floor((high - LnOrigin) / Step);
        for (var k = Math.Max(from, First); k <= Math.Min(to, First + Count - 1); k++)
        {
            var edge = LnOrigin + k * Step;
            var part = (float)(w * Math.Max(0, Math.Min(high, edge + Step) - Math.Max(low, edge)) / width);
            var at = k - First;
            TemplateGradient[at] += (float)(part * c * r);
            TemplateCurvature[at] += (float)(part * c * c);
            LineGradient[at] += (float)(part * r);
            LineCurvature[at] += part;
            Continuum[at] += (float)(part * Math.Max(c, 0.5 * s.Baseline[i]));
            weights[at] += part;
        }
    }

    private void FinishContinuum(float[] weights)
    {
        var previous = 0f;
        for (var k = 0; k < Count; k++)
        {
            if (weights[k] > 0) previous = Continuum[k] /= weights[k];
            else Continuum[k] = previous;
        }

        for (var k = Count - 1; k >= 0; k--)
        {
            if (Continuum[k] > 0) previous = Continuum[k];
            else Continuum[k] = previous;
        }
    }
}
