using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>
/// The pixels on which models are compared, all spectra of the observation one after the other, each with its own smooth nuisance.
/// All kinds are fitted to the same pixels with the same nuisance, so that their evidences can be compared.
/// </summary>
internal sealed class FitPixels
{
    /// <summary>Emission lines are no Gaussians: their model is wrong by this share of what stands above the continuum.</summary>
    private const double LineError = 0.08;

    private FitPixels(int count, int coefficients)
    {
        LnWavelength = new double[count];
        Flux = new float[count];
        Weight = new float[count];
        SigmaLn = new float[count];
        Continuum = new float[count];
        Level = new byte[count];
        SplineFirst = new int[count];
        Spline = new float[4][];
        for (var j = 0; j < 4; j++) Spline[j] = new float[count];
        SplinePairs = new float[10][];
        for (var j = 0; j < 10; j++) SplinePairs[j] = new float[count];
        PriorMatrix = new double[coefficients * (BandedCholesky.Band + 1)];
    }

    public int Count => Flux.Length;

    public double[] LnWavelength { get; }

    public float[] Flux { get; }

    /// <summary>Inverse variance with the model error.</summary>
    public float[] Weight { get; }

    public float[] SigmaLn { get; }

    /// <summary>Smooth continuum, floored at a share of the noise so that priors on line strengths stay proper.</summary>
    public float[] Continuum { get; }

    /// <summary>Level of <see cref="LineSpreadLevels"/>.</summary>
    public byte[] Level { get; }

    /// <summary>First spline coefficient of a pixel.</summary>
    public int[] SplineFirst { get; }

    /// <summary>The four basis values at each pixel, times the baseline.</summary>
    public float[][] Spline { get; }

    /// <summary>Products of the basis values, (j, k) with k ≤ j at j(j+1)/2 + k.</summary>
    public float[][] SplinePairs { get; }

    /// <summary>Stretches of pixels that share their four coefficients.</summary>
    public List<(int Start, int End)> Intervals { get; } = [];

    /// <summary>Smoothness prior of all splines.</summary>
    public double[] PriorMatrix { get; }

    public int Coefficients => PriorMatrix.Length / (BandedCholesky.Band + 1);

    /// <summary>Index of the first pixel of each spectrum, and the end.</summary>
    public required int[] Starts { get; init; }

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
        Span<float> four = stackalloc float[4];
        for (var i = 0; i < run.Flux.Length; i++)
        {
            var p = at + i;
            LnWavelength[p] = run.LnWavelength[i];
            Flux[p] = run.Flux[i];
            var share = modelError.Share(run.LnWavelength[i]) * Math.Max(Math.Abs(run.Continuum[i]), run.Baseline[i]);
            var excess = LineError * Math.Max(0, run.Flux[i] - run.Continuum[i]);
            var modelVariance = (share * share + excess * excess) * Math.Max(1, errorWidth / run.Width[i]);
            Weight[p] = run.Weight[i] <= 0 ? 0 : (float)(1 / (1 / run.Weight[i] + modelVariance));
            SigmaLn[p] = run.SigmaLn[i];
            Level[p] = (byte)LineSpreadLevels.Nearest(run.SigmaLn[i]);
            Continuum[p] = Math.Max(run.Continuum[i], 0.5f * run.Baseline[i]);
            SplineFirst[p] = coefficient + spline.Evaluate(run.LnWavelength[i], four);
            for (var j = 0; j < 4; j++) Spline[j][p] = four[j] * run.Baseline[i];
            for (var j = 0; j < 4; j++)
                for (var k = 0; k <= j; k++) SplinePairs[j * (j + 1) / 2 + k][p] = Spline[j][p] * Spline[k][p];
        }

        AddIntervals(at, at + run.Flux.Length);

        SmoothFit.AddPrior(PriorMatrix, coefficient, spline.Count);
    }

    private void AddIntervals(int start, int end)
    {
        for (var p = start + 1; p <= end; p++)
        {
            if (p < end && SplineFirst[p] == SplineFirst[start]) continue;
            Intervals.Add((start, p));
            start = p;
        }
    }
}
