using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>A grism, prism or grating in front of a flat detector (algorithm codes GRI and GRA).</summary>
/// <remarks>Greisen et al. 2006, A&amp;A 446, 747, section 5. The parameters are PVi_0 to PVi_6; wavelengths in metres, angles in degrees.</remarks>
internal sealed class GrismAxis : PixelAxis
{
    private const double MetresPerAngstrom = 1e-10;

    private readonly LinearPixels _pixels;
    private readonly WavelengthMedium _medium;
    private readonly double _referenceExit;
    private readonly double _theta;
    private readonly double _tangentPerMetre;
    private readonly double _prism;
    private readonly double _dispersion;

    /// <summary>Prepares the axis.</summary>
    /// <param name="medium">Vacuum for GRI, air for GRA.</param>
    /// <param name="pixels">In Å of that medium.</param>
    /// <param name="parameters">G (1/m), m, α, n, n′ (1/m), ε, θ.</param>
    public GrismAxis(WavelengthMedium medium, LinearPixels pixels, IReadOnlyList<double> parameters)
    {
        _pixels = pixels;
        _medium = medium;
        var sinAlpha = SinDegrees(parameters[2]);
        var reference = pixels.ReferenceValue * MetresPerAngstrom;
        var order = parameters[0] * parameters[1] / Math.Cos(Radians(parameters[5]));
        _referenceExit = Math.Asin(order * reference - parameters[3] * sinAlpha);
        _theta = Radians(parameters[6]);
        _dispersion = order - parameters[4] * sinAlpha;
        _prism = (parameters[3] - parameters[4] * reference) * sinAlpha;
        var cosTheta = Math.Cos(_theta);
        _tangentPerMetre = _dispersion / (Math.Cos(_referenceExit) * cosTheta * cosTheta);
    }

    /// <inheritdoc/>
    public override WavelengthMedium? Medium => _medium;

    /// <inheritdoc/>
    public override double At(double pixel)
    {
        var tangent = -Math.Tan(_theta) + _tangentPerMetre * _pixels.Offset(pixel) * MetresPerAngstrom;
        var exit = Math.Atan(tangent) + _referenceExit + _theta;
        return (Math.Sin(exit) + _prism) / _dispersion / MetresPerAngstrom;
    }

    private static double Radians(double degrees) => degrees * Math.PI / 180;

    private static double SinDegrees(double degrees) => Math.Sin(Radians(degrees));
}
