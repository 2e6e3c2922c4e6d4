namespace Redshift.Pipeline.Match.Measure;

/// <summary>A stretch of spectrum in which a line speaks.</summary>
/// <param name="Centre">ln λ of its centre.</param>
/// <param name="Sigma">σ of the line in ln λ.</param>
/// <param name="Depth">Height of the line, any sign: what overlapping lines share a pixel by.</param>
internal readonly record struct LineWindow(double Centre, double Sigma, double Depth);

/// <summary>
/// Divides the gain in ln likelihood of the answer over the smooth spectrum, a sum over pixels, among lines. What falls into no line's window
/// are other features: the continuum's breaks, unlisted lines. Nothing is lost: the parts add up to the whole.
/// </summary>
internal static class Reasons
{
    /// <summary>Half width of a window in σ of its line.</summary>
    private const double HalfWidth = 3;

    /// <summary>Divides the gains.</summary>
    /// <param name="lnWavelength">ln λ of the pixels.</param>
    /// <param name="gains">Gain of each pixel.</param>
    /// <param name="windows">The lines' windows.</param>
    /// <returns>The share of each window, and of the pixels in none.</returns>
    public static (double[] Lines, double Other) Divide(ReadOnlySpan<double> lnWavelength, ReadOnlySpan<double> gains, IReadOnlyList<LineWindow> windows)
    {
        var lines = new double[windows.Count];
        Span<double> parts = windows.Count <= 512 ? stackalloc double[windows.Count] : new double[windows.Count];
        double other = 0;
        for (var p = 0; p < gains.Length; p++)
        {
            var total = Parts(lnWavelength[p], windows, parts);
            if (total <= 0) other += gains[p];
            else
                for (var i = 0; i < parts.Length; i++) lines[i] += gains[p] * parts[i] / total;
        }

        return (lines, other);
    }

    private static double Parts(double lnWavelength, IReadOnlyList<LineWindow> windows, Span<double> parts)
    {
        double total = 0;
        for (var i = 0; i < parts.Length; i++)
        {
            var t = (lnWavelength - windows[i].Centre) / windows[i].Sigma;
            parts[i] = Math.Abs(t) > HalfWidth ? 0 : Math.Abs(windows[i].Depth) * Math.Exp(-0.5 * t * t);
            total += parts[i];
        }

        return total;
    }
}
