namespace Redshift.Physics.Indices;

/// <summary>
/// A spectrum as pixels that touch: each holds its flux between the middles to its neighbours. Bands are summed with
/// the exact fractions of the pixels at their ends.
/// </summary>
internal readonly ref struct SampledSpectrum(ReadOnlySpan<double> wavelengths, ReadOnlySpan<double> flux)
{
    private readonly ReadOnlySpan<double> _wavelengths = wavelengths;
    private readonly ReadOnlySpan<double> _flux = flux;

    public bool Covers(WavelengthBand band)
        => _wavelengths.Length > 1 && LeftEdge(0) <= band.Start && band.End <= LeftEdge(_wavelengths.Length);

    /// <summary>The mean over the band of a function of wavelength and flux.</summary>
    public double Mean(WavelengthBand band, Func<double, double, double> function)
    {
        double sum = 0;
        for (int i = FirstPixel(band.Start); i < _wavelengths.Length && LeftEdge(i) < band.End; i++)
        {
            double left = Math.Max(LeftEdge(i), band.Start);
            double right = Math.Min(LeftEdge(i + 1), band.End);
            sum += (right - left) * function((left + right) / 2, _flux[i]);
        }

        return sum / band.Width;
    }

    private int FirstPixel(double wavelength)
    {
        int found = _wavelengths.BinarySearch(wavelength);
        int next = found < 0 ? ~found : found;
        return Math.Max(0, next > 0 && wavelength < LeftEdge(next) ? next - 1 : next);
    }

    private double LeftEdge(int pixel)
    {
        int last = _wavelengths.Length - 1;
        if (pixel == 0)
            return 1.5 * _wavelengths[0] - 0.5 * _wavelengths[1];
        if (pixel > last)
            return 1.5 * _wavelengths[last] - 0.5 * _wavelengths[last - 1];
        return (_wavelengths[pixel - 1] + _wavelengths[pixel]) / 2;
    }
}
