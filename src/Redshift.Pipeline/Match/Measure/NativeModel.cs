using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Normalize;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>The answer and the smooth spectrum it competes with, both fitted at the native pixels of all spectra.</summary>
internal sealed class NativeModel
{
    private NativeModel(FitPixels pixels, float[] smooth, float[] model) => (Pixels, Smooth, Model) = (pixels, smooth, model);

    public FitPixels Pixels { get; }

    /// <summary>Best smooth spectrum without any line.</summary>
    public float[] Smooth { get; }

    /// <summary>Best model of the answer.</summary>
    public float[] Model { get; }

    /// <summary>Fits both.</summary>
    public static NativeModel Fit(NormalizedObservation observation, Refined answer, ModelError error)
    {
        var pixels = FitPixels.Build([.. observation.Spectra.Select(PixelRun.Native)], error, Cells.Step);
        var fit = new ModelFit(pixels);
        var smooth = fit.Curves().Model;
        fit.Fit(answer.Model, answer.LnShift);
        return new(pixels, smooth, fit.Curves().Model);
    }

    /// <summary>The model at the pixels of one spectrum.</summary>
    public ReadOnlySpan<float> ModelOf(int spectrum) => Model.AsSpan(Pixels.Starts[spectrum]..Pixels.Starts[spectrum + 1]);

    /// <summary>The smooth spectrum at the pixels of one spectrum.</summary>
    public ReadOnlySpan<float> SmoothOf(int spectrum) => Smooth.AsSpan(Pixels.Starts[spectrum]..Pixels.Starts[spectrum + 1]);

    /// <summary>What each pixel adds to the ln likelihood of the answer over the smooth spectrum.</summary>
    public double[] PixelGains()
    {
        var gains = new double[Pixels.Count];
        for (var p = 0; p < gains.Length; p++)
        {
            double without = Pixels.Flux[p] - Smooth[p], with = Pixels.Flux[p] - Model[p];
            gains[p] = 0.5 * Pixels.Weight[p] * (without * without - with * with);
        }

        return gains;
    }
}
