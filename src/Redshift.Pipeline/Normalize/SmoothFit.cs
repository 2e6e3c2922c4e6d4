using System.Runtime.Intrinsics;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Normalize;

/// <summary>
/// The smooth part of a spectrum: a rough baseline times cubic B-splines with evenly spaced knots in ln λ and a Gaussian prior on the
/// second differences of their coefficients (third ones where the range is short) (Eilers &amp; Marx 1996, Statist. Sci. 11, 89). With the baseline taken out the coefficients
/// are all of order one, whatever range of flux the spectrum spans. The same prior serves as nuisance in every model of the match stage.
/// </summary>
internal static class SmoothFit
{
    /// <summary>Knot spacing in ln λ: 12,000 km/s, wide enough to leave broad quasar lines alone.</summary>
    public const double KnotSpacing = 0.04;

    /// <summary>Prior σ of a second difference of neighbouring coefficients.</summary>
    public const double Flexibility = 0.05;

    /// <summary>Splines with no more coefficients (echelle orders, short ranges) may follow a parabola freely, as the blaze of a grating does.</summary>
    private const int ShortSpline = 6;

    private const int Iterations = 5;

    /// <summary>Fits the continuum robustly: pixels far off (lines, cosmic rays) lose weight smoothly.</summary>
    /// <param name="lnWavelength">ln λ of the pixels, increasing.</param>
    /// <param name="flux">Flux.</param>
    /// <param name="weight">Inverse variance, 0 unusable.</param>
    /// <param name="baseline">Rough positive level, see <see cref="Baseline"/>.</param>
    /// <param name="scatter">Share of the continuum that a line-blanketed spectrum scatters by and that is no outlier.</param>
    /// <returns>The continuum at the pixels.</returns>
    public static float[] Continuum(
        ReadOnlySpan<double> lnWavelength, ReadOnlySpan<float> flux, ReadOnlySpan<float> weight, ReadOnlySpan<float> baseline, double scatter)
    {
        var spline = new CubicBSpline(lnWavelength[0], lnWavelength[^1], KnotSpacing);
        var basis = new SplineBasis(flux.Length, spline.Count);
        basis.Add(spline, lnWavelength, baseline, 0, 0);
        float[] data = Padded(flux), level = Padded(baseline), weights = Padded(weight), continuum = Padded(baseline);
        float[] robust = new float[data.Length], ones = new float[data.Length];
        Array.Fill(ones, 1f);
        var fit = new SplineFit(basis, data);
        for (var iteration = 0; iteration < Iterations; iteration++)
        {
            SetRobust(robust, data, weights, level, continuum, (float)scatter, iteration == 0 ? 10 : 3);
            fit.Solve(robust, ones);
            fit.Smooth(fit.Right, continuum);
        }

        return continuum[..flux.Length];
    }

    private static float[] Padded(ReadOnlySpan<float> values)
    {
        var padded = new float[values.Length + Kernels.Lanes];
        values.CopyTo(padded);
        return padded;
    }

    /// <summary>Adds the smoothness prior of one spline to normal equations.</summary>
    /// <param name="matrix">size × 4 band matrix of <see cref="BandedCholesky"/>.</param>
    /// <param name="offset">First coefficient of the spline.</param>
    /// <param name="count">Number of its coefficients.</param>
    public static void AddPrior(Span<double> matrix, int offset, int count)
    {
        ReadOnlySpan<double> difference = count <= ShortSpline ? [-1, 3, -3, 1] : [1, -2, 1];
        for (var first = offset; first + difference.Length <= offset + count; first++) AddDifference(matrix, first, difference);

        // A very wide prior on the values themselves keeps the matrix definite where there are no data.
        for (var i = 0; i < count; i++) matrix[(offset + i) * (BandedCholesky.Band + 1)] += 1e-4;
    }

    private static void AddDifference(Span<double> matrix, int first, ReadOnlySpan<double> difference)
    {
        const double Strength = 1 / (Flexibility * Flexibility);
        for (var i = 0; i < difference.Length; i++)
            for (var j = 0; j <= i; j++)
                matrix[(first + i) * (BandedCholesky.Band + 1) + (i - j)] += Strength * difference[i] * difference[j];
    }

    /// <summary>Cauchy weights 1/(1+(r/kσ)²): lines and cosmic rays fade out, noise keeps its weight.</summary>
    private static void SetRobust(float[] robust, float[] flux, float[] weight, float[] baseline, float[] continuum, float scatter, float k)
    {
        for (var i = 0; i <= robust.Length - Kernels.Lanes; i += Kernels.Lanes)
        {
            Vector256<float> smooth = Vector256.Create(continuum, i), off = (Vector256.Create(flux, i) - smooth) * (1 / k);
            var level = scatter * Vector256.Max(Vector256.Abs(smooth), Vector256.Create(baseline, i));
            // A pixel without weight has an infinite variance, and so no weight here.
            var variance = Vector256<float>.One / Vector256.Create(weight, i) + level * level;
            (Vector256<float>.One / (variance + off * off)).CopyTo(robust, i);
        }
    }
}
