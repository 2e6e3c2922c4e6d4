using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>A spectral axis looked up in a coordinate array (algorithm code TAB).</summary>
/// <remarks>
/// Greisen et al. 2006, A&amp;A 446, 747, section 6: the intermediate coordinate is looked up in the index vector, or is the 1-based
/// place itself where there is none; coordinates are interpolated linearly and continued for half a cell beyond the ends.
/// </remarks>
internal sealed class TableAxis(LinearPixels pixels, double[] angstrom, double[]? index, WavelengthMedium? medium) : PixelAxis
{
    /// <inheritdoc/>
    public override WavelengthMedium? Medium => medium;

    /// <inheritdoc/>
    public override double At(double pixel)
    {
        var place = index is null ? pixels.At(pixel) : PlaceInIndex(index, pixels.At(pixel));
        if (!(place >= 0.5 && place <= angstrom.Length + 0.5)) return double.NaN;
        if (angstrom.Length == 1) return angstrom[0];
        var left = Math.Clamp((int)Math.Floor(place), 1, angstrom.Length - 1);
        var fraction = place - left;
        return angstrom[left - 1] + fraction * (angstrom[left] - angstrom[left - 1]);
    }

    private static double PlaceInIndex(double[] index, double value)
    {
        if (index.Length == 1) return 1;
        var rising = index[^1] > index[0];
        var left = 0;
        while (left < index.Length - 2 && (rising ? index[left + 1] < value : index[left + 1] > value)) left++;
        var width = index[left + 1] - index[left];
        return left + 1 + (width == 0 ? 0 : (value - index[left]) / width);
    }
}
