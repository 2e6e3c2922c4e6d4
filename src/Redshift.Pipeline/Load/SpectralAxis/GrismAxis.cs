using Redshift.Physics.Air;
using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>A grism, prism or grating in front of a flat detector (algorithm codes GRI and GRA).</summary>
/// <remarks>Greisen et al. 2006, A&amp;A 446, 747, section 5. The parameters are PVi_0 to PVi_6; wavelengths in metres, angles in degrees.</remarks>
internal sealed class GrismAxis : PixelAxis
{
    private const double MetresPerAngstrom = 1e-10;

    private readonly LinearPixels _pixels;
    private readonly SpectralVariable _variable;
    private readonly bool _inAir;
    private readonly double _referenceExit;
    private readonly double _theta;
    private readonly double _tangentPerUnit;
    private readonly double _prism;
    private readonly double _dispersion;

    /// <summary>Prepares the axis.</summary>
    /// <param name="variable">The variable that CRVAL and the increment state.</param>
    /// <param name="inAir">Whether the equation of the grism holds for air (GRA) or for vacuum (GRI).</param>
    /// <param name="pixels">In the units of <see cref="SpectralQuantity"/>.</param>
    /// <param name="restAngstrom">Rest wavelength in vacuum, where velocities need it.</param>
    /// <param name="parameters">G (1/m), m, α, n, n′ (1/m), ε, θ.</param>
    public GrismAxis(SpectralVariable variable, bool inAir, LinearPixels pixels, double restAngstrom, IReadOnlyList<double> parameters)
    {
        _pixels = pixels;
        _variable = variable;
        _inAir = inAir;
        var scale = new SpectralScale(variable, restAngstrom);
        var grism = new SpectralScale(inAir ? SpectralVariable.Awav : SpectralVariable.Wave, restAngstrom);
        var vacuum = scale.ToVacuum(pixels.ReferenceValue);
        var sinAlpha = SinDegrees(parameters[2]);
        var reference = grism.FromVacuum(vacuum) * MetresPerAngstrom;
        var order = parameters[0] * parameters[1] / Math.Cos(Radians(parameters[5]));
        _referenceExit = Math.Asin(order * reference - parameters[3] * sinAlpha);
        _theta = Radians(parameters[6]);
        _dispersion = order - parameters[4] * sinAlpha;
        _prism = (parameters[3] - parameters[4] * reference) * sinAlpha;
        var cosTheta = Math.Cos(_theta);
        _tangentPerUnit = MetresPerAngstrom * grism.Slope(vacuum) / scale.Slope(vacuum) * _dispersion / (Math.Cos(_referenceExit) * cosTheta * cosTheta);
    }

    /// <inheritdoc/>
    public override WavelengthMedium? Medium => _variable == SpectralVariable.Awav ? WavelengthMedium.Air : WavelengthMedium.Vacuum;

    /// <inheritdoc/>
    public override double At(double pixel)
    {
        var tangent = -Math.Tan(_theta) + _tangentPerUnit * _pixels.Offset(pixel);
        var exit = Math.Atan(tangent) + _referenceExit + _theta;
        return InOwnMedium((Math.Sin(exit) + _prism) / _dispersion / MetresPerAngstrom);
    }

    private double InOwnMedium(double angstrom)
    {
        var wantsAir = _variable == SpectralVariable.Awav;
        if (wantsAir == _inAir) return angstrom;
        return wantsAir ? AirRefraction.ToAir(angstrom) : AirRefraction.ToVacuum(angstrom);
    }

    private static double Radians(double degrees) => degrees * Math.PI / 180;

    private static double SinDegrees(double degrees) => Math.Sin(Radians(degrees));
}
