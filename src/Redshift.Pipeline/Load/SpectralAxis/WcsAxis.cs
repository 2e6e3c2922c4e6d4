using Redshift.Physics.Air;
using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>
/// A spectral axis of the FITS Standard 4.0, section 8.4: sampled linearly or logarithmically in the variable itself, or linearly
/// in another one (algorithm code X2P).
/// </summary>
/// <remarks>Greisen et al. 2006, A&amp;A 446, 747, sections 3.3 and 3.4. Wavelengths are in air for AWAV and in vacuum otherwise.</remarks>
internal sealed class WcsAxis : PixelAxis
{
    private readonly LinearPixels _pixels;
    private readonly SpectralVariable _variable;
    private readonly SpectralScale _scale;
    private readonly SpectralScale _sampled;
    private readonly double _sampledReference;
    private readonly double _sampledPerUnit;
    private readonly bool _logarithmic;

    /// <summary>Prepares the axis.</summary>
    /// <param name="variable">The variable that CRVAL and the increment state.</param>
    /// <param name="sampled">The variable in which pixels are equidistant.</param>
    /// <param name="logarithmic">Whether they are equidistant in the variable's logarithm (code LOG).</param>
    /// <param name="pixels">In the units of <see cref="SpectralQuantity"/>.</param>
    /// <param name="restAngstrom">Rest wavelength in vacuum, where velocities need it.</param>
    public WcsAxis(SpectralVariable variable, SpectralVariable sampled, bool logarithmic, LinearPixels pixels, double restAngstrom)
    {
        _pixels = pixels;
        _variable = variable;
        _logarithmic = logarithmic;
        _scale = new(variable, restAngstrom);
        _sampled = new(sampled, restAngstrom);
        var reference = _scale.ToVacuum(pixels.ReferenceValue);
        _sampledReference = _sampled.FromVacuum(reference);
        _sampledPerUnit = _sampled.Slope(reference) / _scale.Slope(reference);
        IsLinear = variable == sampled;
    }

    /// <inheritdoc/>
    public override WavelengthMedium? Medium => _variable == SpectralVariable.Awav ? WavelengthMedium.Air : WavelengthMedium.Vacuum;

    private bool IsLinear { get; }

    /// <inheritdoc/>
    public override double At(double pixel)
    {
        if (!IsLinear) return InOwnMedium(_sampled.ToVacuum(_sampledReference + _sampledPerUnit * _pixels.Offset(pixel)));
        var value = _logarithmic
            ? _pixels.ReferenceValue * Math.Exp(_pixels.Offset(pixel) / _pixels.ReferenceValue)
            : _pixels.At(pixel);
        return _variable == SpectralVariable.Awav ? value : _scale.ToVacuum(value);
    }

    private double InOwnMedium(double vacuum) => _variable == SpectralVariable.Awav ? AirRefraction.ToAir(vacuum) : vacuum;
}
