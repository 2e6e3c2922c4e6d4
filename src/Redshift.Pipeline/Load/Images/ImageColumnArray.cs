using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;

namespace Redshift.Pipeline.Load.Images;

/// <summary>A column of an image that stores a table sideways: a few columns, as many rows as pixels.</summary>
internal sealed class ImageColumnArray(ImageHdu hdu, int column) : NumberArray
{
    /// <inheritdoc/>
    public override int Length => (int)hdu.Shape[1];

    /// <inheritdoc/>
    public override int Rows => 1;

    /// <inheritdoc/>
    public override double[] Read(int row)
    {
        var width = (int)hdu.Shape[0];
        var all = hdu.ReadDoubles(0, checked(width * Length));
        var values = new double[Length];
        for (var i = 0; i < values.Length; i++) values[i] = all[i * width + column];
        return values;
    }
}
