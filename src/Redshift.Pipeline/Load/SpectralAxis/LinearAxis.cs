using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>Pixels equidistant in some unit, or in its logarithm, without the algorithm codes of the standard.</summary>
internal sealed class LinearAxis(LinearPixels pixels, SpectralUnit unit, WavelengthMedium? medium) : PixelAxis
{
    /// <inheritdoc/>
    public override WavelengthMedium? Medium => medium;

    /// <inheritdoc/>
    public override string Unit => unit.ToString();

    /// <inheritdoc/>
    public override double At(double pixel) => unit.ToAngstrom(pixels.At(pixel));
}
