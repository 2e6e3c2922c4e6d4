namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>Intermediate coordinate of a pixel: reference pixel, value there, increment.</summary>
/// <param name="ReferencePixel">CRPIX.</param>
/// <param name="ReferenceValue">CRVAL.</param>
/// <param name="Increment">CD or PC·CDELT or CDELT.</param>
internal readonly record struct LinearPixels(double ReferencePixel, double ReferenceValue, double Increment)
{
    /// <summary>Offset from the reference value.</summary>
    public double Offset(double pixel) => Increment * (pixel - ReferencePixel);

    /// <summary>Linear coordinate of a pixel.</summary>
    public double At(double pixel) => ReferenceValue + Offset(pixel);
}
