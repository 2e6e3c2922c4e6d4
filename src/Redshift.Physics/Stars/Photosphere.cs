namespace Redshift.Physics.Stars;

/// <summary>A grey atmosphere, seen at each wavelength as deep as the continuous opacity allows (Eddington &amp; Barbier).</summary>
internal sealed class Photosphere
{
    private const double ContinuumDepth = 2.0 / 3;
    private const double LineDepth = 0.1;
    private const double HydrogenDepth = 1.0;

    // Line cores come from above the grey surface temperature of 0.81 T: measured cores of strong lines in the Sun and in A stars.
    private const double SurfaceTemperature = 0.66;
    private readonly Layer _continuum;

    public Photosphere(StellarParameters star)
    {
        Star = star;
        var composition = Composition.Of(star);
        Layer At(double depth) => new(Gas.AtDepth(star.TemperatureK, star.LogGravity, composition, depth), star);
        _continuum = At(ContinuumDepth);
        Lines = At(LineDepth);
        Hydrogen = At(HydrogenDepth);
    }

    public StellarParameters Star { get; }

    /// <summary>Where metal lines and molecular bands form.</summary>
    public Layer Lines { get; }

    /// <summary>Where the wings of hydrogen lines form.</summary>
    public Layer Hydrogen { get; }

    /// <summary>Continuum flux F_λ in arbitrary units.</summary>
    public double ContinuumFlux(double wavelength) => Planck(wavelength, ContinuumTemperature(wavelength));

    /// <summary>Depth that an infinitely strong line would have at a wavelength, 0 to 1.</summary>
    public double StrongestDepth(double wavelength) =>
        1 - (Planck(wavelength, SurfaceTemperature * Star.TemperatureK) / ContinuumFlux(wavelength));

    /// <summary>
    /// Opacity ratio at which half of the strongest depth is reached: weak lines feel the slope of the grey temperature,
    /// d ln B/dη = −G/8 with G = d ln B/d ln T, strong ones its whole range.
    /// </summary>
    public double HalfDepthRatio(double wavelength)
    {
        var x = Constants.SecondRadiation / (wavelength * ContinuumTemperature(wavelength));
        return StrongestDepth(wavelength) * 8 * (1 - Math.Exp(-x)) / x;
    }

    private static double Planck(double wavelength, double kelvin) =>
        Math.Pow(wavelength / 5500, -5) / (Math.Exp(Constants.SecondRadiation / (wavelength * kelvin)) - 1);

    private double ContinuumTemperature(double wavelength)
    {
        var depth = ContinuumDepth * _continuum.ContinuousOpacityAt(5000) / _continuum.ContinuousOpacityAt(wavelength);
        return Star.TemperatureK * Math.Pow(0.75 * (Math.Min(depth, 3) + (2.0 / 3)), 0.25);
    }
}
