namespace Redshift.Physics.Profiles;

/// <summary>The Gaussian profile of unit area. All lengths in one unit of the caller's choice.</summary>
public static class Gaussian
{
    /// <summary>Area over the product of depth and full width at half maximum: sqrt(pi / (4 ln 2)).</summary>
    public const double AreaPerDepthAndFwhm = 1.0644670194312262;

    private static readonly double InverseRootTwoPi = 1 / Math.Sqrt(2 * Math.PI);

    /// <summary>The profile at a point.</summary>
    /// <param name="offset">Distance from the centre.</param>
    /// <param name="sigma">Standard deviation, positive.</param>
    /// <returns>Density per unit length.</returns>
    public static double Value(double offset, double sigma)
    {
        double t = offset / sigma;
        return InverseRootTwoPi / sigma * Math.Exp(-0.5 * t * t);
    }

    /// <summary>The part of the profile's area that falls on an interval, such as a pixel.</summary>
    /// <param name="left">Left edge as a distance from the centre.</param>
    /// <param name="right">Right edge as a distance from the centre.</param>
    /// <param name="sigma">Standard deviation, positive.</param>
    /// <returns>Between 0 and 1; negative if the edges are in the wrong order.</returns>
    public static double Area(double left, double right, double sigma)
    {
        double scale = 1 / (Math.Sqrt(2) * sigma);
        // Far from the centre the difference of two values near 1 would be rounding only.
        return left > 0
            ? 0.5 * (ErrorFunction.Erfc(left * scale) - ErrorFunction.Erfc(right * scale))
            : 0.5 * (ErrorFunction.Erf(right * scale) - ErrorFunction.Erf(left * scale));
    }

    /// <summary>The mean of the profile over each pixel, which is what a detector records.</summary>
    /// <param name="edges">Pixel edges, ascending, one more than there are pixels.</param>
    /// <param name="centre">Centre of the profile, in the unit of the edges.</param>
    /// <param name="sigma">Standard deviation, positive.</param>
    /// <param name="pixels">Receives the mean density per pixel.</param>
    /// <exception cref="ArgumentException">The number of edges is not one more than that of pixels.</exception>
    public static void PixelMeans(ReadOnlySpan<double> edges, double centre, double sigma, Span<double> pixels)
    {
        if (edges.Length != pixels.Length + 1)
            throw new ArgumentException($"{pixels.Length} pixels have {pixels.Length + 1} edges, not {edges.Length}.", nameof(edges));
        if (pixels.IsEmpty)
            return;
        double scale = 1 / (Math.Sqrt(2) * sigma);
        double left = ErrorFunction.Erf((edges[0] - centre) * scale);
        for (int i = 0; i < pixels.Length; i++)
        {
            double right = ErrorFunction.Erf((edges[i + 1] - centre) * scale);
            pixels[i] = 0.5 * (right - left) / (edges[i + 1] - edges[i]);
            left = right;
        }
    }
}
