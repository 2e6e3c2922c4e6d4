using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Normalize;

/// <summary>
/// Smooth splines at pixels, one after the other, with their prior. Arrays of pixels are a vector longer than there are pixels, so that
/// sums may read, and mask, beyond the last one.
/// </summary>
internal sealed class SplineBasis
{
    private readonly int[] _intervalOfCoefficient;

    /// <summary>Makes room.</summary>
    /// <param name="pixels">Number of pixels.</param>
    /// <param name="coefficients">Number of coefficients of all splines.</param>
    public SplineBasis(int pixels, int coefficients)
    {
        var padded = pixels + Kernels.Lanes;
        Values = [new float[padded], new float[padded], new float[padded], new float[padded]];
        First = new int[pixels];
        PriorMatrix = new double[coefficients * (BandedCholesky.Band + 1)];
        _intervalOfCoefficient = new int[coefficients];
    }

    /// <summary>The four basis values at each pixel, times the baseline.</summary>
    public float[][] Values { get; }

    /// <summary>First coefficient that the four values of a pixel belong to.</summary>
    public int[] First { get; }

    /// <summary>Stretches of pixels that share their four coefficients, and the first of these.</summary>
    public List<(int Start, int End, int First)> Intervals { get; } = [];

    /// <summary>Smoothness prior of all splines.</summary>
    public double[] PriorMatrix { get; }

    public int Coefficients => _intervalOfCoefficient.Length;

    /// <summary>Index in <see cref="Intervals"/> of the stretch that a pixel lies in.</summary>
    public int IntervalOf(int pixel) => _intervalOfCoefficient[First[pixel]];

    /// <summary>Adds a spline.</summary>
    /// <param name="spline">The spline.</param>
    /// <param name="lnWavelength">ln λ of its pixels, increasing.</param>
    /// <param name="baseline">What the spline is multiplied by at each pixel.</param>
    /// <param name="at">Index of its first pixel.</param>
    /// <param name="coefficient">Index of its first coefficient.</param>
    public void Add(CubicBSpline spline, ReadOnlySpan<double> lnWavelength, ReadOnlySpan<float> baseline, int at, int coefficient)
    {
        Span<float> four = stackalloc float[4];
        for (var i = 0; i < lnWavelength.Length; i++)
        {
            First[at + i] = coefficient + spline.Evaluate(lnWavelength[i], four);
            for (var j = 0; j < 4; j++) Values[j][at + i] = four[j] * baseline[i];
        }

        AddIntervals(at, at + lnWavelength.Length);
        SmoothFit.AddPrior(PriorMatrix, coefficient, spline.Count);
    }

    private void AddIntervals(int start, int end)
    {
        for (var p = start + 1; p <= end; p++)
        {
            if (p < end && First[p] == First[start]) continue;
            _intervalOfCoefficient[First[start]] = Intervals.Count;
            Intervals.Add((start, p, First[start]));
            start = p;
        }
    }
}
