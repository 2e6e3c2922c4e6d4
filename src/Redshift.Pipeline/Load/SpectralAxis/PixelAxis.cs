using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>Wavelengths computed from a header, for the pixels of an image or of a vector.</summary>
internal abstract class PixelAxis
{
    /// <summary>The medium of the wavelengths where the axis itself says so.</summary>
    public virtual WavelengthMedium? Medium => null;

    /// <summary>How the axis was read, for the notes.</summary>
    public required string Why { get; init; }

    /// <summary>The unit in which a pipeline file would state it; null where the header's description leaves no choice.</summary>
    public virtual string? Unit => null;

    /// <summary>Wavelength in Å at a pixel; the first pixel is 1.</summary>
    public abstract double At(double pixel);

    /// <summary>Wavelengths in Å of the first pixels.</summary>
    public double[] Wavelengths(int count)
    {
        var wavelengths = new double[count];
        for (var i = 0; i < count; i++) wavelengths[i] = At(i + 1);
        return wavelengths;
    }
}
