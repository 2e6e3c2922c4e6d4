using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;

namespace Redshift.Pipeline.Load.Images;

/// <summary>Consecutive elements of an image, read row by row: the stack itself is never held.</summary>
/// <param name="hdu">The image.</param>
/// <param name="length">Elements of one spectrum.</param>
/// <param name="rows">Number of spectra.</param>
/// <param name="first">0-based element where the first begins.</param>
/// <param name="stride">Elements from one spectrum to the next.</param>
internal sealed class ImageArray(ImageHdu hdu, int length, int rows = 1, long first = 0, long stride = 0) : NumberArray
{
    /// <inheritdoc/>
    public override int Length => length;

    /// <inheritdoc/>
    public override int Rows => rows;

    /// <inheritdoc/>
    public override double[] Read(int row) => hdu.ReadDoubles(first + (rows == 1 ? 0 : row * stride), length);
}
