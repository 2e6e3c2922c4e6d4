namespace Redshift.Pipeline.Load.Layouts;

/// <summary>A band matrix that turns the spectrum before the instrument into the one behind it, stored by diagonals.</summary>
internal static class ResolutionMatrix
{
    // For a Gaussian, FWHM = area/peak · 2·sqrt(ln 2/π); unlike the second moment it forgives noise in the wings.
    private static readonly double FwhmPerEquivalentWidth = 2 * Math.Sqrt(Math.Log(2) / Math.PI);

    // The matrix contains the pixel itself, a box of variance 1/12, which the models add on their own.
    private static readonly double PixelFwhmSquare = 8 * Math.Log(2) / 12;

    /// <summary>FWHM in pixels of each pixel's response, without the width of the pixel.</summary>
    /// <param name="diagonals">All diagonals, each of the spectrum's length, one behind the other.</param>
    /// <param name="count">Pixels of the spectrum.</param>
    public static double[] FwhmPixels(double[] diagonals, int count)
    {
        var fwhm = new double[count];
        for (var pixel = 0; pixel < count; pixel++)
        {
            double sum = 0, peak = 0;
            for (var at = pixel; at < diagonals.Length; at += count)
            {
                sum += diagonals[at];
                peak = Math.Max(peak, diagonals[at]);
            }
            fwhm[pixel] = WithoutPixel(FwhmPerEquivalentWidth * sum / peak);
        }
        return fwhm;
    }

    private static double WithoutPixel(double fwhm) => Math.Sqrt(fwhm * fwhm - PixelFwhmSquare);
}
