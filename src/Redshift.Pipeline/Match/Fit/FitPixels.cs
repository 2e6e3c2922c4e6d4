using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>
/// The pixels on which models are compared, all spectra of the observation one after the other, each with its own smooth nuisance.
/// All kinds are fitted to the same pixels with the same nuisance, so that their evidences can be compared.
/// The arrays are a vector longer than there are pixels, so that sums may read, and mask, beyond the last one.
/// </summary>
internal sealed class FitPixels
{
    private FitPixels(int count, int coefficients)
    {
        Count = count;
        var padded = count + Kernels.Lanes;
        LnWavelength = new double[padded];
        Flux = new float[padded];
        Weight = new float[padded];
        SigmaLn = new float[padded];
        Continuum = new float[padded];
        TemplateIndex = new int[padded];
        TemplateFraction = new float[padded];
        Basis = new(count, coefficients);
    }

    /// <summary>Number of pixels.</summary>
    public int Count { get; }

    public double[] LnWavelength { get; }

    public float[] Flux { get; }

    /// <summary>Inverse variance with the model error.</summary>
    public float[] Weight { get; }

    /// <summary>Σ weight × continuum²: what the pixels can say of models that multiply the continuum.</summary>
    public double Information => Enumerable.Range(0, Count).Sum(p => (double)Weight[p] * Continuum[p] * Continuum[p]);

    public float[] SigmaLn { get; }

    /// <summary>Smooth continuum, floored at a share of the noise so that priors on line strengths stay proper.</summary>
    public float[] Continuum { get; }

    /// <summary>Place on <see cref="TemplateGrid"/> of each pixel at redshift zero, rounded down.</summary>
    public int[] TemplateIndex { get; }

    /// <summary>What the place on the template grid was rounded by.</summary>
    public float[] TemplateFraction { get; }

    /// <summary>Stretches of pixels of the same one of <see cref="LineSpreadLevels"/>.</summary>
    public List<(int Start, int End, int Level)> Levels { get; } = [];

    /// <summary>The smooth nuisance, a spline for each spectrum.</summary>
    public SplineBasis Basis { get; }

    /// <summary>Index of the first pixel of each spectrum, and the end.</summary>
    public required int[] Starts { get; init; }

    /// <summary>The same pixels under the intergalactic medium; made when first asked for, as most objects are near.</summary>
    public ForestPixels Forest => field ??= new(this);

    /// <summary>What the Earth's atmosphere may take away.</summary>
    public AirColumns Air => field ??= new(this);

    /// <summary>Lays out the pixels of an observation.</summary>
    /// <param name="spectra">The spectra, perhaps binned.</param>
    /// <param name="modelError">How wrong models are, in a bin of <paramref name="errorWidth"/>.</param>
    /// <param name="errorWidth">Width in ln λ over which model errors are independent.</param>
    public static FitPixels Build(IReadOnlyList<PixelRun> spectra, ModelError modelError, double errorWidth)
    {
        var splines = spectra.Select(s => new CubicBSpline(s.LnWavelength[0], s.LnWavelength[^1], SmoothFit.KnotSpacing)).ToArray();
        var starts = new int[spectra.Count + 1];
        for (var s = 0; s < spectra.Count; s++) starts[s + 1] = starts[s] + spectra[s].Flux.Length;
        var pixels = new FitPixels(starts[^1], splines.Sum(s => s.Count)) { Starts = starts };
        var coefficient = 0;
        for (var s = 0; s < spectra.Count; s++)
        {
            pixels.Fill(spectra[s], splines[s], starts[s], coefficient, modelError, errorWidth);
            coefficient += splines[s].Count;
        }

        return pixels;
    }

    private void Fill(PixelRun run, CubicBSpline spline, int at, int coefficient, ModelError modelError, double errorWidth)
    {
        for (var i = 0; i < run.Flux.Length; i++)
        {
            var p = at + i;
            LnWavelength[p] = run.LnWavelength[i];
            Flux[p] = run.Flux[i];
            var level = Math.Max(Math.Abs(run.Continuum[i]), run.Baseline[i]);
            var modelVariance = modelError.Variance(run.LnWavelength[i], level, run.Flux[i] - run.Continuum[i], errorWidth / run.Width[i]);
            Weight[p] = run.Weight[i] <= 0 ? 0 : (float)(1 / (1 / run.Weight[i] + modelVariance));
            SigmaLn[p] = run.SigmaLn[i];
            var place = (run.LnWavelength[i] - TemplateGrid.LnStart) / TemplateGrid.Step;
            TemplateIndex[p] = (int)Math.Floor(place);
            TemplateFraction[p] = (float)(place - TemplateIndex[p]);
            Continuum[p] = Math.Max(run.Continuum[i], 0.5f * run.Baseline[i]);
        }

        Basis.Add(spline, run.LnWavelength, run.Baseline, at, coefficient);
        AddLevels(at, at + run.Flux.Length);
    }

    private void AddLevels(int start, int end)
    {
        var level = LineSpreadLevels.Nearest(SigmaLn[start]);
        for (var p = start + 1; p <= end; p++)
        {
            var next = p == end ? -1 : SigmaLn[p] == SigmaLn[p - 1] ? level : LineSpreadLevels.Nearest(SigmaLn[p]);
            if (next == level) continue;
            Levels.Add((start, p, level));
            (start, level) = (p, next);
        }
    }

    /// <summary>The first pixel of a spectrum at or above a wavelength.</summary>
    public int Find(int spectrum, double lnWavelength)
    {
        int from = Starts[spectrum], to = Starts[spectrum + 1];
        // Pixels are nearly even in ln λ: a step of a line through the ends is a good guess, and a walk in doubling steps brackets the rest.
        double first = LnWavelength[from], last = LnWavelength[to - 1];
        if (lnWavelength <= first) return from;
        if (lnWavelength > last) return to;
        var guess = from + (int)((to - 1 - from) * ((lnWavelength - first) / (last - first)));
        int low = guess, high = guess, step = 1;
        while (low > from && LnWavelength[low] >= lnWavelength) (low, step) = (Math.Max(from, low - step), 2 * step);
        step = 1;
        while (high < to - 1 && LnWavelength[high] < lnWavelength) (high, step) = (Math.Min(to - 1, high + step), 2 * step);
        // Below is less than the value, high is not.
        while (high - low > 1)
        {
            var middle = (low + high) / 2;
            if (LnWavelength[middle] < lnWavelength) low = middle;
            else high = middle;
        }

        return high;
    }
}
