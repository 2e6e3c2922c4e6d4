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
        var continuum = baseline.ToArray();
        for (var iteration = 0; iteration < Iterations; iteration++)
        {
            var robust = RobustWeights(flux, weight, baseline, continuum, scatter, iteration == 0 ? 10 : 3);
            continuum = Solve(spline, lnWavelength, flux, robust, baseline);
        }

        return continuum;
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

    private static float[] Solve(
        CubicBSpline spline, ReadOnlySpan<double> lnWavelength, ReadOnlySpan<float> flux, float[] weight, ReadOnlySpan<float> baseline)
    {
        var matrix = new double[spline.Count * (BandedCholesky.Band + 1)];
        var right = new double[spline.Count];
        Span<float> four = stackalloc float[4];
        for (var i = 0; i < flux.Length; i++)
        {
            if (weight[i] <= 0) continue;
            var first = spline.Evaluate(lnWavelength[i], four);
            for (var j = 0; j < 4; j++)
            {
                var wb = (double)weight[i] * four[j] * baseline[i];
                right[first + j] += wb * flux[i];
                for (var k = 0; k <= j; k++) matrix[(first + j) * (BandedCholesky.Band + 1) + (j - k)] += wb * four[k] * baseline[i];
            }
        }

        AddPrior(matrix, 0, spline.Count);
        var cholesky = new BandedCholesky();
        cholesky.Factor(matrix, spline.Count);
        cholesky.Forward(right);
        cholesky.Backward(right);
        var fit = new float[flux.Length];
        for (var i = 0; i < fit.Length; i++)
        {
            var first = spline.Evaluate(lnWavelength[i], four);
            var sum = four[0] * right[first] + four[1] * right[first + 1] + four[2] * right[first + 2] + four[3] * right[first + 3];
            fit[i] = (float)(sum * baseline[i]);
        }

        return fit;
    }

    /// <summary>Cauchy weights 1/(1+(r/kσ)²): lines and cosmic rays fade out, noise keeps its weight.</summary>
    private static float[] RobustWeights(
        ReadOnlySpan<float> flux, ReadOnlySpan<float> weight, ReadOnlySpan<float> baseline, float[] continuum, double scatter, double k)
    {
        var robust = new float[flux.Length];
        for (var i = 0; i < robust.Length; i++)
        {
            if (weight[i] <= 0) continue;
            double level = scatter * Math.Max(Math.Abs(continuum[i]), baseline[i]), off = flux[i] - continuum[i];
            var variance = 1 / weight[i] + level * level;
            robust[i] = (float)(1 / variance / (1 + off * off / (variance * k * k)));
        }

        return robust;
    }
}
